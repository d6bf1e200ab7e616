import type { DisplayList, Ink, Mark } from '@shared/symbols/display-list'

/** A list drawn in one ink, whatever its own; paper stays paper. */
export const inInk = (list: DisplayList, ink: Ink): DisplayList => list.map((mark) => recoloured(mark, ink))

function recoloured(mark: Mark, ink: Ink): Mark {
  if (mark.mark === 'group') return { ...mark, marks: mark.marks.map((each) => recoloured(each, ink)) }
  return mark.ink === 'paper' ? mark : { ...mark, ink }
}
