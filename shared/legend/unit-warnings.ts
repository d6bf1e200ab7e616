import type { UnitProperties } from '../items/legend'
import { findTimeDivision } from '../time-scale/periods'
import { labelReadsOn } from './colours'

/** A unit as the legend's checks see it. */
export interface LegendUnit {
  id: string
  properties: UnitProperties
}

/** What is doubtful about a unit beside the others, as plain sentences; an empty list if nothing is. Warnings never
 *  stop anyone: two units may share a colour for a while. */
export function unitWarnings(unit: LegendUnit, units: readonly LegendUnit[]): string[] {
  const others = units.filter((other) => other.id !== unit.id)
  const { label, age, colour, pattern } = unit.properties
  const sameLabel = others.find((other) => other.properties.label === label)
  const sameColour = others.find(
    ({ properties }) => properties.colour === colour && properties.pattern === pattern,
  )
  return [
    sameLabel && `${sameLabel.properties.name} carries the label ${label} too.`,
    sameColour &&
      `${sameColour.properties.name} has this ${pattern === 'none' ? 'colour' : 'colour and pattern'} too.`,
    age !== '' &&
      !findTimeDivision(age) &&
      `“${age}” names no period of the geologic time scale: the unit stands under a heading of its own, and cannot be put in order by age.`,
    !labelReadsOn(colour) && 'The label is hard to read on this colour; choose a lighter one.',
  ].filter((warning) => typeof warning === 'string')
}
