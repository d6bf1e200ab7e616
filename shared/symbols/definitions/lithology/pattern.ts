import type { Lithology } from '../../../items/lithology'
import type { Tile } from '../../display-list'

/** The area pattern of a rock or deposit. */
export interface LithologyPattern {
  id: Lithology
  title: string
  /** Named after the pattern. */
  readonly tile: Tile
}

/** A pattern of our own drawing. It is drawn when it is first asked for: scattering stones takes some milliseconds. */
export function pattern(id: Lithology, title: string, draw: () => Omit<Tile, 'id'>): LithologyPattern {
  let drawn: Tile | undefined
  return {
    id,
    title,
    get tile() {
      return (drawn ??= { id, ...draw() })
    },
  }
}
