import { confidenceStrokes, type LineSymbol, type Published } from '../definition'

const fgdc = (number: string): Published => ({ standard: 'FGDC-STD-013-2006', number })

/** Contacts: fine near-black lines, the lightest structure lines of the sheet. */
export const contacts: readonly LineSymbol[] = [
  {
    id: 'contact',
    kind: 'contact',
    variant: '',
    title: 'Contact',
    drivenBy: ['locationConfidence', 'identity'],
    ink: 'black',
    strokes: confidenceStrokes({
      width: 0.2,
      long: [3.5, 0.75],
      short: [1.4, 0.75],
      dot: { size: 0.34, apart: 0.95 },
    }),
    // Read in the standard for these two; the numbers of the other two follow only from their place in its list.
    published: { certain: fgdc('1.1.1'), approximate: fgdc('1.1.3') },
    publishedQueried: { certain: fgdc('1.1.2'), approximate: fgdc('1.1.4') },
  },
]
