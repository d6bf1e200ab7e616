import { describe, expect, it } from 'vitest'
import { emptyDraft, readDraft, type SheetDraft } from '@shared/sheets/sheet-draft'

const aDraft = (changes: Partial<SheetDraft> = {}): SheetDraft => ({
  ...emptyDraft(),
  number: 'MI-15',
  title: 'Tern Sound',
  degrees: { west: '35°52\'30" W', south: '47.625', east: "35°45' W", north: '47°43\'30" N' },
  scale: '1:24 000',
  ...changes,
})

describe('readDraft', () => {
  it('reads a whole draft without a sentence', () => {
    const read = readDraft(aDraft())
    expect(read.errors).toEqual({})
    expect(read.area).toEqual({ by: 'degrees', west: -35.875, south: 47.625, east: -35.75, north: 47.725 })
    expect(read.scale).toBe(24_000)
  })

  it.each([
    [{ west: '0', south: '51', east: '1', north: '52' }, 32631],
    [{ west: '-1', south: '-34', east: '-0.5', north: '-33' }, 32730],
    // South-west Norway belongs to zone 32 though its longitude lies in 31.
    [{ west: '4', south: '60', east: '5', north: '61' }, 32632],
  ])('proposes the UTM zone of the middle of %j', (degrees, srid) => {
    expect(readDraft(aDraft({ degrees }))).toMatchObject({ proposedSrid: srid, srid })
  })

  it('prefers the code that was typed, with or without its prefix', () => {
    expect(readDraft(aDraft({ srid: 'EPSG:25826' })).srid).toBe(25826)
    expect(readDraft(aDraft({ srid: ' 3413 ' })).srid).toBe(3413)
    expect(readDraft(aDraft({ srid: 'UTM 26N' })).errors.srid).toMatch(/EPSG code is a number/)
  })

  it('needs the grid of an area in metres', () => {
    const metres = { west: '284 000', south: '5 278 000', east: '294 000', north: '5 289 000' }
    const read = readDraft(aDraft({ areaBy: 'metres', metres }))
    expect(read.area).toMatchObject({ by: 'metres', west: 284_000, north: 5_289_000 })
    expect(read.srid).toBeUndefined()
    expect(read.errors.srid).toMatch(/EPSG code of the grid/)
  })

  it('says which edge is on the wrong side, at that edge', () => {
    const degrees = { west: '10', south: '50', east: '9', north: '49' }
    const { area, errors } = readDraft(aDraft({ degrees }))
    expect(area).toBeUndefined()
    expect(errors).toMatchObject({ east: /east of the western/, north: /north of the southern/ })
  })

  it('names every empty field', () => {
    expect(Object.keys(readDraft(emptyDraft()).errors).sort()).toEqual(
      ['east', 'north', 'number', 'scale', 'south', 'title', 'west'].sort(),
    )
  })

  it.each(['mi-15', 'MI 15', '-15', 'A'.repeat(21)])('refuses the number %s', (number) => {
    expect(readDraft(aDraft({ number })).errors.number).toMatch(/up to 20 capital letters/)
  })

  it('takes a named page, or the sides of one of one’s own', () => {
    expect(readDraft(aDraft({ page: 'A2 portrait' })).page).toEqual({ width: 420, height: 594 })
    const ownPage = { width: '700', height: '' }
    const own = readDraft(aDraft({ page: 'own', ownPage }))
    expect(own.page).toBeUndefined()
    expect(own.errors).toEqual({ height: 'Write the height of the page.' })
  })

  it('keeps sheets within the latitudes of UTM', () => {
    const degrees = { west: '10', south: '84', east: '11', north: '85' }
    expect(readDraft(aDraft({ degrees })).errors.north).toMatch(/80° S and 84° N/)
  })
})
