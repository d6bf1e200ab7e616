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

/** The published standard's numbers, each with the case that it is for; where none was verified, that is said. */
export function publishedWords(published: SpecimenEntry['published']): string {
  if (published.length === 0) return 'No published number verified.'
  const standards = [...new Set(published.map(({ standard }) => standard))]
  return standards
    .map((standard) => {
      const numbers = published
        .filter((each) => each.standard === standard)
        .map(({ number, of }) => (of ? `${number} (${of})` : number))
      return `${standard}: ${numbers.join(', ')}`
    })
    .join('; ')
}
