import { sheetProjection, type SheetProjection } from '@shared/geometry/projection'
import { unreadable, type Unreadable } from './read-outcome'

/** A system that a `.prj` file describes. */
export interface PrjSystem {
  outcome: 'system'
  name: string
  /** Null where coordinates are longitude and latitude already. */
  projection: SheetProjection | null
}

/** Datums that agree with WGS 84 to some two metres without a shift: less than a pencil line at the scales of sheets.
 *  Source: common practice. */
const agreesWithWgs84 =
  /WGS_?(19)?84|North_American_(Datum_)?1983|NAD_?(19)?83|ETRS|European_Terrestrial_Reference|ITRF|GDA_?(1994|2020)|Geocentric_Datum_of_Australia|JGD_?(2000|2011)|Japanese_Geodetic_Datum_(2000|2011)|NZGD_?2000|New_Zealand_Geodetic_Datum_2000|SIRGAS|RGF_?(19)?93|CGCS_?2000|China_2000|Hartebeesthoek/i

/** Reads well-known text as mapping programs write it beside a shapefile. A datum whose shift is neither known nor given
 *  is refused: without it places would move by up to some hundred metres, unseen. */
export function readPrj(text: string): PrjSystem | Unreadable {
  const name = /^\s*(?:PROJCS|GEOGCS|PROJCRS|GEOGCRS)\s*\[\s*"([^"]{1,200})"/i.exec(text)?.[1]
  const datum = /\bDATUM\s*\[\s*"([^"]{1,200})"/i.exec(text)?.[1]
  if (name === undefined || datum === undefined) {
    return unreadable('Its .prj file does not describe a coordinate system.')
  }
  if (!agreesWithWgs84.test(datum) && !/\bTOWGS84\s*\[/i.test(text)) {
    return unreadable(
      `Its .prj file names the datum “${datum}”, whose shift to WGS 84 is not kept here. Save it in WGS 84.`,
    )
  }
  if (isPlainDegrees(text) && agreesWithWgs84.test(datum))
    return { outcome: 'system', name, projection: null }
  try {
    const projection = sheetProjection(text)
    projection.toLonLat([0, 0])
    return { outcome: 'system', name, projection }
  } catch {
    return unreadable(`Its coordinate system, “${name}”, cannot be converted here. Save it in WGS 84.`)
  }
}

/** Whether the text describes longitude and latitude in degrees from Greenwich. */
const isPlainDegrees = (text: string): boolean =>
  /^\s*GEOG(CS|CRS)/i.test(text) &&
  /PRIMEM\s*\[\s*"[^"]*"\s*,\s*0(\.0*)?\s*[\],]/i.test(text) &&
  /UNIT\s*\[\s*"degree"/i.test(text)
