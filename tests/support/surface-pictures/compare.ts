import pixelmatch from 'pixelmatch'
import { PNG } from 'pngjs'

/** Share of pixels that differ beyond what smoothed edges explain, 0–1, and a picture that shows them in red.
 *  @param tolerance colour difference that counts as none, 0–1 */
export function comparePictures(a: PNG, b: PNG, tolerance = 0.1): { share: number; difference: PNG } {
  if (a.width !== b.width || a.height !== b.height) {
    throw new RangeError(`${a.width} × ${a.height} px cannot be compared with ${b.width} × ${b.height} px.`)
  }
  const difference = new PNG({ width: a.width, height: a.height })
  const count = pixelmatch(a.data, b.data, difference.data, a.width, a.height, { threshold: tolerance })
  return { share: count / (a.width * a.height), difference }
}
