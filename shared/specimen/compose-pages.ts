import { paragraph, rule, space, stack, type Block } from '../sheet-face/block'
import { drawColumns, fillRunningOn } from '../sheet-face/columns'
import { textLines, type TextStyle } from '../sheet-face/text-block'
import type { DisplayList } from '../symbols/display-list'
import type { Millimetres } from '../units'
import { caseRows, rowWidth, wholeRows, type SpecimenSetting } from './case-rows'
import type { SpecimenEntry, SpecimenFamily } from './entry'
import { factLines } from './facts'

/** All printings of the set, in the order of the document. */
export const settings: readonly SpecimenSetting[] = ([100, 400] as const).flatMap((percent) =>
  (['colour', 'one-ink'] as const).map((printing) => ({ percent, printing })),
)

/** A3 on its side. */
export const specimenPage = { width: 420, height: 297 } as const
const EDGE: Millimetres = 18
const HEAD: Millimetres = 30
const FOOT: Millimetres = 20
const WIDTH = specimenPage.width - 2 * EDGE
/** At 100 % facts stand in a column of their own beside the drawings; at 400 % only the name stands above them. */
const FACTS: Millimetres = 96
const GUTTER: Millimetres = 10

const TITLE: TextStyle = { size: 6.4, weight: 900, ink: 'black', leading: 1.2 }
const FAMILY: TextStyle = { size: 3, weight: 900, ink: 'black', leading: 1.3, tracking: 0.4 }
const NAME: TextStyle = { size: 3.5, weight: 700, ink: 'black', leading: 1.25 }
const ID: TextStyle = { size: 2.4, weight: 400, ink: 'quiet', leading: 1.5 }
const FACT: TextStyle = { size: 2.4, weight: 400, ink: 'black', leading: 1.35 }
const SMALL: TextStyle = { size: 2.4, weight: 400, ink: 'quiet', leading: 1.2 }

/** The whole document: the set in each of its printings, page by page, as display lists of a page's size. */
export function composeSpecimenPages(families: readonly SpecimenFamily[]): DisplayList[] {
  const pages = settings.flatMap((setting) => fill(families, setting).map((blocks) => ({ setting, blocks })))
  return pages.map(({ setting, blocks }, index) => [
    ...textLines(['Symbol set'], { x: EDGE, top: specimenPage.height - 14 }, TITLE),
    ...textLines(
      [settingWords(setting)],
      { x: specimenPage.width - EDGE, top: specimenPage.height - 16.5, align: 'end' },
      SMALL,
    ),
    ...drawColumns([blocks], { x: EDGE, top: specimenPage.height - HEAD, width: WIDTH, gutter: 0 }),
    ...textLines(
      [`Page ${index + 1} of ${pages.length}`],
      { x: specimenPage.width - EDGE, top: 13, align: 'end' },
      SMALL,
    ),
    ...textLines(['Drawn by the code that draws map, legend and print.'], { x: EDGE, top: 13 }, SMALL),
  ])
}

const settingWords = ({ percent, printing }: SpecimenSetting): string =>
  `${percent === 100 ? 'True size, 100 %' : 'Four times true size, 400 %'} · ${printing === 'colour' ? 'in colour' : 'in one ink'}`

function fill(families: readonly SpecimenFamily[], setting: SpecimenSetting): Block[][] {
  const blocks = families.flatMap((family) => familyBlocks(family, setting))
  const pages = fillRunningOn([blocks], Infinity, specimenPage.height - HEAD - FOOT)
  if (!pages) throw new RangeError('A symbol of the specimen is larger than a page.')
  return pages
}

const familyBlocks = (family: SpecimenFamily, setting: SpecimenSetting): Block[] => [
  { ...space(3), staysWithNext: true },
  rule(WIDTH, 0.35),
  { ...space(1.4), staysWithNext: true },
  paragraph(family.title.toUpperCase(), WIDTH, FAMILY, { staysWithNext: true }),
  { ...space(2.4), staysWithNext: true },
  ...runsOf(family.entries).flatMap((run) => {
    if (setting.percent === 100)
      return run.length > 1 ? sideBySide(run, setting) : besideFacts(run[0], setting)
    return run.length > 1 ? inOneFlow(run, setting) : underName(run[0], setting)
  }),
]

/** At least one entry. */
type Run = readonly [SpecimenEntry, ...SpecimenEntry[]]

/** Neighbouring entries with one or two small cases are set side by side; every other one stands by itself. */
function runsOf(entries: readonly SpecimenEntry[]): Run[] {
  const runs: [SpecimenEntry, ...SpecimenEntry[]][] = []
  for (const entry of entries) {
    const last = runs.at(-1)
    if (last && isSmall(entry) && isSmall(last[0])) last.push(entry)
    else runs.push([entry])
  }
  return runs
}

const SMALL_CASE: Millimetres = 40
const isSmall = ({ cases }: SpecimenEntry): boolean =>
  cases.length <= 2 && cases.every(({ box }) => box.width < SMALL_CASE && box.height < SMALL_CASE)

/** Small entries in three columns, each with its drawings beside its facts. */
function sideBySide(run: Run, setting: SpecimenSetting): Block[] {
  const column = (WIDTH - 2 * GUTTER) / 3
  const drawings = Math.max(...run.map(({ cases }) => rowWidth(cases, setting)))
  const set = run.map((entry): Block => {
    const cases = wholeRows(entry.cases, setting, drawings)
    const facts = factsBlock(entry, column - drawings - 4)
    return {
      height: Math.max(cases.height, facts.height) + 3,
      draw: (x, top) => [...cases.draw(x, top), ...facts.draw(x + drawings + 4, top)],
    }
  })
  return Array.from({ length: Math.ceil(set.length / 3) }, (_, row) => {
    const three = set.slice(row * 3, row * 3 + 3)
    return {
      height: Math.max(...three.map(({ height }) => height)),
      draw: (x, top) => three.flatMap((block, index) => block.draw(x + index * (column + GUTTER), top)),
    }
  })
}

/** Small entries enlarged, one after the other, each case under its symbol's name. */
const inOneFlow = (run: Run, setting: SpecimenSetting): Block[] => [
  ...caseRows(
    run.flatMap(({ meaning, cases }) =>
      cases.map((each) => ({
        ...each,
        caption: each.caption === meaning.toLowerCase() ? meaning : `${meaning}, ${each.caption}`,
      })),
    ),
    setting,
    WIDTH,
  ),
  space(3),
]

const factsBlock = (entry: SpecimenEntry, width: Millimetres): Block =>
  stack([
    paragraph(entry.meaning, width, NAME),
    paragraph(entry.id, width, ID),
    ...factLines(entry).map((line) => paragraph(line, width, FACT)),
  ])

function besideFacts(entry: SpecimenEntry, setting: SpecimenSetting): Block[] {
  const facts = factsBlock(entry, FACTS)
  const cases = wholeRows(entry.cases, setting, WIDTH - FACTS - GUTTER)
  return [
    {
      height: Math.max(facts.height, cases.height),
      draw: (x, top) => [...facts.draw(x, top), ...cases.draw(x + FACTS + GUTTER, top)],
    },
    space(4),
  ]
}

const underName = (entry: SpecimenEntry, setting: SpecimenSetting): Block[] => [
  paragraph(`${entry.meaning} (${entry.id})`, WIDTH, NAME, { staysWithNext: true }),
  { ...space(1.5), staysWithNext: true },
  ...caseRows(entry.cases, setting, WIDTH),
  space(3),
]
