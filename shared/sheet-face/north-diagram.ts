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
/** Room above for a name that stands higher than its neighbours. */
const RAISED: Millimetres = 3
const ROOM: Millimetres = 30
/** Least drawn angle between two norths: a smaller one could not be told apart. A larger one than the most would lie flat. */
const LEAST_DRAWN: Degrees = 7
const MOST_DRAWN: Degrees = 24

/** Where grid north lies, in figures. */
export function convergenceWords(convergence: Degrees): string {
  if (Math.round(Math.abs(convergence) * 60) === 0)
    return 'Grid north and true north agree at the centre of the sheet.'
  return `At the centre of the sheet, grid north lies ${angleInWords(convergence)} of true north.`
}

/** Magnetic north as someone states it. */
export interface MagneticNorth {
  /** Azimuth of magnetic north from true north, degrees, east positive. */
  declination: Degrees
  /** When it held, and by what: `2026.9, World Magnetic Model 2025`. */
  asOf: string
}

/** Where magnetic north lies from true north, and from grid north. Source: grid–magnetic angle = declination −
 *  convergence; geodesy.md section 1. */
export function declinationWords({ declination, asOf }: MagneticNorth, convergence: Degrees): string {
  const fromGrid = declination - convergence
  return `Magnetic north lies ${angleInWords(declination)} of true north and ${angleInWords(fromGrid)} of grid north (${asOf}).`
}

/** True, grid and, where it is stated, magnetic north from one point, with their angles in figures. Magnetic north is never
 *  computed; where nobody states it, the diagram says so.
 *  @param convergence azimuth of grid north from true north at the sheet's centre, degrees, clockwise positive */
export function northDiagram(
  convergence: Degrees,
  width: Millimetres,
  type: TypeScale,
  magnetic?: MagneticNorth,
): Block {
  const stated = magnetic ? declinationWords(magnetic, convergence) : 'Magnetic declination is not stated.'
  const drawn = magnetic ? 'The angles are not drawn to scale.' : 'The angle is not drawn to scale.'
  const words = paragraph(`${convergenceWords(convergence)} ${stated} ${drawn}`, width - ROOM, type.small)
  const arm = ARM * Math.min(1, type.factor ** 2)
  const label = LABEL + (magnetic ? RAISED : 0)
  const heading = stack([paragraph('NORTH', width, type.age), space(0.8 * type.factor)])
  return {
    height: heading.height + Math.max(words.height, arm + label),
    draw: (x, top) => [
      ...heading.draw(x, top),
      ...arrows(drawnNorths(convergence, magnetic), [x + 12, top - heading.height - arm - label], arm),
      ...words.draw(x + ROOM, top - heading.height),
    ],
  }
}

type North = 'true' | 'grid' | 'magnetic'

/** Norths that are drawn as one arrow, and its azimuth on the drawing, whose up is grid north. */
interface DrawnNorth {
  names: North[]
  azimuth: Degrees
}

/** The arrows from west to east: in their true order, but far enough apart to be told from one another. Norths that agree
 *  to the minute share one. */
export function drawnNorths(convergence: Degrees, magnetic?: MagneticNorth): DrawnNorth[] {
  const norths: DrawnNorth[] = []
  for (const [name, azimuth] of [
    ['grid', 0],
    ['true', -convergence],
    ...(magnetic ? ([['magnetic', magnetic.declination - convergence]] as const) : []),
  ] as const) {
    const same = norths.find((north) => Math.round(Math.abs(north.azimuth - azimuth) * 60) === 0)
    if (same) same.names.unshift(name)
    else norths.push({ names: [name], azimuth })
  }
  norths.sort((a, b) => a.azimuth - b.azimuth)
  const grid = norths.findIndex(({ names }) => names.includes('grid'))
  return norths.map(({ names, azimuth }, index) => {
    const places = index - grid
    if (places === 0) return { names, azimuth: 0 }
    const least = LEAST_DRAWN * Math.abs(places)
    const drawn = Math.min(MOST_DRAWN * Math.abs(places), Math.max(least, Math.abs(azimuth)))
    return { names, azimuth: Math.sign(places) * drawn }
  })
}

function arrows(norths: readonly DrawnNorth[], foot: MM, arm: Millimetres): Mark[] {
  return norths.flatMap(({ names, azimuth }, index) => {
    const at = tip(foot, azimuth, arm)
    const isFirst = index === 0
    const isLast = index === norths.length - 1
    const align = isFirst === isLast ? 'middle' : isFirst ? 'end' : 'start'
    // The middle one of three stands higher: between the two others there is no room.
    const raised = !isFirst && !isLast ? NAME.size * NAME.leading : 0
    const shifted = align === 'end' ? -1 : align === 'start' ? 1 : 0
    return [
      line(foot, at),
      ...(names.includes('true') ? [head(at, azimuth)] : []),
      ...(names.includes('magnetic') ? [halfHead(at, azimuth)] : []),
      ...textLines([names.join(' and ')], { x: at[0] + shifted, top: at[1] + 3.6 + raised, align }, NAME),
    ]
  })
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

/** Half a head, on the eastern side: the mark of a compass needle. */
function halfHead(at: MM, azimuth: Degrees): Mark {
  const back = tip(at, azimuth + 180, 5)
  return {
    mark: 'fill',
    path: polyline([at, back, tip(back, azimuth + 90, 1.3)], true),
    ink: 'frame',
  }
}
