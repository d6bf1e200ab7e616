import type { Mark } from '../symbols/display-list'
import { polyline } from '../symbols/paths'
import { toRadians, type Degrees, type Millimetres, type MM } from '../units'
import { stack, paragraph, space, type Block } from './block'
import { angleInWords } from './figures'
import { textLines, type TextStyle } from './text-block'
import type { TypeScale } from './type-scale'

/** Length of the arrows at type factor 1 and above. */
const ARM: Millimetres = 22
/** Room above the arrows for their names, and beside the text for the whole diagram. */
const LABEL: Millimetres = 4.5
const ROOM: Millimetres = 30
/** Least drawn angle between the two norths: a smaller one could not be told apart. */
const LEAST_DRAWN: Degrees = 7

/** Where grid north lies, in figures. */
export function convergenceWords(convergence: Degrees): string {
  if (Math.round(Math.abs(convergence) * 60) === 0)
    return 'Grid north and true north agree at the centre of the sheet.'
  return `At the centre of the sheet, grid north lies ${angleInWords(convergence)} of true north.`
}

/** True and grid north from one point with the convergence in figures. Magnetic north is not computed, and it says so.
 *  @param convergence azimuth of grid north from true north at the sheet's centre, degrees, clockwise positive */
export function northDiagram(convergence: Degrees, width: Millimetres, type: TypeScale): Block {
  const words = paragraph(
    `${convergenceWords(convergence)} Magnetic declination is not stated. The angle is not drawn to scale.`,
    width - ROOM,
    type.small,
  )
  const arm = ARM * Math.min(1, type.factor ** 2)
  const heading = stack([paragraph('NORTH', width, type.age), space(0.8 * type.factor)])
  return {
    height: heading.height + Math.max(words.height, arm + LABEL),
    draw: (x, top) => [
      ...heading.draw(x, top),
      ...arrows(convergence, [x + 12, top - heading.height - arm - LABEL], arm),
      ...words.draw(x + ROOM, top - heading.height),
    ],
  }
}

function arrows(convergence: Degrees, foot: MM, arm: Millimetres): Mark[] {
  const agree = Math.round(Math.abs(convergence) * 60) === 0
  // The frame's up is grid north; true north lies the other way round from it.
  const drawn = agree ? 0 : -Math.sign(convergence) * Math.max(LEAST_DRAWN, Math.abs(convergence))
  const grid = tip(foot, 0, arm)
  const north = tip(foot, drawn, arm)
  const outside = drawn < 0 ? -1 : 1
  const label = (text: string, at: MM, side: number): Mark[] =>
    textLines(
      [text],
      { x: at[0] + side, top: at[1] + 3.6, align: side < 0 ? 'end' : side > 0 ? 'start' : 'middle' },
      NAME,
    )
  return [
    line(foot, grid),
    ...(agree ? [] : [line(foot, north)]),
    head(north, drawn),
    ...label(agree ? 'true and grid' : 'true', north, agree ? 0 : outside),
    ...(agree ? [] : label('grid', grid, -outside)),
  ]
}

const NAME: TextStyle = { size: 2.4, weight: 700, ink: 'frame', leading: 1.2 }

const tip = ([x, y]: MM, azimuth: Degrees, length: Millimetres): MM => [
  x + Math.sin(toRadians(azimuth)) * length,
  y + Math.cos(toRadians(azimuth)) * length,
]

const line = (from: MM, to: MM): Mark => ({
  mark: 'stroke',
  path: polyline([from, to]),
  width: 0.2,
  ink: 'frame',
})

/** A slim solid head at the tip of the true north line. */
function head(at: MM, azimuth: Degrees): Mark {
  const back = tip(at, azimuth + 180, 5)
  const left = tip(back, azimuth - 90, 1.1)
  const right = tip(back, azimuth + 90, 1.1)
  return {
    mark: 'fill',
    path: polyline([at, left, right], true),
    ink: 'frame',
  }
}
