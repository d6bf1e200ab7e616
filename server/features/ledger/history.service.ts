import type { DataSource, EntityManager } from 'typeorm'
import type { z } from 'zod'
import type { Person } from '@shared/api/common'
import type { itemVersionSchema, LedgerRow } from '@shared/api/ledger'
import type { LedgerEntry } from '@shared/api/sheets'
import type { Edit } from '@shared/changes/change-set'
import type { Item } from '@shared/items/item'
import { JsonParts } from '../../platform/http/json-parts'
import { problem } from '../../platform/problem'
import { selectEditsOf, selectTouchedIds } from './comparison.queries'
import { selectAuthors, selectEntries, selectEntriesOf } from './entries.queries'
import { selectVersions } from './history.queries'
import { requireReached } from './ledger-rules'
import { latestRevision, selectItemsAt, selectItemTextsAt } from './ledger.queries'
import { selectPage, type Listing } from './listing.queries'
import { selectNamedRevisions } from './named-revisions.queries'

/** What has changed on a sheet since a revision. */
export interface ChangesSince {
  revision: number
  put: Item[]
  removed: string[]
  entries: LedgerEntry[]
}

/** Reads the ledger of sheets: items at any revision, what changed between two, who wrote what. Versions never change
 *  once written but for their end, so whatever is asked for by revision number is consistent in itself. */
export class HistoryService {
  constructor(private readonly dataSource: DataSource) {}

  /** All items of a sheet at a revision, the latest unless given, ordered by id: as JSON text, because a sheet of a
   *  hundred thousand items need not become objects on its way through. */
  async listItems(sheetId: string, revision?: number): Promise<JsonParts> {
    const em = this.dataSource.manager
    const latest = await latestRevision(em, sheetId)
    requireReached(revision ?? latest, latest, 'revision')
    const at = revision ?? latest
    const items = await selectItemTextsAt(em, sheetId, at)
    const parts = items.map((text, index) => (index === 0 ? text : `,${text}`))
    return new JsonParts(`${sheetId}-${at}`, [`{"revision":${at},"items":[`, ...parts, ']}'])
  }

  /** Items at a revision, ordered by id: the same revision always gives the same list. */
  async itemsAt(em: EntityManager, sheetId: string, revision: number): Promise<Item[]> {
    return selectItemsAt(em, sheetId, revision)
  }

  /** Items as they now are that were put since a revision, ids that are gone, and the entries that did it. */
  async listChanges(sheetId: string, since: number): Promise<ChangesSince> {
    const em = this.dataSource.manager
    const revision = await latestRevision(em, sheetId)
    requireReached(since, revision, 'since')
    const touched = await selectTouchedIds(em, { sheetId, from: since, to: revision })
    const put = await selectItemsAt(em, sheetId, revision, touched)
    const held = new Set(put.map((item) => item.id))
    const entries = await selectEntries(em, sheetId, { above: since, below: revision + 1 })
    return { revision, put, removed: touched.filter((id) => !held.has(id)), entries }
  }

  /** What differs between two revisions: items before and after, ordered by id. An item changed and changed back does not. */
  async differences(em: EntityManager, sheetId: string, from: number, to: number): Promise<Edit[]> {
    const span = { sheetId, from, to }
    return selectEditsOf(em, span, await selectTouchedIds(em, span))
  }

  /** Everyone who wrote an entry after one revision and up to another, by name. */
  async authorsBetween(em: EntityManager, sheetId: string, from: number, to: number): Promise<Person[]> {
    return selectAuthors(em, sheetId, from, to)
  }

  /** Entries after one revision and up to another, newest first. */
  async entriesBetween(em: EntityManager, sheetId: string, from: number, to: number): Promise<LedgerEntry[]> {
    return selectEntries(em, sheetId, { above: from, below: to + 1 })
  }

  /** A page of entries, newest first; `next` is what to ask for as `before`, null on the last page. */
  async listEntries(
    sheetId: string,
    listing: Listing,
  ): Promise<{ entries: LedgerRow[]; next: number | null }> {
    const em = this.dataSource.manager
    const entries = await selectPage(em, sheetId, listing)
    const revisions = entries.map((entry) => entry.revision)
    const names = new Map(
      (await selectNamedRevisions(em, sheetId, revisions)).map((named) => [named.revision, named]),
    )
    const last = entries.length === listing.limit ? entries.at(-1) : undefined
    return {
      entries: entries.map((entry) => ({ ...entry, name: names.get(entry.revision) ?? null })),
      next: last && last.revision > 1 ? last.revision : null,
    }
  }

  /** Every version of one item, newest first. */
  async listVersions(sheetId: string, itemId: string): Promise<z.infer<typeof itemVersionSchema>[]> {
    const em = this.dataSource.manager
    const versions = await selectVersions(em, sheetId, itemId)
    if (versions.length === 0) throw problem('not-found', `There is no item ${itemId} on this sheet.`)
    const numbers = versions.map((version) => version.since)
    const entries = await selectEntriesOf(em, sheetId, numbers)
    return versions.flatMap((version) => {
      const entry = entries.get(version.since)
      return entry ? [{ ...version, entry }] : []
    })
  }
}
