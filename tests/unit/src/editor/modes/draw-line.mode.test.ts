import { describe, expect, it } from 'vitest'
import type { ItemOf } from '@shared/items/item'
import { DrawLineMode } from '@/editor/modes/draw-line.mode'
import { aWorkbench, at, key } from '../../../../support/fake-map'
import { aLine } from '../../../../support/sheet-items'

const pen = {
  kind: 'contact',
  title: 'Contact, approximate',
  properties: { locationConfidence: 'approximate' },
} as const

function drawing(items: Parameters<typeof aWorkbench>[0] = []) {
  const { bench, map, host } = aWorkbench(items, pen)
  const mode = new DrawLineMode(map, host, pen)
  mode.begin()
  const drawn = () => bench.commits[0]?.edits[0]?.after as ItemOf<'contact'> | undefined
  return { bench, mode, drawn }
}

describe('drawing a line', () => {
  it('commits one line of the pen’s kind when it is ended by Enter, and selects it', () => {
    const { bench, mode, drawn } = drawing()
    mode.click(at(0, 0))
    mode.click(at(100, 0))
    mode.click(at(100, 80))
    expect(mode.key(key('Enter'))).toBe(true)
    expect(drawn()?.geometry.coordinates).toEqual([
      [0, 0],
      [100, 0],
      [100, 80],
    ])
    expect(drawn()?.properties.locationConfidence).toBe('approximate')
    expect(bench.commits[0]?.label).toBe('drew a contact')
    expect(bench.selected).toEqual([drawn()?.id])
    expect(bench.sketch).toBeNull()
  })

  it('takes the second click of a double click for the end, not for another vertex', () => {
    const { mode, drawn } = drawing()
    mode.click(at(0, 0))
    mode.click(at(100, 0))
    mode.click(at(101, 1))
    mode.doubleClick()
    expect(drawn()?.geometry.coordinates).toEqual([
      [0, 0],
      [100, 0],
    ])
  })

  it('takes back the last vertex by Backspace and by undo, and gives up by Escape', () => {
    const { bench, mode } = drawing()
    mode.click(at(0, 0))
    mode.click(at(100, 0))
    mode.key(key('Backspace'))
    expect(bench.sketch?.line).toEqual([[0, 0]])
    expect(mode.undoStep()).toBe(true)
    expect(mode.undoStep()).toBe(false)
    mode.click(at(5, 5))
    expect(mode.key(key('Escape'))).toBe(true)
    expect(mode.key(key('Escape'))).toBe(false)
    expect(bench.commits).toEqual([])
  })

  it('says why one vertex is no line, and goes on', () => {
    const { bench, mode, drawn } = drawing()
    mode.click(at(0, 0))
    mode.key(key('Enter'))
    expect(bench.said.at(-1)).toMatch(/two different places/)
    mode.click(at(50, 0))
    mode.key(key('Enter'))
    expect(drawn()?.geometry.coordinates).toHaveLength(2)
  })

  it('keeps the sketch when the sheet refuses the line', () => {
    const { bench, mode } = drawing()
    bench.refusal = 'The sheet is submitted.'
    mode.click(at(0, 0))
    mode.click(at(50, 0))
    mode.key(key('Enter'))
    expect(bench.said.at(-1)).toBe('The sheet is submitted.')
    expect(bench.sketch?.line).toHaveLength(2)
  })

  it('closes a ring when the first vertex is clicked again, with the very same numbers', () => {
    const { mode, drawn } = drawing()
    for (const [east, north] of [
      [0, 0],
      [100, 0],
      [100, 100],
    ] as const)
      mode.click(at(east, north))
    mode.click(at(3, -2))
    expect(drawn()?.geometry.coordinates.at(-1)).toEqual([0, 0])
  })

  it('takes typed places as they are, beside clicked ones', () => {
    const { mode, drawn } = drawing([
      aLine(
        'fault',
        [
          [0, 4],
          [300, 4],
        ],
        {},
      ),
    ])
    mode.typed([0.5, 0.25])
    mode.typed([120, 7.125])
    mode.key(key('Enter'))
    expect(drawn()?.geometry.coordinates).toEqual([
      [0.5, 0.25],
      [120, 7.125],
    ])
  })

  it('starts at the end of a line nearby, bit for bit', () => {
    const { mode, drawn } = drawing([
      aLine(
        'contact',
        [
          [10.123, 20.456],
          [200, 20],
        ],
        {},
      ),
    ])
    mode.click(at(14, 16))
    mode.click(at(14, -90))
    mode.key(key('Enter'))
    expect(drawn()?.geometry.coordinates[0]).toEqual([10.123, 20.456])
  })

  it('gives a line whose side it was snapped onto a vertex at that very place', () => {
    const fault = aLine(
      'fault',
      [
        [0, 0],
        [200, 0],
      ],
      {},
    )
    const { bench, mode, drawn } = drawing([fault])
    mode.click(at(70.1234, 5))
    mode.click(at(70, 90))
    mode.key(key('Enter'))
    const node = drawn()?.geometry.coordinates[0]
    expect(node).toEqual([70.123, 0])
    expect(bench.sheet.get(fault.id)?.geometry?.coordinates).toEqual([[0, 0], node, [200, 0]])
    expect(bench.commits).toHaveLength(1)
  })

  it('snaps to nothing while snapping is off', () => {
    const { bench, mode, drawn } = drawing([
      aLine(
        'contact',
        [
          [10, 20],
          [200, 20],
        ],
        {},
      ),
    ])
    bench.snapping = false
    mode.click(at(14, 18))
    mode.click(at(14, -90))
    mode.key(key('Enter'))
    expect(drawn()?.geometry.coordinates[0]).toEqual([14, 18])
  })
})

describe('a line that is left unfinished', () => {
  it('is there again when one comes back, and goes on where it was', () => {
    const { bench, map, host } = aWorkbench([], pen)
    const before = new DrawLineMode(map, host, pen)
    before.begin()
    before.click(at(0, 0))
    before.click(at(100, 0))
    before.end()
    expect(bench.sketch).toBeNull()
    const after = new DrawLineMode(map, host, pen)
    after.begin()
    expect(bench.sketch?.line).toEqual([
      [0, 0],
      [100, 0],
    ])
    after.click(at(100, 80))
    after.key(key('Enter'))
    expect(bench.commits).toHaveLength(1)
    expect(bench.kept).toEqual([])
  })

  it('is forgotten once it is given up', () => {
    const { bench, mode } = drawing()
    mode.click(at(0, 0))
    expect(bench.kept).toEqual([[0, 0]])
    mode.key(key('Escape'))
    expect(bench.kept).toEqual([])
  })
})
