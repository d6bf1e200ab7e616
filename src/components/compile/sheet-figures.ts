import { groupThousands } from '@shared/sheet-face/figures'
import type { Crs } from '@shared/api/sheets'
import type { Metres } from '@shared/units'

/** An easting or northing in whole metres with thin spaces: 288 430. */
export const metresFigure = (metres: Metres): string => groupThousands(metres)

/** How the system of a sheet is called at the foot: "zone 26N", or its own name where it has no zone. */
export function zoneWords(crs: Crs): string {
  const zone = /zone (\d{1,2}[NS])/i.exec(crs.name)
  return zone?.[1] ? `zone ${zone[1]}` : crs.name
}

/** Scale of the view as a share of print size: 46 %, 3.2 %. */
export const percentFigure = (percent: number): string =>
  `${percent >= 10 ? Math.round(percent) : percent.toFixed(1)}\u00a0%`
