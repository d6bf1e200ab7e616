import { describe, expect, it } from 'vitest'
import { draftOf, fieldsOf, readDraft, textOf } from '@/components/compile/attitude-draft'
import { parseDeclination } from '@/components/compile/north-draft'

const draft = (text: string, more: Partial<Parameters<typeof readDraft>[0]> = {}) => ({
  text,
  overturned: false,
  northReference: 'true' as const,
  declination: '',
  ...more,
})

/** Convergence west of a central meridian in the north, as on the demo sheet. */
const CONVERGENCE = -2

describe('reading a draft', () => {
  // The same plane in both conventions and in quadrants. Source: tests/reference/orientation.ts, N45E 30SE = 045/30.
  it.each([
    ['045/40', 'strike-dip'],
    ['135/40', 'dip-direction-dip'],
    ['N45E 40SE', 'strike-dip'],
    ['N45E 40SE', 'dip-direction-dip'],
  ] as const)('takes %s in %s as strike 045 dipping 40', (text, convention) => {
    const read = readDraft(draft(text), convention, CONVERGENCE)
    expect(read).toMatchObject({ outcome: 'plane', plane: { strike: 45, dip: 40, overturned: false } })
  })

  it('keeps the reading as it was typed, with what it means', () => {
    const read = readDraft(draft(' N45E 40SE '), 'strike-dip', CONVERGENCE)
    expect(read).toMatchObject({
      reading: { text: 'N45E 40SE', convention: 'quadrant', northReference: 'true', declination: null },
    })
  })

  it('adds an easterly declination to a magnetic reading and takes a westerly one off', () => {
    const magnetic = { northReference: 'magnetic' as const }
    expect(readDraft(draft('045/40', { ...magnetic, declination: '10' }), 'strike-dip', 0)).toMatchObject({
      plane: { strike: 55 },
      reading: { declination: 10 },
    })
    expect(readDraft(draft('005/40', { ...magnetic, declination: '14.5 W' }), 'strike-dip', 0)).toMatchObject(
      {
        plane: { strike: 350.5 },
        reading: { declination: -14.5 },
      },
    )
  })

  it('refuses a magnetic reading without a declination, at the declination', () => {
    expect(readDraft(draft('045/40', { northReference: 'magnetic' }), 'strike-dip', 0)).toMatchObject({
      outcome: 'refused',
      field: 'declination',
    })
  })

  it('turns a grid reading by the convergence of its place', () => {
    expect(readDraft(draft('001/40', { northReference: 'grid' }), 'strike-dip', CONVERGENCE)).toMatchObject({
      plane: { strike: 359 },
    })
  })

  it('leaves a horizontal bed without a strike whatever the north', () => {
    expect(readDraft(draft('0', { northReference: 'grid' }), 'strike-dip', CONVERGENCE)).toMatchObject({
      plane: { strike: null, dip: 0 },
    })
  })

  it('writes into the reading that the bed is overturned, once', () => {
    for (const text of ['045/40', '045/40 ot', '045/40 overturned']) {
      const read = readDraft(draft(text, { overturned: true }), 'strike-dip', 0)
      expect(read).toMatchObject({ plane: { strike: 45, dip: 40, overturned: true } })
    }
    expect(readDraft(draft('045/40', { overturned: true }), 'strike-dip', 0)).toMatchObject({
      reading: { text: '045/40 overturned' },
    })
  })

  it.each(['N45E 40NE', '045/95', '361/40', 'forty'])('refuses %s', (text) => {
    expect(readDraft(draft(text), 'strike-dip', 0)).toMatchObject({ outcome: 'refused', field: 'text' })
  })
})

describe('a declination', () => {
  it.each([
    ['14.5', 14.5],
    ['-14.5', -14.5],
    ['−14,5°', -14.5],
    ['14.5 W', -14.5],
    ['3 E', 3],
    ['+3', 3],
  ])('typed %s is %f', (text, degrees) => {
    expect(parseDeclination(text)).toBe(degrees)
  })

  it.each(['', 'west', '181', '1e2'])('is not read from "%s"', (text) => {
    expect(parseDeclination(text)).toBeUndefined()
  })
})

describe('going on with an attitude', () => {
  const plane = {
    type: 'bedding',
    strike: 45,
    dip: 40,
    overturned: false,
    undulating: false,
    topsKnown: false,
    station: '',
    note: '',
  } as const
  const reading = (convention: 'strike-dip' | 'dip-direction-dip' | 'quadrant', text: string) => ({
    ...plane,
    reading: { text, convention, northReference: 'magnetic' as const, declination: -14 },
  })

  it('shows the reading as it was written where the sheet reads it the same way', () => {
    expect(draftOf(reading('strike-dip', '059/40'), 'strike-dip')).toMatchObject({
      text: '059/40',
      northReference: 'magnetic',
      declination: '14 W',
    })
    expect(draftOf(reading('quadrant', 'N59E 40SE'), 'dip-direction-dip').text).toBe('N59E 40SE')
  })

  it('shows the true values in the sheet’s own convention where the reading was in the other', () => {
    expect(draftOf(reading('strike-dip', '059/40'), 'dip-direction-dip')).toMatchObject({
      text: '135/40',
      northReference: 'true',
    })
  })
})

describe('separate fields', () => {
  it.each(['strike-dip', 'dip-direction-dip'] as const)('come back to the same plane in %s', (convention) => {
    for (let azimuth = 0; azimuth < 360; azimuth += 15) {
      const text = `${String(azimuth).padStart(3, '0')}/40`
      expect(textOf(fieldsOf(text, convention))).toBe(text)
    }
  })

  it('stand for a horizontal bed with a dip of 0 alone', () => {
    expect(fieldsOf('horizontal', 'strike-dip')).toEqual(['', '0'])
    expect(textOf(['', '0'])).toBe('0')
  })
})
