type Channels = readonly [red: number, green: number, blue: number]

/** Red, green and blue of #rrggbb, 0–255. */
export function channelsOf(hex: string): Channels {
  const value = Number.parseInt(hex.slice(1), 16)
  return [(value >> 16) & 255, (value >> 8) & 255, value & 255]
}

/** Light of one channel, 0–1. Source: WCAG 2.2, definition of relative luminance. */
function linear(channel: number): number {
  const share = channel / 255
  return share <= 0.04045 ? share / 12.92 : ((share + 0.055) / 1.055) ** 2.4
}

/** Relative luminance of #rrggbb, 0–1. Source: as above. */
export function luminance(hex: string): number {
  const [red, green, blue] = channelsOf(hex)
  return 0.2126 * linear(red) + 0.7152 * linear(green) + 0.0722 * linear(blue)
}

const hexOf = (channels: readonly number[]): `#${string}` =>
  `#${channels.map((channel) => Math.round(channel).toString(16).padStart(2, '0')).join('')}`

/** Two colours mixed, channel by channel.
 *  @param share of the first, 0–1 */
export function mixColours(a: string, b: string, share: number): `#${string}` {
  const other = channelsOf(b)
  return hexOf(channelsOf(a).map((channel, index) => channel * share + (other[index] ?? 0) * (1 - share)))
}

/** The grey that is as light as a colour. Source: the inverse of WCAG's formula above. */
export function greyOf(hex: string): `#${string}` {
  const light = luminance(hex)
  const share = light <= 0.0031308 ? light * 12.92 : 1.055 * light ** (1 / 2.4) - 0.055
  return hexOf([share, share, share].map((channel) => channel * 255))
}
