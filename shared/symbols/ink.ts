import type { Ink } from './display-list'

/** Printed colours of the named inks. The paper stays paper in every theme, so they do not follow it.
 *  Contacts and attitudes are near-black, folds and their arrows oxide red, frame and grid near-black hairlines. */
const inks: Record<Exclude<Ink, `#${string}`>, string> = {
  black: '#1f1b16',
  fold: '#a8321c',
  frame: '#1f1b16',
  quiet: '#6b6357',
  paper: '#fdfaf3',
  selection: '#2f5574',
}

const isNamed = (ink: Ink): ink is keyof typeof inks => !ink.startsWith('#')

/** Colour of an ink as `#rrggbb`; an ink that is a colour already (a unit's fill) is given back. */
export const inkColour = (ink: Ink): string => (isNamed(ink) ? inks[ink] : ink)
