import { MAX_DRAWN_ITEMS, MAX_LISTED_REFUSALS, type IntakePreview } from '../api/intake'
import type { Item, ItemOf } from '../items/item'
import { describeAttitude } from '../structure/attitude-words'
import type { Metres } from '../units'
import { countByKind, type Applied } from './apply'
import type { SheetGround } from './place'

/** Readings that are repeated in words. */
const ECHOES = 5
/** A preview is drawn some 700 px wide: what moves less than a two-thousandth of the sheet cannot be seen on it. */
const FINEST = 1 / 2000

/** What applying a mapping gave, as a person looks at it before taking it in. */
export function toPreview(applied: Applied, ground: SheetGround): IntakePreview {
  const { items, refusals, outside, leftOut } = applied
  const step = Math.max(1, Math.ceil(items.length / MAX_DRAWN_ITEMS))
  const [west, south, east, north] = ground.box
  const finest = Math.max(east - west, north - south) * FINEST
  return {
    accepted: items.length,
    refused: refusals.length,
    outside,
    leftOut,
    byKind: countByKind(items),
    refusals: refusals.slice(0, MAX_LISTED_REFUSALS),
    echoes: echoesOf(applied),
    sample: items
      .filter((_, index) => index % step === 0)
      .map(({ item }) => ({ kind: item.kind, places: placesOf(item, finest) })),
  }
}

/** The first readings as written and in words, so that a wrong convention is seen at once. */
function echoesOf({ items }: Applied): IntakePreview['echoes'] {
  return items
    .filter((taken): taken is typeof taken & { item: ItemOf<'attitude'> } => taken.item.kind === 'attitude')
    .slice(0, ECHOES)
    .map(({ item, provenance }) => ({
      record: provenance.record,
      text: item.properties.reading?.text ?? '',
      words: describeAttitude(item.properties),
    }))
}

/** East, north, east, north … in whole metres, without vertices nearer than `finest` to the one before; ends are kept. */
function placesOf({ geometry }: Item, finest: Metres): number[] {
  if (geometry === null) return []
  if (geometry.type === 'Point') return geometry.coordinates.map(Math.round)
  const last = geometry.coordinates.length - 1
  let kept: readonly number[] | undefined
  return geometry.coordinates.flatMap(([east, north], index) => {
    const near = kept && Math.hypot(east - (kept[0] ?? 0), north - (kept[1] ?? 0)) < finest
    if (near && index < last) return []
    kept = [east, north]
    return [Math.round(east), Math.round(north)]
  })
}
