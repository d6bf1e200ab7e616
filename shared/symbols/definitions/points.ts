import type { Mark } from '../display-list'
import { circle } from '../paths'

/** A place where something was seen: a ring with its centre. */
export const stationMarks: readonly Mark[] = [
  { mark: 'stroke', path: circle([0, 0], 0.8), width: 0.24, ink: 'black' },
  { mark: 'fill', path: circle([0, 0], 0.26), ink: 'black' },
]

/** How a unit's letters are set inside its areas: nine points, heavy, with paper round them on any fill. */
export const unitLabelType = { size: 3.2, weight: 900, halo: 0.4 } as const
