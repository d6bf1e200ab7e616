/** Initials of a name: first letters of its first and last word, capitals; one letter for a single word. */
export function toInitials(name: string): string {
  const words = name.trim().split(/\s+/)
  const ends = words.length > 1 ? [words[0], words.at(-1)] : [words[0]]
  return ends.map((word) => Array.from(word ?? '')[0]?.toLocaleUpperCase('en') ?? '').join('')
}
