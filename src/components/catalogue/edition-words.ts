import { getArtefact, type Artefact, type Edition } from '@shared/api/catalogue'
import { addressOf } from '@/api/client'

const NO_BREAK_SPACE = '\u00a0'

/** A file's size as people read it: 812 B, 4.1 kB, 2.35 MB (thousands, as in file listings of the SI). */
export function sizeWords(bytes: number): string {
  if (bytes < 1000) return `${bytes}${NO_BREAK_SPACE}B`
  const [value, unit] = bytes < 1_000_000 ? [bytes / 1000, 'kB'] : [bytes / 1_000_000, 'MB']
  return `${value >= 100 ? Math.round(value) : value.toPrecision(3)}${NO_BREAK_SPACE}${unit}`
}

/** What a reader must know about an edition before trusting it; empty for the current one. */
export function stateSentence({ state }: Pick<Edition, 'state'>): string {
  if (state === 'superseded') return 'A later edition has replaced this one.'
  if (state === 'withdrawn') return 'This edition has been withdrawn.'
  return ''
}

export const addressOfFile = (edition: Pick<Edition, 'sheet' | 'edition'>, { name }: Artefact): string =>
  addressOf(getArtefact, { params: { sheet: edition.sheet, edition: edition.edition, name } })

/** The drawn page of an edition, to look at; undefined where it has none. */
export const pictureOf = ({ artefacts }: Edition): Artefact | undefined =>
  artefacts.find(({ mediaType }) => mediaType.startsWith('image/'))
