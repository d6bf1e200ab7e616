import type { Paint, Surface, TextRun, Tiling } from '@shared/symbols/interpreter'
import type { Path } from '@shared/symbols/display-list'

/** One call that a surface was given. */
export type Call =
  | { call: 'path'; path: Path; paint: Paint }
  | { call: 'tile'; path: Path; tiling: Tiling }
  | { call: 'text'; run: TextRun }
  | { call: 'clip'; path: Path }
  | { call: 'group'; name: string; calls: Call[] }

/** A surface that lists what it is asked to draw. */
export function recordingSurface(): Surface & { calls: Call[] } {
  const calls: Call[] = []
  let into = calls
  return {
    calls,
    path: (path, paint) => void into.push({ call: 'path', path, paint }),
    tile: (path, tiling) => void into.push({ call: 'tile', path, tiling }),
    text: (run) => void into.push({ call: 'text', run }),
    clip: (path) => void into.push({ call: 'clip', path }),
    group(name, draw) {
      const outer = into
      const own: Call[] = []
      outer.push({ call: 'group', name, calls: own })
      into = own
      draw()
      into = outer
    },
  }
}
