import type { Paint, Surface, TextRun } from '@shared/symbols/interpreter'
import type { Path } from '@shared/symbols/display-list'

/** One call that a surface was given. */
export type Call =
  | { call: 'path'; path: Path; paint: Paint }
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
