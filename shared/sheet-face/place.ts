import type { DisplayList, Mark, Path, PathStep } from '../symbols/display-list'
import type { Millimetres } from '../units'

/** A display list moved on the page. */
export const place = (list: DisplayList, x: Millimetres, y: Millimetres): Mark[] =>
  list.map((mark) => moveMark(mark, x, y))

function moveMark(mark: Mark, x: Millimetres, y: Millimetres): Mark {
  switch (mark.mark) {
    case 'text':
      return { ...mark, at: [mark.at[0] + x, mark.at[1] + y] }
    case 'group':
      return {
        ...mark,
        marks: place(mark.marks, x, y),
        ...(mark.clip ? { clip: movePath(mark.clip, x, y) } : {}),
      }
    default:
      return { ...mark, path: movePath(mark.path, x, y) }
  }
}

const movePath = (path: Path, x: Millimetres, y: Millimetres): Path =>
  path.map((step) => moveStep(step, x, y))

function moveStep(step: PathStep, x: Millimetres, y: Millimetres): PathStep {
  switch (step[0]) {
    case 'close':
      return step
    case 'curve':
      return ['curve', step[1] + x, step[2] + y, step[3] + x, step[4] + y, step[5] + x, step[6] + y]
    default:
      return [step[0], step[1] + x, step[2] + y]
  }
}
