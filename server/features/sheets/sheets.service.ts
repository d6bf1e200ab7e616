import { randomUUID } from 'node:crypto'
import type { DataSource, EntityManager } from 'typeorm'
import type { Crs, LedgerEntry, NewSheet, Sheet } from '@shared/api/sheets'
import { sheetProjection, type SheetProjection } from '@shared/geometry/projection'
import { groupThousands } from '@shared/sheet-face/figures'
import { faceSize, fitsPage, proposePage } from '@shared/sheet-face/page-layout'
import { sheetArea } from '@shared/sheets/sheet-area'
import type { LonLat, XY } from '@shared/units'
import { keepAudit } from '../../platform/audit'
import { problem } from '../../platform/problem'
import type { LedgerService } from '../ledger/ledger.service'
import { selectLastEntries } from '../ledger/entries.queries'
import { readCrs } from './crs'
import {
  findCrs,
  findSheet,
  findSheetId,
  insertMembership,
  insertSheet,
  isEditorSomewhere,
  selectSheets,
  type SheetWithRoles,
} from './sheets.queries'

/** Who asks. */
export interface Caller {
  id: string
  email: string
  administrator: boolean
}

/** Smallest side of a map face that is still a map, millimetres. */
const SMALLEST_FACE_MM = 10

/** Lists and creates sheets. */
export class SheetsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly ledger: LedgerService,
  ) {}

  /** The sheets that the caller belongs to, by number; administrators see all. */
  async list(caller: Caller): Promise<{ sheets: Sheet[]; mayCreate: boolean }> {
    const em = this.dataSource.manager
    const rows = await selectSheets(em, caller.id, caller.administrator)
    const entries = await selectLastEntries(
      em,
      rows.map((row) => row.id),
    )
    return {
      sheets: rows.map((row) => toSheetAnswer(row, entries.get(row.id))),
      mayCreate: await mayCreate(em, caller),
    }
  }

  /** One sheet as the caller sees it; without roles for a caller who is null. */
  async get(sheetId: string, callerId: string | null, em = this.dataSource.manager): Promise<Sheet> {
    const row = await findSheet(em, callerId, sheetId)
    if (!row) throw problem('not-found', 'There is no such sheet.')
    const entries = await selectLastEntries(em, [sheetId])
    return toSheetAnswer(row, entries.get(sheetId))
  }

  /** Id of a sheet by its number. */
  async find(number: string): Promise<string | undefined> {
    return findSheetId(this.dataSource.manager, number)
  }

  /** A projected system in metres. */
  async getCrs(srid: number): Promise<Crs> {
    const row = await findCrs(this.dataSource.manager, srid)
    if (!row) throw problem('not-found', `EPSG:${srid} is not a coordinate system that this server knows.`)
    const found = readCrs(row)
    if (found.outcome === 'refused') throw problem('not-found', found.reason)
    return found.crs
  }

  /** Creates a sheet at revision 1, which holds its sheet face. Its creator edits it, unless they are an administrator,
   *  who gives memberships afterwards. */
  async create(newSheet: NewSheet, caller: Caller): Promise<Sheet> {
    return this.dataSource.transaction(async (em) => {
      if (!(await mayCreate(em, caller))) {
        throw problem('not-allowed', 'Sheets are created by administrators and by editors of a sheet.')
      }
      const id = await this.createWithin(em, newSheet, caller.id)
      if (!caller.administrator) await this.letEdit(em, id, newSheet.number, caller)
      return this.get(id, caller.id, em)
    })
  }

  private async letEdit(em: EntityManager, id: string, sheet: string, caller: Caller): Promise<void> {
    await insertMembership(em, id, caller.id, 'editor')
    await keepAudit(em, {
      event: { kind: 'membership', email: caller.email, before: [], after: ['editor'] },
      accountId: caller.id,
      sheet,
    })
  }

  /** Creates a sheet within the caller's transaction, whoever they are; answers with its id. */
  async createWithin(em: EntityManager, newSheet: NewSheet, authorId: string, at?: Date): Promise<string> {
    const crs = await usableCrs(em, newSheet.srid)
    const neatline = neatlineOf(newSheet, crs)
    requireFit(newSheet, neatline)
    const id = await insertSheet(em, newSheet, neatline)
    if (!id) throw numberTaken(newSheet.number)
    const sheetFace = {
      kind: 'sheet-face' as const,
      id: randomUUID(),
      geometry: null,
      properties: {
        authors: newSheet.authors,
        attitudeConvention: newSheet.attitudeConvention,
        credit: '',
        printing: 'colour' as const,
      },
    }
    await this.ledger.appendEdits(em, id, authorId, [{ before: null, after: sheetFace }], {
      kind: 'creation',
      message: `created sheet ${newSheet.number}, ${newSheet.title}`,
      ...(at ? { at } : {}),
    })
    return id
  }
}

const mayCreate = async (em: EntityManager, caller: Caller): Promise<boolean> =>
  caller.administrator || (await isEditorSomewhere(em, caller.id))

const invalid = (pointer: string, detail: string) =>
  problem('invalid-input', detail, { errors: [{ pointer, detail }] })

function numberTaken(number: string) {
  const detail = `There is already a sheet ${number}.`
  return problem('number-taken', detail, { errors: [{ pointer: '/number', detail }] })
}

async function usableCrs(
  em: EntityManager,
  srid: number,
): Promise<{ crs: Crs; projection: SheetProjection }> {
  const row = await findCrs(em, srid)
  if (!row) throw invalid('/srid', `EPSG:${srid} is not a coordinate system that this server knows.`)
  const found = readCrs(row)
  if (found.outcome === 'refused') throw invalid('/srid', found.reason)
  const { crs } = found
  try {
    return { crs, projection: sheetProjection(crs.proj4) }
  } catch (cause) {
    // proj4 throws at methods it does not know; the cause belongs in the log, the sentence to the person.
    const refused = invalid('/srid', `${crs.name} (EPSG:${srid}) uses a projection that is not supported.`)
    throw Object.assign(refused, { cause })
  }
}

function neatlineOf(
  newSheet: NewSheet,
  { crs, projection }: { crs: Crs; projection: SheetProjection },
): XY[] {
  const found = sheetArea(newSheet.area, projection, crs.proj4, newSheet.scale)
  if (found.outcome === 'refused') throw invalid('/area', found.reason)
  return found.neatline
}

function requireFit({ scale, page }: NewSheet, neatline: XY[]): void {
  const face = faceSize(neatline, scale)
  const size = `${Math.round(face.width)} × ${Math.round(face.height)} mm at 1:${groupThousands(scale)}`
  if (face.width < SMALLEST_FACE_MM || face.height < SMALLEST_FACE_MM) {
    throw invalid('/area', `The map face would be ${size}: choose a larger area or a larger scale.`)
  }
  if (fitsPage(face, page)) return
  const proposed = proposePage(face)
  const mend = proposed
    ? `choose ${proposed.name}, a smaller area or a smaller scale`
    : 'no ISO page holds it: choose a smaller area or a smaller scale'
  throw invalid(
    '/page',
    `The map face would be ${size}; with its legend it does not fit a page of ${page.width} × ${page.height} mm: ${mend}.`,
  )
}

/** A row as the API answers it. */
function toSheetAnswer(row: SheetWithRoles, lastEntry: LedgerEntry | undefined): Sheet {
  const found = readCrs(row)
  if (found.outcome === 'refused') throw new Error(`Sheet ${row.number}: ${found.reason}`)
  const polygon: { coordinates: XY[][] } = JSON.parse(row.neatline)
  const neatline = polygon.coordinates[0] ?? []
  const projection = sheetProjection(found.crs.proj4)
  return {
    number: row.number,
    title: row.title,
    scale: row.scale,
    crs: found.crs,
    neatline,
    footprint: neatline.map((corner): LonLat => projection.toLonLat(corner)),
    page: { width: row.pageWidth, height: row.pageHeight },
    state: row.state,
    revision: row.revision,
    edition: row.edition,
    myRoles: row.roles,
    lastEntry: lastEntry ?? null,
  }
}
