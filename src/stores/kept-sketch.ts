import { z } from 'zod'

/** A line that was begun and neither ended nor given up. */
const keptSketchSchema = z.object({
  /** Legend entry that it is drawn with. */
  entry: z.string(),
  /** What it was snapped to goes with the page: the items may have changed. */
  line: z.array(z.tuple([z.number(), z.number()])).min(1),
})
export type KeptSketch = z.infer<typeof keptSketchSchema>

const keyOf = (sheet: string): string => `sheetwright-sketch ${sheet}`

/** The unfinished line of this tab on a sheet, over going elsewhere and over a reload; null where there is none. */
export function readKeptSketch(sheet: string): KeptSketch | null {
  try {
    return keptSketchSchema.safeParse(JSON.parse(sessionStorage.getItem(keyOf(sheet)) ?? 'null')).data ?? null
  } catch {
    return null
  }
}

/** Keeps an unfinished line, or forgets it. */
export function keepSketch(sheet: string, sketch: KeptSketch | null): void {
  try {
    if (sketch) sessionStorage.setItem(keyOf(sheet), JSON.stringify(sketch))
    else sessionStorage.removeItem(keyOf(sheet))
  } catch {
    // A browser that keeps nothing still draws; the line is then lost with the page.
  }
}
