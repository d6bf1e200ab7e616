import { z } from 'zod'

const azimuthRule = 'An azimuth is a number from 0 up to, but not including, 360.'
/** Degrees clockwise from true north, 0 ≤ a < 360. */
export const azimuthSchema = z.number(azimuthRule).min(0, azimuthRule).lt(360, azimuthRule)

const inclinationRule = 'A dip or plunge is a number from 0 to 90.'
/** Degrees below horizontal, 0–90. */
export const inclinationSchema = z.number(inclinationRule).min(0, inclinationRule).max(90, inclinationRule)
