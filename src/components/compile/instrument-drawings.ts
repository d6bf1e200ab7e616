import type { Instrument } from './instruments'

/** What an instrument does, drawn with one 1.5 px line on a plate of 20 × 20: `line` is stroked, `solid` filled. */
export interface InstrumentDrawing {
  line: string
  solid?: string
}

export const instrumentDrawings: Record<Instrument['id'], InstrumentDrawing> = {
  // A pointer.
  select: { line: 'M5 3 L5 16 L8.6 12.7 L11 17.5 L13 16.5 L10.7 11.8 L15.5 11.4 Z' },
  // A line that is still being drawn: vertices behind, an open end ahead.
  draw: {
    line: 'M4.5 14.5 C7 8 9 13 11.5 9.5 M13 8 L14.6 6.2',
    solid: 'M3 13 h3 v3 h-3 z M10 8 h3 v3 h-3 z M16.8 2.8 l.9 3.6 l-3.5 -1.2 z',
  },
  // A line with one vertex pulled out of it.
  vertices: {
    line: 'M3 15 L10 6 L17 15 M8 4 h4 v4 h-4 z',
    solid: 'M1.8 13.8 h2.6 v2.6 h-2.6 z M15.6 13.8 h2.6 v2.6 h-2.6 z',
  },
  // Two half arrows along one line, opposite ways.
  reverse: { line: 'M3 8 H16 L12.5 4.5 M17 12 H4 L7.5 15.5' },
  // A line struck out.
  remove: { line: 'M4.5 4.5 L15.5 15.5 M15.5 4.5 L4.5 15.5' },
  // Turns back to the left.
  undo: { line: 'M4 9.5 C6.5 5.5 13.5 5 16 11 C16.6 12.6 16.4 14 16 15 M4 4.5 V9.5 H9' },
  redo: { line: 'M16 9.5 C13.5 5.5 6.5 5 4 11 C3.4 12.6 3.6 14 4 15 M16 4.5 V9.5 H11' },
  // A rule with its divisions.
  measure: { line: 'M3 13.5 L13.5 3 L17 6.5 L6.5 17 Z M6 10.5 L7.6 12.1 M8.5 8 L9.6 9.1 M11 5.5 L12.6 7.1' },
  // Aims at a place.
  go: { line: 'M10 5 a5 5 0 1 0 0.01 0 M10 1.8 V5 M10 15 V18.2 M1.8 10 H5 M15 10 H18.2' },
  // The page with map face and margin.
  page: { line: 'M2.5 4 H17.5 V16 H2.5 Z M4.8 6.3 H11 V13.7 H4.8 Z M13 7 H15.5 M13 9.5 H15.5 M13 12 H15.5' },
}
