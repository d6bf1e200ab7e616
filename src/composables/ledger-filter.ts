import { listRevisions, type LedgerFilter } from '@shared/api/ledger'
import { groupThousands } from '@shared/sheet-face/figures'

const filterSchema = listRevisions.query.omit({ before: true, limit: true })
const names = filterSchema.keyof().options

/** What the ledger is searched by, as an address states it; what cannot be meant is left out.
 *  @param query the query of a route: a name given twice counts once */
export function filterOf(query: Readonly<Record<string, unknown>>): LedgerFilter {
  const stated = names.flatMap((name) => {
    const value: unknown = query[name]
    const parsed = filterSchema.shape[name].safeParse(Array.isArray(value) ? value[0] : value)
    return parsed.success && parsed.data !== undefined ? [[name, parsed.data] as const] : []
  })
  return filterSchema.parse(Object.fromEntries(stated))
}

/** Whether two filters ask for the same. */
export const isSameFilter = (a: LedgerFilter, b: LedgerFilter): boolean =>
  names.every((name) => a[name] === b[name])

/** A filter with one part stated otherwise; an empty text takes the part out. */
export const withPart = (filter: LedgerFilter, name: keyof LedgerFilter, value: string): LedgerFilter =>
  filterOf({ ...filter, [name]: value === '' ? undefined : value })

/** A rectangle of the sheet as the ledger is asked for it: west,south,east,north, whole metres, nothing cut off.
 *  @param extent west, south, east, north, sheet metres */
export const placeOf = ([west, south, east, north]: readonly [number, number, number, number]): string =>
  [Math.floor(west), Math.floor(south), Math.ceil(east), Math.ceil(north)].join(',')

/** The same for a person: `288 430–290 120 E, 5 283 107–5 284 000 N`. */
export function placeWords(place: string): string {
  const [west = 0, south = 0, east = 0, north = 0] = place.split(',').map((part) => Math.round(Number(part)))
  const [w, s, e, n] = [west, south, east, north].map(groupThousands)
  return `${w}–${e} E, ${s}–${n} N`
}
