import type { DataSource, EntityManager } from 'typeorm'
import type { Role } from '@shared/api/accounts'
import type { Provenance } from '@shared/api/ledger'
import type { Edit } from '@shared/changes/change-set'
import type { Item, ItemOf } from '@shared/items/item'
import type { LedgerService, ServerEntry } from '../features/ledger/ledger.service'
import type { SheetsService } from '../features/sheets/sheets.service'
import { Account } from '../features/accounts/account.entity'
import { Membership } from '../features/accounts/membership.entity'
import { SheetRow } from '../features/sheets/sheet.entity'
import { gannetHead, makeGannetHead } from './gannet-head'
import type { DemoSheet } from './truth/generate-sheet'

/** What the demo is loaded through. */
export interface DemoServices {
  dataSource: DataSource
  sheets: SheetsService
  ledger: LedgerService
}

const HOUR_MS = 3_600_000
/** Any number will do, as long as every process uses the same one. */
const DEMO_LOCK = 4_310_014

/** Makes the demo sheet with its members and its ledger, unless it is there. The demo accounts must exist. */
export async function loadDemo({ dataSource, sheets, ledger }: DemoServices): Promise<void> {
  await dataSource.transaction(async (em) => {
    await em.query('SELECT pg_advisory_xact_lock($1)', [DEMO_LOCK])
    if (await em.existsBy(SheetRow, { number: gannetHead.number })) return
    const people = {
      compiler: await accountId(em, 'compiler'),
      editor: await accountId(em, 'editor'),
      approver: await accountId(em, 'approver'),
      administrator: await accountId(em, 'administrator'),
    }
    const begin = Date.now()
    const hoursAgo = (hours: number) => new Date(begin - hours * HOUR_MS)
    const sheetId = await sheets.createWithin(em, gannetHead, people.administrator, hoursAgo(9 * 24))
    const roles: Role[] = ['compiler', 'editor', 'approver']
    await em.insert(
      Membership,
      roles.map((role) => ({ sheetId, accountId: people[role], role })),
    )
    for (const { by, hours, items, edits, provenance, ...entry } of story(makeGannetHead())) {
      const written: ServerEntry = { ...entry, at: hoursAgo(hours) }
      if (items) {
        const rows = items.map((item, index) => ({ item, provenance: provenance?.(item, index) ?? null }))
        await ledger.appendItems(em, sheetId, people[by], rows, written)
      } else {
        await ledger.appendEdits(em, sheetId, people[by], edits ?? [], written)
      }
    }
  })
}

async function accountId(em: EntityManager, who: Role | 'administrator'): Promise<string> {
  const { id } = await em.findOneByOrFail(Account, { email: `${who}@merrow.example` })
  return id
}

/** One entry of the demo's ledger. */
interface Chapter {
  by: 'compiler' | 'editor'
  /** Before now. */
  hours: number
  kind: 'edit' | 'intake'
  message?: string
  items?: Item[]
  edits?: Edit[]
  provenance?: (item: Item, index: number) => Provenance
}

/** How the sheet came about: first drafts, then the corrections that make it what the truth says. */
function story(sheet: DemoSheet): Chapter[] {
  const dip = withFirstDraft(
    sheet.attitudes[30],
    (draft) => (draft.properties.dip += draft.properties.dip > 40 ? -18 : 18),
  )
  const plunge = withFirstDraft(
    sheet.traces.find((trace) => trace.properties.plunge !== null),
    (draft) => (draft.properties.plunge = 24),
  )
  const contact = withFirstDraft(
    sheet.contacts.find((item) => item.geometry.coordinates.length > 30),
    (draft) => {
      for (const vertex of draft.geometry.coordinates.slice(12, 15)) vertex[0] += 38
    },
  )
  const corrected = [dip, plunge, contact]
  const firstDraft = <I extends Item>(items: I[]): Item[] =>
    items.map((item) => corrected.find((edit) => edit.after.id === item.id)?.before ?? item)
  const middle = Math.ceil(sheet.attitudes.length / 2)
  return [
    {
      by: 'editor',
      hours: 212,
      kind: 'edit',
      message: 'legend: twelve units, alluvium to Stormcrest Group',
      items: sheet.units,
    },
    {
      by: 'compiler',
      hours: 190,
      kind: 'intake',
      message: `took in “gannet-head-contacts.geojson”, ${sheet.contacts.length} contacts`,
      items: firstDraft(sheet.contacts),
      provenance: from('gannet-head-contacts.geojson', 'boundary'),
    },
    {
      by: 'compiler',
      hours: 167,
      kind: 'edit',
      message: 'Cormorant fault from the sea cliff to the north edge',
      items: sheet.faults,
    },
    {
      by: 'editor',
      hours: 143,
      kind: 'edit',
      message: 'edges of peat and alluvium from the valley survey',
      items: sheet.coverContacts,
    },
    {
      by: 'compiler',
      hours: 120,
      kind: 'edit',
      message: 'coral bed in the Spindrift Limestone',
      items: sheet.markerBeds,
    },
    { by: 'editor', hours: 98, kind: 'edit', message: 'unit labels for all areas', items: sheet.labels },
    {
      by: 'compiler',
      hours: 75,
      kind: 'intake',
      message: `took in “west-traverses.geojson”, ${middle} attitudes`,
      items: firstDraft(sheet.attitudes.slice(0, middle)),
      provenance: from('west-traverses.geojson', 'bedding'),
    },
    {
      by: 'compiler',
      hours: 51,
      kind: 'intake',
      message: `took in “east-traverses.geojson”, ${sheet.attitudes.length - middle} attitudes`,
      items: firstDraft(sheet.attitudes.slice(middle)),
      provenance: from('east-traverses.geojson', 'bedding'),
    },
    {
      by: 'compiler',
      hours: 28,
      kind: 'edit',
      message: 'axial traces, plunges from the attitudes beside them',
      items: firstDraft(sheet.traces),
    },
    { by: 'editor', hours: 6, kind: 'edit', edits: [contact] },
    { by: 'compiler', hours: 3, kind: 'edit', edits: [dip] },
    { by: 'editor', hours: 0.4, kind: 'edit', edits: [plunge] },
  ]
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
            type,
            strike: item.properties.strike,
            dip: item.properties.dip,
            ...(item.properties.overturned ? { overturned: 'yes' } : {}),
          }
        : { type },
    conversions: ['coordinates from WGS 84 longitude and latitude'],
  })
