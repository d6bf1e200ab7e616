import type { SpecimenEntry } from './entry'

/** What is to be read of a symbol beside its drawings, a line each. */
export function factLines({ dimensions, drivenBy, published }: SpecimenEntry): string[] {
  return [
    dimensionWords(dimensions),
    `Driven by ${drivenBy.length > 0 ? drivenBy.join(', ') : 'nothing but its place'}.`,
    publishedWords(published),
  ]
}

/** Dimensions in one sentence: `line 0.2 mm; approximate dash 3.5 mm, gap 0.75 mm.` */
export const dimensionWords = (dimensions: SpecimenEntry['dimensions']): string =>
  `${dimensions.map(({ what, figure }) => `${what} ${figure}`).join('; ')}.`.replace(/^./, (first) =>
    first.toUpperCase(),
  )

/** The published standard's numbers; where none was verified, that is said. */
export const publishedWords = (published: SpecimenEntry['published']): string =>
  published.length === 0
    ? 'No published number verified.'
    : published.map(({ standard, number, of }) => `${standard}: ${number}${of ? ` (${of})` : ''}`).join('; ')
