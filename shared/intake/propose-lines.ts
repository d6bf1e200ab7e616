import type { LocationConfidence } from '../items/confidence'
import {
  columnByValues,
  columnNamed,
  isNumeric,
  counted,
  isWordy,
  lineForm,
  saysWhat,
  strangeValues,
  type ValueFit,
} from './choose-column'
import { isSenseless, readConfidence, readLineType, suggestLineType } from './line-words'
import type { LineTarget, Mapping } from './mapping'
import type { IntakeColumn, ProposalNote } from './report'
import { isSidedAxis, isSidedFault } from './sides'

type Lines = Mapping['lines']

const leaveOut: LineTarget = { kind: 'leave-out' }

/** Names that say "what it is" where no value is understood. */
const typeNames = [/^(line_|fault_|fold_)?type$/, /^(kind|class|category|legend.*|feature)$/]
const nameNames = [/^name$/, /^(fault|fold|line)_name$/, /^title$/]
const noteNames = [/^(notes?|remarks?|comments?)$/, /^(descr.*|desc|cmt)$/]
const plungeNames = [/^plunge(_val(ue)?)?$/]
const trendNames = [/^trend(_val(ue)?)?$/, /^plunge_(dir|direction|azimuth)$/]

/** What the lines of a file become, proposed from its columns. */
export function proposeLines(
  columns: readonly IntakeColumn[],
  lineCount: number,
): { proposed: Lines; notes: ProposalNote[] } {
  const notes: ProposalNote[] = []
  if (lineCount === 0) return { proposed: noLines, notes }
  const type = proposeTypes(columns, notes)
  const plunge = columnNamed(columns, plungeNames, (column) => isNumeric(column, 0, 90))?.name ?? null
  const trend = columnNamed(columns, trendNames, (column) => isNumeric(column, 0, 360))?.name ?? null
  const free = columns.filter((column) => column.name !== type.typeColumn)
  const proposed = {
    ...type,
    ...proposeConfidence(columns, type, notes),
    otherwise: leaveOut,
    faultSide: 'right' as const,
    foldSide: 'right' as const,
    nameColumn: columnNamed(free, nameNames, isWordy)?.name ?? null,
    // One without the other says nothing about an axis.
    plungeColumn: trend === null ? null : plunge,
    trendColumn: plunge === null ? null : trend,
    noteColumn: columnNamed(free, noteNames, isWordy)?.name ?? null,
  }
  const targets = Object.values(proposed.types)
  if (targets.some(isSidedFault)) notes.push(faultSideNote)
  if (targets.some(isSidedAxis)) notes.push(foldSideNote)
  return { proposed, notes }
}

function proposeTypes(
  columns: readonly IntakeColumn[],
  notes: ProposalNote[],
): { typeColumn: string | null; types: Record<string, LineTarget> } {
  const byValues = columnByValues(columns, 'lines', (value) => readLineType(value) !== undefined, 0.3)
  const column = byValues?.column ?? columnNamed(columns, typeNames, (named) => named.values.length > 0)
  if (!column) {
    notes.push({
      weight: 'check',
      field: 'lines.otherwise',
      text: 'No column says what the lines are: choose what all of them become.',
    })
    return { typeColumn: null, types: {} }
  }
  notes.push(typeNote(column, byValues))
  // A record without a type is refused unless a person says what it is.
  const values = column.values.filter(({ value, lines }) => value !== '' && lines > 0)
  notes.push(...valueNotes(values))
  const types = values.map(({ value }) => [value, readLineType(value) ?? leaveOut] as const)
  return { typeColumn: column.name, types: Object.fromEntries(types) }
}

function valueNotes(values: IntakeColumn['values']): ProposalNote[] {
  const field = 'lines.types'
  const given = values.map(({ value, lines }) => ({ value, count: lines }))
  const strange = strangeValues(
    given.filter(({ value }) => !readLineType(value)),
    lineForm,
    (value) => suggestLineType(value) !== undefined,
  )
  const senseless = given.filter(({ value }) => readLineType(value) && isSenseless(value))
  const unstated = senseless.map(({ value, count }): ProposalNote => ({
    weight: 'reason',
    field,
    text: `“${value}” (${counted(count, lineForm)}) does not say which way it slips: the type stays unspecified.`,
  }))
  return strange ? [...unstated, { weight: 'check', field, text: strange }] : unstated
}

function proposeConfidence(
  columns: readonly IntakeColumn[],
  type: { typeColumn: string | null },
  notes: ProposalNote[],
): Pick<Lines, 'confidenceColumn' | 'confidences' | 'confidenceOtherwise'> {
  const others = columns.filter((column) => column.name !== type.typeColumn)
  const own = columnByValues(others, 'lines', (value) => readConfidence(value) !== undefined, 0.3)
  const field = 'lines.confidenceColumn'
  if (own) {
    notes.push({
      weight: 'reason',
      field,
      text: `“${own.column.name}” states the location confidence of ${counted(own.understood, lineForm)}.`,
    })
    return {
      confidenceColumn: own.column.name,
      confidences: confidencesOf(own.column, false),
      confidenceOtherwise: 'certain',
    }
  }
  const typed = columns.find((column) => column.name === type.typeColumn)
  if (typed?.values.some(({ value }) => readConfidence(value, true))) {
    notes.push({
      weight: 'check',
      field,
      text: `Some values of “${typed.name}” state the location confidence; the others are taken as certain.`,
    })
    return {
      confidenceColumn: typed.name,
      confidences: confidencesOf(typed, true),
      confidenceOtherwise: 'certain',
    }
  }
  notes.push({
    weight: 'check',
    field: 'lines.confidenceOtherwise',
    text: 'The file does not state location confidence: every line would be taken as certain.',
  })
  return { confidenceColumn: null, confidences: {}, confidenceOtherwise: 'certain' }
}

/** Values that state a confidence; with `among`, texts about the type, where one that states none is certain. */
function confidencesOf(column: IntakeColumn, among: boolean): Record<string, LocationConfidence> {
  const entries = column.values.flatMap(({ value, lines }): [string, LocationConfidence][] => {
    const read = readConfidence(value, among) ?? (among ? 'certain' : undefined)
    return value === '' || lines === 0 || read === undefined ? [] : [[value, read]]
  })
  return Object.fromEntries(entries)
}

function typeNote(column: IntakeColumn, fit: ValueFit | undefined): ProposalNote {
  const field = 'lines.typeColumn'
  return fit
    ? {
        weight: 'reason',
        field,
        text: saysWhat(fit, lineForm),
      }
    : {
        weight: 'check',
        field,
        text: `“${column.name}” seems to say what the lines are, but none of its values is understood.`,
      }
}

const faultSideNote: ProposalNote = {
  weight: 'check',
  field: 'lines.faultSide',
  text: 'The file does not say on which side of its faults the downthrown side or the upper plate lies: right of the line, as drawn, is proposed.',
}

const foldSideNote: ProposalNote = {
  weight: 'check',
  field: 'lines.foldSide',
  text: 'The file does not say to which side the limbs of its overturned folds or the steep limbs of its monoclines dip: right of the line, as drawn, is proposed.',
}

const noLines: Lines = {
  typeColumn: null,
  types: {},
  otherwise: leaveOut,
  confidenceColumn: null,
  confidences: {},
  confidenceOtherwise: 'certain',
  faultSide: 'right',
  foldSide: 'right',
  nameColumn: null,
  plungeColumn: null,
  trendColumn: null,
  noteColumn: null,
}
