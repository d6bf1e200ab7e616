/** Numbers from 0 to 1 that only the seed decides. */
export type Random = () => number

/** Source: the mulberry32 generator by Tommy Ettinger, public domain. */
export function seededRandom(seed: number): Random {
  let state = seed >>> 0
  return () => {
    state = (state + 0x6d2b79f5) >>> 0
    let mixed = Math.imul(state ^ (state >>> 15), state | 1)
    mixed ^= mixed + Math.imul(mixed ^ (mixed >>> 7), mixed | 61)
    return ((mixed ^ (mixed >>> 14)) >>> 0) / 4294967296
  }
}

/** A version 4 UUID of the generator's making. */
export function randomId(random: Random): string {
  const digits = Array.from({ length: 32 }, () => Math.floor(random() * 16).toString(16))
  digits[12] = '4'
  digits[16] = (8 + Math.floor(random() * 4)).toString(16)
  const text = digits.join('')
  return [text.slice(0, 8), text.slice(8, 12), text.slice(12, 16), text.slice(16, 20), text.slice(20)].join(
    '-',
  )
}
