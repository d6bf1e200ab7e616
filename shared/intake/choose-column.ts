import type { IntakeColumn } from './report'

/** The first column whose name fits, in the order of the patterns: the more telling name wins over the earlier column.
 *  Names are compared in lower case with everything but letters and digits as one underscore. */
export function columnNamed(
  columns: readonly IntakeColumn[],
  patterns: readonly RegExp[],
  fits: (column: IntakeColumn) => boolean,
): IntakeColumn | undefined {
  for (const pattern of patterns) {
    const found = columns.find((column) => pattern.test(plainName(column.name)) && fits(column))
    if (found) return found
  }
  return undefined
}

export interface ValueFit {
  column: IntakeColumn
  /** Records whose value is understood. */
  understood: number
  /** Records that have a value. */
  stated: number
}

/** The column whose values are understood in most records of one form; undefined if in none more than `least` of those
 *  that have a value. */
export function columnByValues(
  columns: readonly IntakeColumn[],
  form: 'points' | 'lines',
  understands: (value: string) => boolean,
  least: number,
): ValueFit | undefined {
  const fits = columns.map((column) => valueFit(column, form, understands))
  const fair = fits.filter(({ understood, stated }) => understood > 0 && understood >= least * stated)
  return fair.sort((a, b) => b.understood - a.understood)[0]
}

function valueFit(
  column: IntakeColumn,
  form: 'points' | 'lines',
  understands: (value: string) => boolean,
): ValueFit {
  const given = column.values.filter((entry) => entry.value !== '')
  const sum = (entries: typeof given) => entries.reduce((all, entry) => all + entry[form], 0)
  return { column, understood: sum(given.filter((entry) => understands(entry.value))), stated: sum(given) }
}

interface FormWords {
  one: string
  many: string
}

export const lineForm: FormWords = { one: 'line', many: 'lines' }
export const pointForm: FormWords = { one: 'point', many: 'points' }

export const counted = (count: number, { one, many }: FormWords): string =>
  `${count} ${count === 1 ? one : many}`

/** For how many records a column says what they are: “Type” says what 21 of 24 points are. */
export function saysWhat({ column, understood, stated }: ValueFit, form: FormWords): string {
  const start = `“${column.name}” says what`
  if (understood < stated) return `${start} ${understood} of ${stated} ${form.many} are.`
  return stated === 1 ? `${start} the ${form.one} is.` : `${start} all ${counted(stated, form)} are.`
}

/** Whether a column holds numbers within a range, and little else. */
export const isNumeric = (column: IntakeColumn, least: number, greatest: number): boolean =>
  column.numbers !== null &&
  column.numbers.count >= 0.9 * column.filled &&
  column.numbers.least >= least &&
  column.numbers.greatest <= greatest

export const isWordy = (column: IntakeColumn): boolean => column.samples.some((text) => /\p{L}/u.test(text))

/** A column's name in lower case, with everything but letters and digits as one underscore. */
export const plainName = (name: string): string =>
  name
    .replace(/(\p{Ll})(\p{Lu})/gu, '$1_$2')
    .toLowerCase()
    .replace(/[^\p{L}\p{N}]+/gu, '_')
    .replace(/^_|_$/g, '')

/** Values that are not understood, as one remark; undefined if there are none.
 *  @param hints whether a likely meaning can be offered for a value */
export function strangeValues(
  strange: readonly { value: string; count: number }[],
  form: FormWords,
  hints: (value: string) => boolean,
): string | undefined {
  const [first] = strange
  if (!first) return undefined
  const records = strange.reduce((sum, { count }) => sum + count, 0)
  const what = strange.length === 1 ? `“${first.value}” is` : `${strange.length} values are`
  const hinted = strange.filter(({ value }) => hints(value)).length
  const offer =
    hinted === 0 ? '' : ` A likely meaning is offered beside ${hinted === strange.length ? 'each' : hinted}.`
  return `${what} not understood and would be left out (${counted(records, form)}).${offer}`
}
