import { itemWord as wordOf, kindWords, type Item } from '@shared/items/item'
import { foldWords } from '@shared/items/lines'

/** "unit" is spoken with a consonant. */
const startsWithVowel = /^(?!unit)[aeiou]/

/** "a contact", "an axial trace", "an anticline". */
export const withArticle = (word: string): string => `${startsWithVowel.test(word) ? 'an' : 'a'} ${word}`

/** What an item is called in a sentence: a fold by its form, another by its type or kind, with its name where it has one. */
export function itemWord(item: Item): string {
  const word = item.kind === 'axial-trace' ? foldWords[item.properties.form] : wordOf(item)
  if (item.kind === 'unit') return `unit ${item.properties.label}`
  if ('name' in item.properties && item.properties.name !== '') return `${word} “${item.properties.name}”`
  return word
}

/** "a contact", or "3 contacts", or "4 items" where the kinds differ. */
export function itemsWord(items: readonly Item[]): string {
  const [first] = items
  if (!first) return 'nothing'
  if (items.length === 1) return first.kind === 'unit' ? itemWord(first) : withArticle(itemWord(first))
  const sameKind = items.every((item) => item.kind === first.kind)
  return `${items.length} ${sameKind ? kindWords[first.kind].many : 'items'}`
}
