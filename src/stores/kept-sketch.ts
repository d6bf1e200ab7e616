import { z } from 'zod'

/** A line that was begun and neither ended nor given up. */
const keptSketchSchema = z.object({
  /** Legend entry that it is drawn with. */
  entry: z.string(),
  /** What it was snapped to goes with the page: the items may have changed. */
  line: z.array(z.tuple([z.number(), z.number()])).min(1),
})
export type KeptSketch = z.infer<typeof keptSketchSchema>

/** Whose sketch it is: nobody goes on with another person's line in the same tab. */
export interface SketchOwner {
  /** Account id. */
  account: string
  /** Number of the sheet. */
  sheet: string
}

const keyOf = ({ account, sheet }: SketchOwner): string => `sheetwright-sketch ${account} ${sheet}`

/** The unfinished line of a person on a sheet in this tab, over going elsewhere and over a reload; null where there is none. */
export function readKeptSketch(owner: SketchOwner): KeptSketch | null {
  try {
    return keptSketchSchema.safeParse(JSON.parse(sessionStorage.getItem(keyOf(owner)) ?? 'null')).data ?? null
  } catch {
    return null
  }
}

/** Keeps an unfinished line, or forgets it. */
export function keepSketch(owner: SketchOwner, sketch: KeptSketch | null): void {
  try {
    if (sketch) sessionStorage.setItem(keyOf(owner), JSON.stringify(sketch))
    else sessionStorage.removeItem(keyOf(owner))
  } catch {
    // A browser that keeps nothing still draws; the line is then lost with the page.
  }
}
