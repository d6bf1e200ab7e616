import type { XY } from '@shared/units'

/** What is shown over the map while somebody draws or edits; all in sheet metres. */
export interface Sketch {
  line?: readonly XY[]
  /** Part that follows the pointer, dashed. */
  preview?: readonly XY[]
  vertices?: readonly { at: XY; active: boolean }[]
  snap?: { at: XY; to: 'end' | 'vertex' | 'line' | 'point' }
  label?: { at: XY; text: string }
}
