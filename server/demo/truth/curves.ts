import type { Metres } from '@shared/units'

/** A smooth function of one number, and its exact derivative. */
export interface Curve {
  value(at: number): number
  slope(at: number): number
}

/** A sine of unit height. */
export function wave(at: Metres, length: Metres, phase = 0): number {
  return Math.sin((2 * Math.PI * at) / length + phase)
}

export const constant = (value: number): Curve => ({ value: () => value, slope: () => 0 })

/** A sine of this height and wavelength. */
export function waveCurve(height: number, length: Metres, phase = 0): Curve {
  const turn = (2 * Math.PI) / length
  return {
    value: (at) => height * Math.sin(turn * at + phase),
    slope: (at) => height * turn * Math.cos(turn * at + phase),
  }
}

/** A bell of this height about a middle. */
export function bumpCurve(height: number, middle: Metres, width: Metres): Curve {
  const value = (at: number) => height * Math.exp(-(((at - middle) / width) ** 2))
  return { value, slope: (at) => ((-2 * (at - middle)) / width ** 2) * value(at) }
}

/** A curve whose slope goes over from −steepness to +steepness about a middle: a trough with straight sides. */
export const troughCurve = (steepness: number, middle: Metres, width: Metres): Curve => ({
  value(at) {
    const from = Math.abs(at - middle) / width
    // log cosh, written so that it cannot overflow.
    return steepness * width * (from + Math.log1p(Math.exp(-2 * from)) - Math.LN2)
  },
  slope: (at) => steepness * Math.tanh((at - middle) / width),
})

/** Several curves added up. */
export const sumOf = (...curves: readonly Curve[]): Curve => ({
  value: (at) => curves.reduce((sum, curve) => sum + curve.value(at), 0),
  slope: (at) => curves.reduce((sum, curve) => sum + curve.slope(at), 0),
})

/** A curve raised or lowered so that it is zero at `origin`. */
export function levelledAt(curve: Curve, origin: number): Curve {
  const level = curve.value(origin)
  return { value: (at) => curve.value(at) - level, slope: (at) => curve.slope(at) }
}

/** Asymmetrical waves: cos φ − a sin 2φ is steeper on its lower side; φ gathers pace and slackens. */
export function asymmetricalWaves(length: Metres, phase: number, asymmetry: number, height: Curve): Curve {
  const turn = (2 * Math.PI) / length
  const pace = waveCurve(0.28, 9100, 0.4)
  const angleAt = (at: number) => turn * at + phase + pace.value(at)
  const shapeAt = (angle: number) => Math.cos(angle) - asymmetry * Math.sin(2 * angle)
  return {
    value: (at) => height.value(at) * shapeAt(angleAt(at)),
    slope(at) {
      const angle = angleAt(at)
      const shapeSlope = (-Math.sin(angle) - 2 * asymmetry * Math.cos(2 * angle)) * (turn + pace.slope(at))
      return height.slope(at) * shapeAt(angle) + height.value(at) * shapeSlope
    },
  }
}
