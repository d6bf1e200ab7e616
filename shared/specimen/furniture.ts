import { sheetProjection } from '../geometry/projection'
import { northDiagram } from '../sheet-face/north-diagram'
import { drawSheetFrame } from '../sheet-face/graticule'
import { groupThousands } from '../sheet-face/figures'
import { scaleBar } from '../sheet-face/scale-bar'
import { sectionTicks } from '../sheet-face/section-ticks'
import { typeScale } from '../sheet-face/type-scale'
import { unitLabelType } from '../symbols/definitions/points'
import type { DisplayList } from '../symbols/display-list'
import { mmPerMetreAtScale } from '../symbols/frame'
import type { XY } from '../units'
import { drawingDimensions } from './dimensions'
import { specimenCase, type SpecimenCase, type SpecimenEntry } from './entry'

const type = typeScale(1, 1.28)
const DIAGRAM_WIDTH = 78

/** What stands on a sheet that is no item: each drawn by the code that prints it. */
export const furniture = (): SpecimenEntry[] => [
  entry('furniture.scale-bar', 'Scale bar', ['scale'], scaleBars()),
  entry('furniture.norths', 'North and declination diagram', ['convergence', 'declination'], norths()),
  entry('furniture.section-ticks', 'Ends of a cross-section', ['ends of the section', 'name'], sections()),
  entry(
    'furniture.frame',
    'Neatline, grid and graticule ticks',
    ['neatline', 'projection', 'scale'],
    frames(),
  ),
  entry('furniture.unit-label', 'Unit label', ['label of the unit', 'identity'], labels()),
]

function entry(
  id: string,
  meaning: string,
  drivenBy: readonly string[],
  cases: readonly SpecimenCase[],
): SpecimenEntry {
  const dimensions = drawingDimensions(cases[0]?.marks ?? [])
  return { id, meaning, dimensions, drivenBy, published: [], cases }
}

const scaleBars = (): SpecimenCase[] =>
  [12_500, 25_000, 62_500].map((scale) =>
    specimenCase(`1:${groupThousands(scale)}`, scaleBar(scale, 84).draw(0, 0)),
  )

function norths(): SpecimenCase[] {
  const asOf = '2025.0, an example'
  const diagram = (caption: string, convergence: number, declination?: number): SpecimenCase => {
    const magnetic = declination === undefined ? undefined : { declination, asOf }
    return specimenCase(caption, northDiagram(convergence, DIAGRAM_WIDTH, type, magnetic).draw(0, 0))
  }
  return [
    diagram('grid north east of true north', 2.1223),
    diagram('grid north west of true north', -2.1223),
    diagram('true and grid north agree', 0),
    diagram('magnetic north west of both', 2.1223, -3.5),
    diagram('magnetic north east of both', -0.2, 12.5),
    diagram('magnetic north between', -4.5, -2),
  ]
}

const sections = (): SpecimenCase[] => [
  specimenCase('west to east', sectionTicks([0, 0], [34, 0], 'A')),
  specimenCase('south-west to north-east', sectionTicks([0, 0], [26, 20], 'B')),
]

/** A very small sheet in the west of a UTM zone, where convergence can be seen. */
function frames(): SpecimenCase[] {
  const [west, south] = [263_000, 4_987_000]
  const neatline: XY[] = [
    [west, south],
    [west + 620, south],
    [west + 620, south + 430],
    [west, south + 430],
    [west, south],
  ]
  const projection = sheetProjection('+proj=utm +zone=31 +datum=WGS84 +units=m +no_defs')
  const frame = {
    origin: [west, south] as XY,
    mmPerMetre: mmPerMetreAtScale(12_500),
    convergenceAt: projection.convergenceAt,
  }
  return [specimenCase('a small sheet at 1:12 500', drawSheetFrame({ neatline }, projection, frame))]
}

function labels(): SpecimenCase[] {
  const label = (text: string): DisplayList => [
    { mark: 'text', text, at: [0, 0], ...unitLabelType, ink: 'black', align: 'middle' },
  ]
  return [specimenCase('certain', label('Dr')), specimenCase('questioned', label('Dr?'))]
}
