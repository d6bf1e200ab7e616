import { describe, expect, it } from 'vitest'
import type { Face } from '@shared/api/faces'
import { sheetProjection } from '@shared/geometry/projection'
import { Scene } from '@/map/scene'
import { aPrintedSheet } from '../../../support/printed-sheet'
import { aPoint, aSheetFace, aUnit } from '../../../support/sheet-items'

const sheet = aPrintedSheet()
const unit = aUnit({ label: 'Dr' })
const label = aPoint('unit-label', [289_010, 5_283_010], { unit: unit.id })

/** An area of 20 × 20 m: less than a millimetre in print at 1:24 000. */
const ring: [number, number][] = [
  [289_000, 5_283_000],
  [289_020, 5_283_000],
  [289_020, 5_283_020],
  [289_000, 5_283_020],
  [289_000, 5_283_000],
]
const small: Face = { unit: unit.id, rings: [ring] }
const around: Face = {
  unit: null,
  rings: [sheet.neatline.map(([east, north]): [number, number] => [east, north]), ring],
}

function open(faces: Face[]): Scene {
  const scene = new Scene(sheet, sheetProjection(sheet.crs.proj4))
  scene.setItems([unit, label, aSheetFace()])
  scene.setFaces(faces)
  return scene
}

describe('letters of an area that is too small for them', () => {
  it('are found where they stand', () => {
    const scene = open([small, around])
    const metresPerMm = 24
    const letters = scene.arrowOf(label, metresPerMm)?.at(-1)
    if (!letters) throw new Error('The letters were not moved.')
    const arrows = { furthest: 12 * metresPerMm, of: () => scene.arrowOf(label, metresPerMm) }
    const found = scene.index.pick(letters, { line: 20, point: 30, arrows })
    expect(found.map(({ id }) => id)).toEqual([label.id])
  })

  it('stand at their place as long as areas are not known', () => {
    expect(open([]).arrowOf(label, 24)).toBeUndefined()
  })
})
