import type { Box } from '../geometry/box'
import type { Published } from '../symbols/definition'
import type { DisplayList } from '../symbols/display-list'
import { boundsOf } from '../symbols/place-marks'
import { printed } from '../symbols/one-ink'
import type { Printing } from '../symbols/unit-fill'
import type { Millimetres } from '../units'

/** One case of a symbol, drawn at its true size. */
export interface SpecimenCase {
  caption: string
  marks: DisplayList
  /** Its drawing in one ink, where that is not the same drawing in black. */
  oneInk?: DisplayList
  /** Room it takes, millimetres of its own plane. */
  box: Box
}

/** A measure of a symbol, read from its drawing or definition. */
export interface Dimension {
  what: string
  figure: string
}

/** A number that a published standard gives the same symbol. */
export interface PublishedNumber extends Published {
  /** The case that the number is for; empty where it is for all. */
  of: string
}

/** Everything that is to be known of one symbol. */
export interface SpecimenEntry {
  /** The definition's stable name. */
  id: string
  /** What it means, as the legend says it. */
  meaning: string
  dimensions: readonly Dimension[]
  /** Attributes that the drawing follows, in words. */
  drivenBy: readonly string[]
  published: readonly PublishedNumber[]
  cases: readonly SpecimenCase[]
}

export interface SpecimenFamily {
  id: string
  title: string
  entries: readonly SpecimenEntry[]
}

/** White about a case. */
const AIR: Millimetres = 0.6

/** A case with the room that its ink takes. */
export function specimenCase(caption: string, marks: DisplayList): SpecimenCase {
  const { x, y, width, height } = boundsOf(marks) ?? { x: 0, y: 0, width: 0, height: 0 }
  return {
    caption,
    marks,
    box: { x: x - AIR, y: y - AIR, width: width + 2 * AIR, height: height + 2 * AIR },
  }
}

/** Cases taller than this stand by themselves, such as compass roses. */
const TALL: Millimetres = 30

/** The room of each case, the small ones all of one height, so that side by side their lines and places are level. */
export function levelBoxes(cases: readonly SpecimenCase[]): Box[] {
  const small = cases.filter(({ box }) => box.height < TALL)
  const bottom = Math.min(...small.map(({ box }) => box.y))
  const height = Math.max(...small.map(({ box }) => box.y + box.height)) - bottom
  return cases.map(({ box }) => (box.height < TALL ? { ...box, y: bottom, height } : box))
}

/** A case as it is printed. */
export const caseIn = ({ marks, oneInk }: SpecimenCase, printing: Printing): DisplayList =>
  printing === 'one-ink' && oneInk ? oneInk : printed(marks, printing)

/** Attribute names as a cartographer says them: `locationConfidence` is location confidence. */
export const inWords = (attribute: string): string =>
  attribute.replace(
    /([a-z])([A-Z])/g,
    (_, before: string, after: string) => `${before} ${after.toLowerCase()}`,
  )
