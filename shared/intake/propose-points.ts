import type { AttitudeConvention } from '../items/points'
import { parseAttitude } from '../structure/attitude-text'
import {
  columnByValues,
  columnNamed,
  isNumeric,
  isWordy,
  pointForm,
  saysWhat,
  strangeValues,
} from './choose-column'
import type { Mapping, PointTarget } from './mapping'
import { readPointType, suggestPointType } from './point-words'
import type { IntakeColumn, ProposalNote } from './report'

type Points = Mapping['points']

const leaveOut: PointTarget = { kind: 'leave-out' }
const plainBedding: PointTarget = {
  kind: 'attitude',
  type: 'bedding',
  overturned: false,
  undulating: false,
  topsKnown: false,
}

const strikeNames = [/^strike(_(val|value|rhr|azimuth|deg))?$/, /^(strk|rhr)$/]
const dipDirectionNames = [/^dip_?(dir|direction|azimuth|azimut|az)(_(val|value|deg))?$/, /^dd$/]
const azimuthNames = [/^azim(ut|uth)?$/, /^(az|bearing|direction|orientation)$/]
const dipNames = [/^dip(_?(val|value|angle|amount|deg))?$/]
const trendNames = [/^trend(_?(val|value))?$/, /^plunge_?(dir|direction|azimuth)$/]
const plungeNames = [/^plunge(_?(val|value|angle|amount))?$/]
const stationNames = [
  /^(station|stn|site|outcrop|locality|stop)(_?(id|no|name|number))?$/,
  /^name(_[a-z]{2})?$/,
]
const overturnedNames = [/^(is_)?(overturned|inverted)$/]
const noteNames = [/^(notes?|remarks?|comments?)$/, /^(descr.*|desc|cmt)$/]
const typeNames = [/^(point_|plane_|structure_)?type$/, /^(kind|class|category|legend.*|feature)$/]

/** What the points of a file become, proposed from its columns. */
export function proposePoints(
  columns: readonly IntakeColumn[],
  pointCount: number,
): { proposed: Points; notes: ProposalNote[] } {
  const notes: ProposalNote[] = []
  if (pointCount === 0) return { proposed: noPoints, notes }
  const readings = proposeReadings(columns, notes)
  const line = proposeLineations(columns)
  const type = proposeTypes(columns, usualTarget(readings, line), notes)
  const taken = [type.typeColumn, readings.readingColumn]
  const free = columns.filter((column) => !taken.includes(column.name))
  return {
    proposed: {
      ...readings,
      ...line,
      ...type,
      overturnedColumn:
        columnNamed(free, overturnedNames, (column) => column.values.length > 0)?.name ?? null,
      stationColumn: columnNamed(free, stationNames, (column) => column.filled > 0)?.name ?? null,
      noteColumn: columnNamed(free, noteNames, isWordy)?.name ?? null,
    },
    notes,
  }
}

type Readings = Pick<Points, 'readingColumn' | 'azimuthColumn' | 'dipColumn' | 'convention'>

function proposeReadings(columns: readonly IntakeColumn[], notes: ProposalNote[]): Readings {
  const dip = columnNamed(columns, dipNames, (column) => column.filled > 0)
  const azimuth = dip && proposeAzimuth(columns, notes)
  if (dip && azimuth) {
    return {
      readingColumn: null,
      azimuthColumn: azimuth.column.name,
      dipColumn: dip.name,
      convention: azimuth.convention,
    }
  }
  const reading = columns.find(holdsReadings)
  const none = { azimuthColumn: null, dipColumn: null, convention: 'strike-dip' as const }
  if (!reading) return { readingColumn: null, ...none }
  notes.push({
    weight: 'reason',
    field: 'points.readingColumn',
    text: `“${reading.name}” holds whole readings, for example “${reading.samples[0] ?? ''}”.`,
  })
  if (reading.samples.some(mayBeDipDirection)) notes.push(conventionQuestion(reading.name))
  return { readingColumn: reading.name, ...none }
}

function proposeAzimuth(
  columns: readonly IntakeColumn[],
  notes: ProposalNote[],
): { column: IntakeColumn; convention: AttitudeConvention } | undefined {
  const filled = (column: IntakeColumn) => column.filled > 0
  const strike = columnNamed(columns, strikeNames, filled)
  const dipDirection = columnNamed(columns, dipDirectionNames, filled)
  const field = 'points.azimuthColumn'
  if (strike && spansCircle(strike)) {
    notes.push({
      weight: 'reason',
      field,
      text: `“${strike.name}” is named as a strike and runs through the whole circle, so it is read by the right-hand rule.`,
    })
    return { column: strike, convention: 'strike-dip' }
  }
  if (dipDirection) {
    notes.push({ weight: 'reason', field, text: `“${dipDirection.name}” is named as a dip direction.` })
    return { column: dipDirection, convention: 'dip-direction-dip' }
  }
  if (strike) {
    if (strike.numbers) notes.push(halfCircleQuestion(strike))
    return { column: strike, convention: 'strike-dip' }
  }
  const azimuth = columnNamed(columns, azimuthNames, (column) => isNumeric(column, 0, 360))
  if (!azimuth) return undefined
  notes.push(conventionQuestion(azimuth.name))
  return { column: azimuth, convention: 'strike-dip' }
}

type LineColumns = Pick<Points, 'trendColumn' | 'plungeColumn'>

/** One without the other says nothing about a line. */
function proposeLineations(columns: readonly IntakeColumn[]): LineColumns {
  const trend = columnNamed(columns, trendNames, (column) => column.filled > 0)
  const plunge = columnNamed(columns, plungeNames, (column) => isNumeric(column, 0, 90))
  return trend && plunge
    ? { trendColumn: trend.name, plungeColumn: plunge.name }
    : { trendColumn: null, plungeColumn: null }
}

/** What points become of which no column says what they are. */
function usualTarget(readings: Readings, line: LineColumns): { target: PointTarget; words: string } {
  if (readings.readingColumn !== null || readings.dipColumn !== null) {
    return { target: plainBedding, words: 'bedding, not overturned' }
  }
  return line.plungeColumn === null
    ? { target: { kind: 'station', type: 'station' }, words: 'a station, since none has a reading' }
    : { target: { kind: 'lineation', type: 'lineation' }, words: 'a lineation' }
}

function proposeTypes(
  columns: readonly IntakeColumn[],
  usual: { target: PointTarget; words: string },
  notes: ProposalNote[],
): Pick<Points, 'typeColumn' | 'types' | 'otherwise'> {
  const fit = columnByValues(columns, 'points', (value) => readPointType(value) !== undefined, 0.3)
  const named = columnNamed(columns, typeNames, (column) => column.values.length > 0 && isWordy(column))
  // A column that only is called so may say of stations what they lie in; of readings it has to be answered.
  const column = fit?.column ?? (usual.target.kind === 'station' ? undefined : named)
  const field = 'points.typeColumn'
  if (!column) {
    notes.push({
      weight: 'check',
      field: 'points.otherwise',
      text: `No column says what the points are: each would be taken as ${usual.words}.`,
    })
    return { typeColumn: null, types: {}, otherwise: usual.target }
  }
  if (fit) notes.push({ weight: 'reason', field, text: saysWhat(fit, pointForm) })
  const values = column.values.filter(({ value, points }) => value !== '' && points > 0)
  const strange = strangeValues(
    values
      .filter(({ value }) => !readPointType(value))
      .map(({ value, points }) => ({ value, count: points })),
    pointForm,
    (value) => suggestPointType(value) !== undefined,
  )
  if (strange) notes.push({ weight: 'check', field: 'points.types', text: strange })
  const types = values.map(({ value }) => [value, readPointType(value) ?? leaveOut] as const)
  return { typeColumn: column.name, types: Object.fromEntries(types), otherwise: leaveOut }
}

/** Right-hand-rule strikes fill the circle; strikes written with either end stay within half of it. */
const spansCircle = (column: IntakeColumn): boolean =>
  column.numbers !== null && column.numbers.greatest > 180

const halfCircleQuestion = (column: IntakeColumn): ProposalNote => ({
  weight: 'ask',
  field: 'points.convention',
  text: `No strike in “${column.name}” is greater than 180°. Either all beds dip to the east and south, or the file states one end of the strike and not the side of the dip. Are these strikes by the right-hand rule?`,
})

const conventionQuestion = (name: string): ProposalNote => ({
  weight: 'ask',
  field: 'points.convention',
  text: `The numbers in “${name}” may be strikes or dip directions. Which are they?`,
})

const holdsReadings = (column: IntakeColumn): boolean =>
  column.samples.length > 0 &&
  column.samples.every(
    (text) => /\d\D+\d/.test(text) && parseAttitude(text, 'strike-dip').outcome === 'plane',
  )

/** `135/40` reads differently in the two conventions, `N45E 40SE` does not. */
const mayBeDipDirection = (text: string): boolean => {
  const reading = parseAttitude(text, 'dip-direction-dip')
  return reading.outcome === 'plane' && /^\s*\d/.test(text)
}

const noPoints: Points = {
  typeColumn: null,
  types: {},
  otherwise: leaveOut,
  readingColumn: null,
  azimuthColumn: null,
  dipColumn: null,
  convention: 'strike-dip',
  overturnedColumn: null,
  trendColumn: null,
  plungeColumn: null,
  stationColumn: null,
  noteColumn: null,
}
