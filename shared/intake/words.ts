/** Lower-case words of a text, without accents and punctuation; a question mark is a word of its own. */
export function wordsOf(text: string): string[] {
  return text
    .replace(/(\p{Ll})(\p{Lu})/gu, '$1 $2')
    .toLowerCase()
    .normalize('NFKD')
    .replace(/\p{M}/gu, '')
    .replace(/\?/g, ' ? ')
    .split(/[^\p{L}\p{N}?]+/u)
    .filter((word) => word !== '')
}

/** A vocabulary: what each word, or two words in a row, stands for; null for words that carry no meaning here. */
export type Vocabulary<Sense> = ReadonlyMap<string, Sense | null>

export const vocabulary = <Sense>(senses: readonly (readonly [Sense | null, string])[]): Vocabulary<Sense> =>
  new Map(senses.flatMap(([sense, words]) => words.split(', ').map((word) => [word, sense] as const)))

/** Each of our own values with its name in plain words: left-lateral by `left lateral`. */
export const named = <Value extends string>(values: readonly Value[]): (readonly [Value, string])[] =>
  values.map((value) => [value, value.replaceAll('-', ' ')])

export interface Understood<Sense> {
  senses: Set<Sense>
  /** Words that the vocabulary does not have. */
  strange: string[]
}

/** What a text says in a vocabulary. Two words in a row are tried before one. */
export function understand<Sense>(words: readonly string[], known: Vocabulary<Sense>): Understood<Sense> {
  const senses = new Set<Sense>()
  const strange: string[] = []
  for (let at = 0; at < words.length; at++) {
    const word = words[at] ?? ''
    const pair = `${word} ${words[at + 1] ?? ''}`
    const sense = known.has(pair) ? known.get(pair) : known.get(word)
    if (known.has(pair)) at += 1
    if (sense === undefined) strange.push(word)
    else if (sense !== null) senses.add(sense)
  }
  return { senses, strange }
}

/** The words with misspellings replaced by the nearest known word, at most one slip in short words and two in long. */
export function correctSpelling<Sense>(words: readonly string[], known: Vocabulary<Sense>): string[] {
  const spellings = new Set([...known.keys()].flatMap((term) => term.split(' ')))
  return words.map((word) => {
    if (spellings.has(word) || word.length < 3) return word
    const allowed = word.length < 6 ? 1 : 2
    const near = [...spellings]
      .map((candidate) => ({ candidate, slips: slipsBetween(word, candidate) }))
      .filter(({ slips }) => slips <= allowed)
      .sort((a, b) => a.slips - b.slips)
    return near[0]?.candidate ?? word
  })
}

/** Fewest letters to add, drop, replace or exchange with a neighbour to turn one word into the other.
 *  Source: Damerau 1964 and Levenshtein 1966, in the restricted form that edits no letter twice. */
export function slipsBetween(a: string, b: string): number {
  if (Math.abs(a.length - b.length) > 2) return 3
  let before: number[] = []
  let last = Array.from({ length: b.length + 1 }, (_, j) => j)
  for (let i = 1; i <= a.length; i++) {
    const row = [i]
    for (let j = 1; j <= b.length; j++) {
      const same = a[i - 1] === b[j - 1] ? 0 : 1
      const exchanged = i > 1 && j > 1 && a[i - 1] === b[j - 2] && a[i - 2] === b[j - 1]
      const swap = exchanged ? at(before, j - 2) + 1 : Infinity
      row.push(Math.min(at(last, j) + 1, at(row, j - 1) + 1, at(last, j - 1) + same, swap))
    }
    before = last
    last = row
  }
  return at(last, b.length)
}

const at = (row: readonly number[], index: number): number => row[index] ?? Infinity
