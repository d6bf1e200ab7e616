import { northReferences, type NorthReference } from '../items/points'
import { columnNamed } from './choose-column'
import type { Mapping } from './mapping'
import type { IntakeColumn, ProposalNote } from './report'
import { wordsOf } from './words'

type North = Pick<Mapping, 'northReference' | 'declination'>

const northNames = [/^north(_reference)?$/, /^(azimuth_)?reference$/, /^azimuths?_from$/]
const declinationNames = [/^(magnetic_)?declination(_deg)?$/, /^(magnetic_)?decl?$/]

/** What the azimuths of a file are counted from: as a column says, the same in all of its records; else true north, to be
 *  looked at. */
export function proposeNorth(columns: readonly IntakeColumn[]): { north: North; note: ProposalNote } {
  const column = columnNamed(columns, northNames, ({ values }) =>
    values.some(({ value }) => readNorth(value) !== undefined),
  )
  const stated = column && statedNorth(column)
  if (!column || !stated)
    return { north: { northReference: 'true', declination: null }, note: unsaid(column) }
  const declination = stated === 'magnetic' ? constantIn(columns) : null
  const figure = declination === null ? '' : `, and the declination as ${declination}°`
  const text = `“${column.name}” states ${stated} north${figure}, in every record.`
  return {
    north: { northReference: stated, declination },
    note: { weight: 'reason', field: 'northReference', text },
  }
}

/** `magnetic` and `Magnetic north` alike. */
const readNorth = (text: string): NorthReference | undefined =>
  northReferences.find((north) => wordsOf(text)[0] === north)

/** The one reference that all records state; undefined where they state several, or something else. */
function statedNorth({ values }: IntakeColumn): NorthReference | undefined {
  const stated = values.map(({ value }) => readNorth(value))
  const [first] = stated
  return stated.every((north) => north === first) ? first : undefined
}

function constantIn(columns: readonly IntakeColumn[]): number | null {
  const column = columnNamed(columns, declinationNames, ({ numbers, filled }) => numbers?.count === filled)
  const numbers = column?.numbers
  return numbers && numbers.least === numbers.greatest && Math.abs(numbers.least) <= 180
    ? numbers.least
    : null
}

const unsaid = (column: IntakeColumn | undefined): ProposalNote => ({
  weight: 'check',
  field: 'northReference',
  text: column
    ? `“${column.name}” does not state the same north in every record; true north is proposed for all of them.`
    : 'The file does not say what its azimuths are counted from; true north is proposed.',
})
