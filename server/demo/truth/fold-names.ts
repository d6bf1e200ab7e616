import type { Hinge } from './fold-belt'
import type { Island } from './island'

/** Names of folds by plate, in order from the thrust outward. */
const names: Record<'lower' | 'upper', Record<Hinge['form'], readonly string[]>> = {
  upper: {
    anticline: ['Gannet', 'Puffin', 'Guillemot', 'Tystie', 'Auk'],
    syncline: ['Shearwater', 'Skua', 'Whimbrel', 'Dunlin', 'Plover'],
  },
  lower: {
    anticline: ['Cormorant', 'Storm Petrel', 'Kelp Gull', 'Noddy', 'Turnstone'],
    syncline: ['Dotterel', 'Sanderling', 'Oystercatcher', 'Curlew', 'Godwit'],
  },
}

/** Hinges between here and the thrust are hidden on the island, metres across. */
const HIDDEN = { lower: -1200, upper: -3300 } as const

/** The name of a fold, one and the same on every sheet; empty beyond the island. */
export function foldName(island: Island, series: 'lower' | 'upper', hinge: Hinge): string {
  const outward = series === 'upper' ? 1 : -1
  const order = island
    .belt(series, 'west')
    .hinges.filter(({ form, across }) => form === hinge.form && (across - HIDDEN[series]) * outward > 0)
    .sort((a, b) => (a.across - b.across) * outward)
  const name = names[series][hinge.form][order.findIndex(({ across }) => across === hinge.across)]
  return name === undefined ? '' : `${name} ${hinge.form}`
}
