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
  let digits = ''
  for (let word = 0; word < 4; word++) {
    digits += Math.floor(random() * 4294967296)
      .toString(16)
      .padStart(8, '0')
  }
  const variant = (8 + Math.floor(random() * 4)).toString(16)
  return `${digits.slice(0, 8)}-${digits.slice(8, 12)}-4${digits.slice(13, 16)}-${variant}${digits.slice(17, 20)}-${digits.slice(20)}`
}

/** A number of the standard normal distribution. Source: Box and Muller 1958. */
export function normal(random: Random): number {
  // 1 − random is never zero.
  return Math.sqrt(-2 * Math.log(1 - random())) * Math.cos(2 * Math.PI * random())
}

/** The members in another order. Source: Fisher and Yates, in the form of Durstenfeld 1964. */
export function shuffled<T>(members: readonly T[], random: Random): T[] {
  const order = members.slice()
  for (let last = order.length - 1; last > 0; last--) {
    const other = Math.floor(random() * (last + 1))
    const [a, b] = [order[last], order[other]]
    if (a !== undefined && b !== undefined) [order[last], order[other]] = [b, a]
  }
  return order
}
