import type { Provenance } from '@shared/api/ledger'
import type { Edit } from '@shared/changes/change-set'
import type { Item, ItemOf } from '@shared/items/item'
import type { DemoSheet } from './truth/generate-sheet'
import { itemsOf } from './truth/generate-sheet'

/** One entry of a demo sheet's ledger. */
export interface Chapter {
  by: 'compiler' | 'editor'
  /** Before now. */
  hours: number
  kind: 'edit' | 'intake'
  message?: string
  items?: Item[]
  edits?: Edit[]
  provenance?: (item: Item, index: number) => Provenance
}

/** How the large sheet came about: first drafts, then the corrections that make it what the truth says. */
export function longStory(sheet: DemoSheet): Chapter[] {
  const [contact, dip, plunge] = corrections(sheet)
  const corrected: readonly { before: Item; after: Item }[] = [contact, dip, plunge]
  const firstDraft = <I extends Item>(items: I[]): Item[] =>
    items.map((item) => corrected.find((edit) => edit.after.id === item.id)?.before ?? item)
  const [middle, quarter] = [Math.ceil(sheet.attitudes.length / 2), Math.ceil(sheet.contacts.length / 4)]
  const { dikes, markerBeds } = byType(sheet.otherLines)
  return [
    chapter('editor', 212, `legend: ${sheet.units.length} units, sea to Stormcrest Group`, sheet.units),
    {
      ...intake(
        190,
        'gannet-head-contacts.geojson',
        `${sheet.contacts.length - quarter} contacts`,
        'boundary',
      ),
      items: firstDraft(sheet.contacts.slice(quarter)),
    },
    {
      ...intake(184, 'skua-burn-contacts.geojson', `${quarter} contacts`, 'boundary'),
      items: firstDraft(sheet.contacts.slice(0, quarter)),
    },
    chapter('compiler', 167, 'Cormorant fault and Gannet Head thrust, from coast to neatline', sheet.faults),
    chapter(
      'editor',
      143,
      'shore, and edges of alluvium, talus and peat from the valley survey',
      sheet.coverContacts,
    ),
    chapter('compiler', 120, 'coral bed and Sealholm seam', markerBeds),
    chapter('compiler', 118, 'dikes from the airborne magnetic survey', dikes),
    chapter('editor', 98, 'unit labels for all areas', sheet.labels),
    {
      ...intake(75, 'west-traverses.geojson', `${middle} attitudes`, 'bedding'),
      items: firstDraft(sheet.attitudes.slice(0, middle)),
    },
    {
      ...intake(51, 'east-traverses.geojson', `${sheet.attitudes.length - middle} attitudes`, 'bedding'),
      items: firstDraft(sheet.attitudes.slice(middle)),
    },
    chapter('compiler', 46, 'minor folds and lineations of both traverses', sheet.lineations),
    chapter('editor', 33, 'springs, quarries, boreholes, fossils and samples', sheet.stations),
    chapter('compiler', 28, 'axial traces, plunges from the attitudes beside them', firstDraft(sheet.traces)),
    { by: 'editor', hours: 6, kind: 'edit', edits: [contact] },
    { by: 'compiler', hours: 3, kind: 'edit', edits: [dip] },
    { by: 'editor', hours: 0.4, kind: 'edit', edits: [plunge] },
  ]
}

/** How a small sheet came about: in four steps. */
export function shortStory(sheet: DemoSheet): Chapter[] {
  const points = new Set<Item>([...sheet.attitudes, ...sheet.lineations, ...sheet.stations])
  const units = new Set<Item>([...sheet.units, ...sheet.labels])
  const rest = itemsOf(sheet).filter((item) => !points.has(item) && !units.has(item))
  return [
    chapter('editor', 205, 'legend from sheet MI-14', sheet.units),
    chapter('compiler', 150, 'linework to the edges of MI-14', rest),
    chapter('editor', 90, 'unit labels for all areas', sheet.labels),
    chapter('compiler', 60, 'attitudes, lineations and stations of the summer traverses', [...points]),
  ]
}

const chapter = (by: Chapter['by'], hours: number, message: string, items: Item[]): Chapter => ({
  by,
  hours,
  kind: 'edit',
  message,
  items,
})

const intake = (hours: number, file: string, what: string, type: string): Chapter => ({
  by: 'compiler',
  hours,
  kind: 'intake',
  message: `took in “${file}”, ${what}`,
  provenance: from(file, type),
})

function byType(lines: readonly ItemOf<'other-line'>[]) {
  const isBed = (line: ItemOf<'other-line'>) => line.properties.type === 'marker-bed'
  return { markerBeds: lines.filter(isBed), dikes: lines.filter((line) => !isBed(line)) }
}

/** Three slips of the pen and what became of them: of a contact, a dip and a plunge. */
function corrections(sheet: DemoSheet) {
  return [
    withFirstDraft(
      sheet.contacts.find((item) => item.geometry.coordinates.length > 30),
      (draft) => {
        for (const vertex of draft.geometry.coordinates.slice(12, 15)) vertex[0] += 38
      },
    ),
    withFirstDraft(
      sheet.attitudes.find(({ properties: { dip } }, index) => index > 30 && dip > 20 && dip < 60),
      (draft) => (draft.properties.dip += draft.properties.dip > 40 ? -18 : 18),
    ),
    withFirstDraft(
      sheet.traces.find(({ properties: { plunge, doubly } }) => plunge !== null && doubly === 'no'),
      (draft) => (draft.properties.plunge = 24),
    ),
  ] as const
}

/** The edit that turns a first draft into the item. */
function withFirstDraft<I extends ItemOf<'attitude'> | ItemOf<'axial-trace'> | ItemOf<'contact'>>(
  item: I | undefined,
  change: (draft: I) => void,
): { before: I; after: I } {
  if (!item) throw new RangeError('The demo sheet lacks an item that its ledger tells of.')
  const before = structuredClone(item)
  change(before)
  return { before, after: item }
}

const from =
  (file: string, type: string) =>
  (item: Item, index: number): Provenance => ({
    file,
    record: index + 1,
    attributes:
      item.kind === 'attitude'
        ? {
            station: item.properties.station,
            type: item.properties.type,
            strike: item.properties.strike,
            dip: item.properties.dip,
            ...(item.properties.overturned ? { overturned: 'yes' } : {}),
          }
        : { type },
    conversions: ['coordinates from WGS 84 longitude and latitude'],
  })
