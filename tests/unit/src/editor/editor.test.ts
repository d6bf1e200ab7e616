import { describe, expect, it, vi } from 'vitest'
import { Editor } from '@/editor/editor'
import { aWorkbench, at, key } from '../../../support/fake-map'
import { aLine, aPoint, aUnit } from '../../../support/sheet-items'

describe('selecting', () => {
  it('takes the likeliest item, and the one beneath at the second click', () => {
    const [line, station] = [
      aLine(
        'contact',
        [
          [0, 0],
          [100, 0],
        ],
        {},
      ),
      aPoint('station', [50, 2], {}),
    ]
    const { bench, map, host } = aWorkbench([line, station])
    const editor = new Editor(map, host, vi.fn())
    editor.click(at(50, 1))
    expect(bench.selected).toEqual([station.id])
    editor.click(at(50, 1))
    expect(bench.selected).toEqual([line.id])
    editor.click(at(50, 400))
    expect(bench.selected).toEqual([])
  })

  it('adds and takes away with shift', () => {
    const [one, two] = [aPoint('station', [0, 0], {}), aPoint('station', [90, 0], {})]
    const { bench, map, host } = aWorkbench([one, two])
    const editor = new Editor(map, host, vi.fn())
    editor.click(at(0, 0))
    editor.click(at(90, 0, { shift: true }))
    expect(bench.selected).toEqual([one.id, two.id])
    editor.click(at(0, 0, { shift: true }))
    expect(bench.selected).toEqual([two.id])
  })

  it('removes what is selected by Delete', () => {
    const station = aPoint('station', [0, 0], {})
    const { bench, map, host } = aWorkbench([station])
    const editor = new Editor(map, host, vi.fn())
    editor.click(at(0, 0))
    expect(editor.key(key('Delete'))).toBe(true)
    expect(bench.commits.map(({ label }) => label)).toEqual(['removed a station'])
    expect(editor.key(key('Delete'))).toBe(false)
  })
})

describe('placing', () => {
  it.each([
    ['attitude', { type: 'bedding' }],
    ['lineation', { type: 'lineation' }],
  ] as const)('asks for the reading of %s instead of placing one without', (kind, properties) => {
    const { bench, map, host } = aWorkbench([], { kind, title: 'Pen', properties })
    const editor = new Editor(map, host, vi.fn())
    editor.take('draw')
    editor.click(at(12.34567, 5))
    expect(bench.places).toEqual([[12.346, 5]])
    expect(bench.commits).toEqual([])
  })

  it('places a spring at once, and calls it one', () => {
    const pen = { kind: 'station', title: 'Spring', properties: { type: 'spring' } } as const
    const { bench, map, host } = aWorkbench([], pen)
    const editor = new Editor(map, host, vi.fn())
    editor.take('draw')
    editor.click(at(7, 8))
    expect(bench.commits[0]).toMatchObject({
      label: 'placed a spring',
      edits: [{ after: { kind: 'station', properties: { type: 'spring', azimuth: null } } }],
    })
  })

  it('places a unit’s label at once', () => {
    const unit = aUnit({})
    const { bench, map, host } = aWorkbench([unit], {
      kind: 'unit-label',
      title: 'Label',
      properties: { unit: unit.id },
    })
    const editor = new Editor(map, host, vi.fn())
    editor.take('draw')
    editor.typed([7, 8])
    expect(bench.commits[0]?.edits[0]?.after).toMatchObject({
      kind: 'unit-label',
      geometry: { coordinates: [7, 8] },
      properties: { unit: unit.id, identity: 'certain' },
    })
  })
})

describe('measuring', () => {
  it('tells the length along the clicks and the azimuth of the last piece from true north', () => {
    const { bench, map, host } = aWorkbench()
    const editor = new Editor(map, host, vi.fn())
    editor.take('measure')
    editor.click(at(0, 0))
    editor.click(at(0, 300))
    editor.click(at(400, 300))
    // Grid azimuth 090° with grid north 2° west of true north (convergence −2°): 088°.
    expect(bench.said.at(-1)).toBe('700 m, azimuth 088°')
    expect(bench.commits).toEqual([])
  })
})

describe('a gesture that fails', () => {
  it('is given up with a sentence, and the workplace goes on', () => {
    const { bench, map, host } = aWorkbench([], { kind: 'contact', title: 'Contact', properties: {} })
    const failed = vi.fn()
    const editor = new Editor(
      map,
      {
        ...host,
        newId: () => {
          throw new RangeError('no more ids')
        },
      },
      failed,
    )
    editor.take('draw')
    editor.click(at(0, 0))
    editor.click(at(50, 0))
    editor.key(key('Enter'))
    expect(failed).toHaveBeenCalledOnce()
    expect(bench.commits).toEqual([])
    expect(bench.sketch).toBeNull()
    expect(bench.said.at(-1)).toMatch(/Nothing on the sheet has changed/)
    editor.click(at(0, 0))
    expect(failed).toHaveBeenCalledOnce()
  })
})
