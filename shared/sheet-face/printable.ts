import type { DisplayList } from '../symbols/display-list'
import { latoCodePoints } from '../symbols/lato-widths'

const printable = new Set(latoCodePoints)

/** The first text of a list that holds a character the printed type does not have, and that character. In print it would
 *  be an empty box, so a release stops there instead. */
export function findUnprintable(list: DisplayList): { text: string; character: string } | undefined {
  for (const mark of list) {
    if (mark.mark === 'group') {
      const within = findUnprintable(mark.marks)
      if (within) return within
    }
    if (mark.mark !== 'text') continue
    const character = [...mark.text].find((letter) => !printable.has(letter.codePointAt(0) ?? 0))
    if (character !== undefined) return { text: mark.text, character }
  }
  return undefined
}
