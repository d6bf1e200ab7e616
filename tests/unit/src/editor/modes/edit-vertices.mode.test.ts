import { describe, expect, it } from 'vitest'
import type { Item } from '@shared/items/item'
import { EditVerticesMode } from '@/editor/modes/edit-vertices.mode'
import { aWorkbench, at, key } from '../../../../support/fake-map'
import { aLine, aPoint } from '../../../../support/sheet-items'

function editing(selected: Item, ...others: Item[]) {
  const { bench, map, host } = aWorkbench([selected, ...others])
  bench.selected = [selected.id]
  const mode = new EditVerticesMode(map, host)
  mode.begin()
  const line = (item: Item = selected) => bench.sheet.get(item.id)?.geometry?.coordinates
  const drag = (from: [number, number], to: [number, number], alt = false) => {
    const taken = mode.press(at(...from, { alt }))
    mode.drag(at(...to))
    mode.release(at(...to))
    return taken
  }
  return { bench, mode, line, drag }
}

const bent = () =>
  aLine(
    'contact',
    [
      [0, 0],
      [100, 0],
      [200, 0],
    ],
    {},
  )

describe('editing vertices', () => {
  it('moves the vertex that is dragged', () => {
    const { bench, line, drag } = editing(bent())
    expect(drag([101, 2], [110, 60])).toBe(true)
    expect(line()).toEqual([
      [0, 0],
      [110, 60],
      [200, 0],
    ])
    expect(bench.commits.map(({ label }) => label)).toEqual(['moved a vertex of a contact'])
  })

  it('moves every line that meets at the vertex, and this one alone with Alt', () => {
    const meeting = aLine(
      'fault',
      [
        [100, 0],
        [100, -90],
      ],
      {},
    )
    const together = editing(bent(), meeting)
    together.drag([100, 0], [110, 60])
    expect(together.line(meeting)).toEqual([
      [110, 60],
      [100, -90],
    ])
    expect(together.bench.commits).toHaveLength(1)
    const alone = editing(bent(), meeting)
    alone.drag([100, 0], [110, 60], true)
    expect(alone.line(meeting)).toEqual([
      [100, 0],
      [100, -90],
    ])
  })

  it('puts a vertex in where the side of the line is dragged', () => {
    const { line, drag } = editing(bent())
    drag([50, 3], [50, 40])
    expect(line()).toEqual([
      [0, 0],
      [50, 40],
      [100, 0],
      [200, 0],
    ])
  })

  it('leaves a drag beside the line to panning', () => {
    const { bench, drag } = editing(bent())
    expect(drag([50, 60], [50, 90])).toBe(false)
    expect(bench.commits).toEqual([])
  })

  it('changes nothing by a press that does not move', () => {
    const { bench, drag } = editing(bent())
    drag([100, 0], [101, 0])
    expect(bench.commits).toEqual([])
  })

  it('takes a vertex out by Alt-click and by Delete, but never the last but one', () => {
    const { bench, mode, line } = editing(bent())
    mode.click(at(100, 0, { alt: true }))
    expect(line()).toEqual([
      [0, 0],
      [200, 0],
    ])
    mode.click(at(200, 0))
    mode.key(key('Delete'))
    expect(line()).toEqual([
      [0, 0],
      [200, 0],
    ])
    expect(bench.said.at(-1)).toMatch(/Delete the line itself/)
  })

  it('works by keys and typed places alone', () => {
    const { mode, line } = editing(bent())
    mode.key(key(']'))
    mode.key(key(']'))
    expect(mode.typed([105.5, 44])).toBe(true)
    expect(line()).toEqual([
      [0, 0],
      [105.5, 44],
      [200, 0],
    ])
    mode.key(key('['))
    mode.key(key('Insert'))
    expect(line()).toHaveLength(4)
    mode.key(key('Delete'))
    expect(line()).toEqual([
      [0, 0],
      [105.5, 44],
      [200, 0],
    ])
  })

  it('snaps the dragged vertex to the end of another line, bit for bit', () => {
    const other = aLine(
      'contact',
      [
        [150.001, 50.002],
        [300, 80],
      ],
      {},
    )
    const { line, drag } = editing(bent(), other)
    drag([200, 0], [147, 47])
    expect(line()?.at(-1)).toEqual([150.001, 50.002])
  })

  it('moves a selected point', () => {
    const station = aPoint('station', [10, 10], {})
    const { line, drag } = editing(station)
    drag([11, 10], [30, 40])
    expect(line()).toEqual([30, 40])
  })

  it('takes hold of nothing on a sheet that is read-only', () => {
    const { bench, drag } = editing(bent())
    bench.readOnly = 'The sheet is submitted.'
    expect(drag([100, 0], [110, 60])).toBe(false)
  })
})
