import type { NamedRevision } from '@shared/api/ledger'
import { upperFirst } from '@shared/words'

/** A state of a sheet in words, as the address names it: "revision 12", "edition 2", "the latest revision". */
export function stateWords(state: string): string {
  if (state === 'latest') return 'the latest revision'
  if (state === '0') return 'the empty sheet'
  const edition = /^edition-(\d+)$/.exec(state)?.[1]
  return edition === undefined ? `revision ${state}` : `edition ${edition}`
}

export interface StateOption {
  value: string
  words: string
}

/** States that a person can choose from: the latest, editions, named revisions, the empty sheet, and what is chosen.
 *  @param edition number of the current edition; null before the first */
export function stateOptions(
  { latest, edition, names }: { latest: number; edition: number | null; names: readonly NamedRevision[] },
  chosen: string,
): StateOption[] {
  const editions = Array.from({ length: edition ?? 0 }, (_, index) => (edition ?? 0) - index)
  const options = [
    { value: 'latest', words: `Latest, revision ${latest}` },
    ...editions.map((number) => ({ value: `edition-${number}`, words: `Edition ${number}` })),
    ...names.map(({ revision, name }) => ({ value: String(revision), words: `${revision}, ${name}` })),
    { value: '0', words: 'The empty sheet' },
  ]
  if (chosen === '' || options.some(({ value }) => value === chosen)) return options
  return [{ value: chosen, words: upperFirst(stateWords(chosen)) }, ...options]
}
