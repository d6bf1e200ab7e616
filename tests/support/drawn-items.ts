import type { ItemOf } from '@shared/items/item'
import {
  axialTracePropertiesSchema,
  contactPropertiesSchema,
  faultPropertiesSchema,
  type AxialTraceProperties,
  type ContactProperties,
  type FaultProperties,
} from '@shared/items/lines'
import { attitudePropertiesSchema, type AttitudeProperties } from '@shared/items/points'
import type { DrawingFrame } from '@shared/symbols/frame'
import type { XY } from '@shared/units'

const id = '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e01'
const line = (coordinates: XY[]) => ({ type: 'LineString' as const, coordinates })

/** A frame in which a metre is a millimetre, with one convergence everywhere. */
export const plainFrame = (convergence = 0): DrawingFrame => ({
  origin: [0, 0],
  mmPerMetre: 1,
  convergenceAt: () => convergence,
})

/** A bedding attitude at the origin. */
export const aDrawnAttitude = (properties: Partial<AttitudeProperties>): ItemOf<'attitude'> => ({
  kind: 'attitude',
  id,
  geometry: { type: 'Point', coordinates: [0, 0] },
  properties: attitudePropertiesSchema.parse({ strike: 45, dip: 40, ...properties }),
})

export const aDrawnContact = (
  coordinates: XY[],
  properties: Partial<ContactProperties> = {},
): ItemOf<'contact'> => ({
  kind: 'contact',
  id,
  geometry: line(coordinates),
  properties: contactPropertiesSchema.parse(properties),
})

export const aDrawnFault = (
  coordinates: XY[],
  properties: Partial<FaultProperties> = {},
): ItemOf<'fault'> => ({
  kind: 'fault',
  id,
  geometry: line(coordinates),
  properties: faultPropertiesSchema.parse(properties),
})

export const aDrawnAxialTrace = (
  coordinates: XY[],
  properties: Partial<AxialTraceProperties> = {},
): ItemOf<'axial-trace'> => ({
  kind: 'axial-trace',
  id,
  geometry: line(coordinates),
  properties: axialTracePropertiesSchema.parse({ form: 'anticline', ...properties }),
})

/** A straight line of a length from a point in a grid azimuth. */
export function straight(azimuth: number, length: number, [x, y]: XY = [0, 0]): XY[] {
  const turn = (azimuth * Math.PI) / 180
  return [
    [x, y],
    [x + length * Math.sin(turn), y + length * Math.cos(turn)],
  ]
}

/** A gently waving line of a length in a grid azimuth, in steps of about half a millimetre. */
export function waving(azimuth: number, length: number, amplitude = 1.5): XY[] {
  const turn = (azimuth * Math.PI) / 180
  return Array.from({ length: Math.round(length * 2) + 1 }, (_, index): XY => {
    const along = index / 2
    const across = amplitude * Math.sin(along / 8)
    return [
      along * Math.sin(turn) + across * Math.cos(turn),
      along * Math.cos(turn) - across * Math.sin(turn),
    ]
  })
}
