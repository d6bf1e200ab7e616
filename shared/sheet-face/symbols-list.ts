import type { Item } from '../items/item'
import { drawEntry, legendEntries, legendEntryOf, type LegendEntry } from '../symbols/legend-entries'
import type { DisplayList } from '../symbols/display-list'
import { drawMark, type LineMark } from '../symbols/line-marks'
import type { Millimetres } from '../units'
import { paragraph, space, type Block } from './block'
import { place } from './place'
import { sectionHeading } from './section-heading'
import type { TypeScale } from './type-scale'

/** Legend entries that stand on the sheet, in the order of the legend. */
export function entriesInUse(items: Iterable<Item>): LegendEntry[] {
  const used = new Set<string>()
  for (const item of items) {
    const entry = item.geometry === null ? undefined : legendEntryOf(item)
    if (entry) used.add(entry.id)
  }
  return legendEntries.filter((entry) => used.has(entry.id))
}

const NOTE =
  'Strikes and trends are azimuths from true north; numerals are dips and plunges in degrees below the horizontal.'

/** The explanation of lines and points: every symbol on the map face, and what may stand on several, drawn by the definitions
 *  that draw it there. */
export function symbolsList(
  { entries, marks }: { entries: readonly LegendEntry[]; marks: readonly LineMark[] },
  width: Millimetres,
  type: TypeScale,
): Block[] {
  if (entries.length === 0) return []
  const rows: SymbolRow[] = [
    ...entries.map((entry, index) => ({
      title: entry.title,
      // Entries that share a decoration stand together: the first says what it tells.
      ...(entry.explains === undefined || entry.explains === entries[index - 1]?.explains
        ? {}
        : { about: entry.explains }),
      draw: (size: SampleSize) => drawEntry(entry, size),
    })),
    ...marks.map((mark) => ({ title: mark.title, draw: (size: SampleSize) => drawMark(mark, size) })),
  ]
  return [
    ...sectionHeading('Lines and points', width, type),
    ...rows.flatMap((row) => [symbolRow(row, width, type), space(0.8 * type.factor)]),
    space(1.6 * type.factor),
    paragraph(NOTE, width, type.text),
  ]
}

interface SampleSize {
  width: Millimetres
  height: Millimetres
}

interface SymbolRow {
  title: string
  about?: string
  draw(size: SampleSize): DisplayList
}

function symbolRow({ title, about, draw }: SymbolRow, width: Millimetres, type: TypeScale): Block {
  // Symbols stay at the size they have on the map; only the type around them follows the page.
  const sample = { width: 18, height: 8 * Math.min(1, type.factor) }
  const indent = sample.width + 4 * type.factor
  const words = paragraph(title, width - indent, { ...type.text, ink: 'black' })
  const more = about === undefined ? undefined : paragraph(about, width - indent, type.text)
  const wordsHeight = words.height + (more?.height ?? 0)
  const height = Math.max(sample.height, wordsHeight)
  return {
    height,
    draw: (x, top) => [
      ...place(draw(sample), x, top - (height + sample.height) / 2),
      ...words.draw(x + indent, top - (height - wordsHeight) / 2),
      ...(more?.draw(x + indent, top - (height - wordsHeight) / 2 - words.height) ?? []),
    ],
  }
}
