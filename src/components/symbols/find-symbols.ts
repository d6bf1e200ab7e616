import type { SpecimenEntry, SpecimenFamily } from '@shared/specimen/entry'

/** Families with the entries that hold all words of a search: in meaning, name, attributes, published numbers or captions. */
export function findSymbols(families: readonly SpecimenFamily[], text: string): SpecimenFamily[] {
  const words = text.toLowerCase().split(/\s+/).filter(Boolean)
  return families
    .map((family) => ({
      ...family,
      entries: family.entries.filter((entry) => {
        const held = textOf(family, entry)
        return words.every((word) => held.includes(word))
      }),
    }))
    .filter(({ entries }) => entries.length > 0)
}

const textOf = (family: SpecimenFamily, entry: SpecimenEntry): string =>
  [
    family.title,
    entry.id,
    entry.meaning,
    ...entry.drivenBy,
    ...entry.published.flatMap(({ standard, number }) => [standard, number]),
    ...entry.cases.map(({ caption }) => caption),
  ]
    .join(' ')
    .toLowerCase()
