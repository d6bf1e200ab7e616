import type { ItemKind } from '@shared/items/item'
import type { Degrees, XY } from '@shared/units'
import type { ChangeDraft, EditorView } from './commands/change-draft'

/** What is being drawn with: a legend entry, or a unit's label. */
export interface Pen {
  kind: ItemKind
  title: string
  /** What an item drawn with it starts with; the item's schema fills in the rest. */
  properties: Readonly<Record<string, unknown>>
}

/** All that a gesture sees of the workplace. */
export interface EditorHost extends EditorView {
  selected(): readonly string[]
  select(ids: readonly string[]): void
  hover(ids: readonly string[]): void
  /** Hands a finished change to the one door; answers null, or why it was refused. */
  commit(draft: ChangeDraft): string | null
  pen(): Pen | null
  /** Keeps the vertices of the line that is being drawn, so that leaving the map loses nothing; none: it is done with. */
  keepSketch(line: readonly XY[]): void
  /** The line that was left unfinished with the pen that is held; empty where there is none. */
  keptSketch(): readonly XY[]
  /** A place was chosen for an attitude or a lineation; its reading is asked for elsewhere. */
  askReading(at: XY): void
  /** One plain sentence to the person. */
  say(sentence: string): void
  isSnapping(): boolean
  /** Why nothing may be changed; null where it may. */
  readOnly(): string | null
  convergenceAt(xy: XY): Degrees
  newId(): string
}
