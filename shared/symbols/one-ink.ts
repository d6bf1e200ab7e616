import { greyOf } from '../colour'
import type { DisplayList, Ink, Mark } from './display-list'
import type { Printing } from './unit-fill'

/** An ink where only black is printed: all linework and letters black, paper left white, colours as greys. */
function oneInk(ink: Ink): Ink {
  if (ink.startsWith('#')) return greyOf(ink)
  return ink === 'paper' ? '#ffffff' : '#000000'
}

/** An ink as it is printed. */
export const printedInk = (ink: Ink, printing: Printing): Ink => (printing === 'one-ink' ? oneInk(ink) : ink)

/** A list as it is printed: in colour as it stands, in one ink without any colour. */
export const printed = (list: DisplayList, printing: Printing): DisplayList =>
  printing === 'one-ink' ? list.map(inOneInk) : list

function inOneInk(mark: Mark): Mark {
  switch (mark.mark) {
    case 'stroke':
    case 'fill':
    case 'pattern':
      return { ...mark, ink: oneInk(mark.ink) }
    case 'text':
      return {
        ...mark,
        ink: oneInk(mark.ink),
        ...(mark.halo === undefined ? {} : { haloInk: oneInk(mark.haloInk ?? 'paper') }),
      }
    case 'group':
      return { ...mark, marks: mark.marks.map(inOneInk) }
  }
}
