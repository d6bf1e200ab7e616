/** The instruments of the rail, in groups. Drawing kinds are not among them: those are in the margin. */
export const instrumentGroups = [
  [
    { id: 'select', title: 'Select', key: 'V', changes: false },
    { id: 'draw', title: 'Draw again with the last entry', key: 'D', changes: true },
    { id: 'vertices', title: 'Edit vertices', key: 'E', changes: true },
  ],
  [
    { id: 'reverse', title: 'Reverse the line', key: 'R', changes: true },
    { id: 'remove', title: 'Delete what is selected', key: 'DELETE', changes: true },
    { id: 'undo', title: 'Undo', key: 'CTRL+Z', changes: true },
    { id: 'redo', title: 'Redo', key: 'CTRL+SHIFT+Z', changes: true },
  ],
  [
    { id: 'measure', title: 'Measure', key: 'M', changes: false },
    { id: 'go', title: 'Go to the selection', key: 'G', changes: false },
    { id: 'page', title: 'Show the whole page', key: 'F', changes: false },
  ],
] as const

export type Instrument = (typeof instrumentGroups)[number][number]
export type InstrumentId = Instrument['id'] | KeyOnly['id']
interface KeyOnly {
  id: 'snap' | 'symbol-size'
  title: string
  key: string
  changes: false
}

/** Everything that a key does: the rail's instruments, and what is switched at the foot. */
export const instruments: readonly (Instrument | KeyOnly)[] = [
  ...instrumentGroups.flat(),
  { id: 'snap', title: 'Snapping on or off', key: 'S', changes: false },
  { id: 'symbol-size', title: 'Symbols grow or keep their size', key: 'P', changes: false },
]

/** How a key is written in a tooltip. */
export const keyWords = (key: string): string =>
  key
    .split('+')
    .map((part) => part.charAt(0) + part.slice(1).toLowerCase())
    .join(' + ')
