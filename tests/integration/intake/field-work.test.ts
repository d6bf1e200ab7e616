import { describe, expect, it } from 'vitest'
import type { Item, ItemOf } from '@shared/items/item'
import { angleBetween, type Degrees } from '@shared/units'
import { demoFieldFiles } from '../../../server/demo/field-files/field-files'
import { doFieldWork, fieldDeclination } from '../../../server/demo/field-files/field-work'
import type { Reading } from '../../../server/demo/field-files/party'
import { useIntakeDesk } from '../../support/intake-desk'

const desk = useIntakeDesk()

/** What was measured before it was written down, and the files that it was written to. */
const work = doFieldWork()
const files = demoFieldFiles(work)

/** Metres: seven decimals of a degree are a centimetre. */
const WRITTEN = 0.02
/** Readings against magnetic north are written in whole degrees, and the declination has half of one. */
const WHOLE_DEGREES: Degrees = 0.5

async function takeIn(name: string): Promise<Item[]> {
  const file = files.find((each) => each.name === name)
  if (!file) throw new Error(`The demo has no ${name}.`)
  const intake = await desk.brought(Buffer.from(file.bytes), name)
  const { refusals } = await desk.preview(intake)
  expect(refusals).toEqual([])
  expect((await desk.takeIn(intake)).body).toMatchObject({ accepted: intake.records, refused: 0 })
  return (await desk.items()).filter((item) => item.kind !== 'sheet-face')
}

const isAttitude = (item: Item): item is ItemOf<'attitude'> => item.kind === 'attitude'
const metresBetween = ([x, y]: readonly number[], [east, north]: readonly number[]): number =>
  Math.hypot((x ?? NaN) - (east ?? NaN), (y ?? NaN) - (north ?? NaN))

/** Expects an attitude of each reading: where it was made, and as it was read. */
function expectReadings(items: readonly Item[], readings: readonly Reading[], within: Degrees): void {
  const attitudes = items.filter(isAttitude)
  expect(attitudes).toHaveLength(readings.length)
  for (const { station, at, strike, dip, overturned } of readings) {
    const nearest = attitudes.find(({ geometry }) => metresBetween(geometry.coordinates, at) < WRITTEN)
    expect(nearest?.properties).toMatchObject({ station, dip, overturned })
    expect(angleBetween(nearest?.properties.strike ?? NaN, strike)).toBeLessThanOrEqual(within)
  }
}

describe('what was measured is what is on the sheet', () => {
  it('from KMZ, dip directions and the traces walked', async () => {
    const items = await takeIn('skua-burn.kmz')
    expectReadings(items, work.burn, 0)
    const traces = items.filter((item) => item.kind === 'other-line')
    expect(traces).toHaveLength(work.ashBand.length)
    for (const { line } of work.ashBand) {
      expect(
        traces.some(({ geometry }) => metresBetween(geometry.coordinates[0] ?? [], line[0] ?? []) < WRITTEN),
      ).toBe(true)
    }
  })

  it('from a zipped shapefile in the next zone', async () => {
    const items = await takeIn('coast-mapping.zip')
    expectReadings(items, work.coast, 0)
    expect(items.filter((item) => item.kind === 'contact')).toHaveLength(work.siltBoundary.length)
  })

  it('from a table of strikes and dips', async () => {
    expectReadings(await takeIn('stations-strike-dip.csv'), work.strikes, 0)
  })

  it('from a table of magnetic readings, with the declination that it states', async () => {
    const items = await takeIn('stations-magnetic.csv')
    expectReadings(items, work.magnetic, WHOLE_DEGREES)
    expect(items.find(isAttitude)?.properties.reading).toMatchObject({
      northReference: 'magnetic',
      declination: fieldDeclination,
    })
  })
})
