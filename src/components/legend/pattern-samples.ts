import { rectangle } from '@shared/sheet-face/rectangle'
import type { UnitProperties } from '@shared/items/legend'
import { lithologyPatterns } from '@shared/symbols/definitions/lithology'
import type { SampleOption } from '@/components/common/location-samples'

type Pattern = UnitProperties['pattern']

/** Enough of a pattern to know it by, millimetres. */
const BOX = { x: 0, y: 0, width: 9.6, height: 6.4 }

/** No pattern, then the patterns of rocks and deposits, as drawn samples. */
export const patternOptions = (): (SampleOption<Pattern> & { text?: string })[] => [
  { value: 'none', title: 'No pattern', list: [], box: { ...BOX, width: 0.1 }, text: 'none' },
  ...lithologyPatterns.map(({ id, title, tile }) => ({
    value: id,
    title,
    list: [
      {
        mark: 'pattern' as const,
        path: rectangle(0, 0, BOX.width, BOX.height),
        tile,
        ink: 'black' as const,
        anchor: [0, 0] as [number, number],
      },
    ],
    box: BOX,
  })),
]
