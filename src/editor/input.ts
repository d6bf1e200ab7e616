import type { XY } from '@shared/units'

/** The pointer, in sheet metres. */
export interface PointerInput {
  at: XY
  alt: boolean
  shift: boolean
}

/** A key as the browser names it, with the modifiers that count. */
export interface KeyInput {
  key: string
  shift: boolean
  alt: boolean
}
