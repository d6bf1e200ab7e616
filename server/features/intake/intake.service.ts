import { createHash, randomUUID } from 'node:crypto'
import { readFile } from 'node:fs/promises'
import type { Readable } from 'node:stream'
import { buffer } from 'node:stream/consumers'
import type { DataSource } from 'typeorm'
import type { Intake, IntakePreview } from '@shared/api/intake'
import type { LedgerEntry } from '@shared/api/sheets'
import type { Mapping } from '@shared/intake/mapping'
import { takenInMessage } from '@shared/intake/taken-in-message'
import { problem } from '../../platform/problem'
import type { Storage } from '../../platform/storage'
import type { LedgerService } from '../ledger/ledger.service'
import type { SheetsService } from '../sheets/sheets.service'
import { findMappingFaults } from './check-mapping'
import { resolveFileCrs } from './file-crs'
import { FileTooHard, IntakeDesk } from './intake-desk'
import type { FileSummary, IntakeTask, TaskAnswer, TaskFile, TaskSheet } from './intake-task'
import {
  findIntake,
  insertIntake,
  lockIntakeState,
  markDiscarded,
  markTakenIn,
  selectIntakes,
  type StoredIntake,
} from './intake.queries'
import { requireSomething, toIntakeAnswer } from './intake-words'
import type { FileCrs } from './readers/read-outcome'

/** Largest file that is read, bytes. */
export const MAX_FILE_BYTES = 50_000_000

/** A file as it arrived: on disk, with the name that its sender gave it. */
export interface BroughtFile {
  path: string
  name: string
  bytes: number
}

export interface TakenIn {
  revision: number
  entry: LedgerEntry
  accepted: number
  refused: number
}

/** Reads field files, shows what a mapping would make of them, and takes them in: one file, one ledger entry. The
 *  original is kept byte for byte and read again for each step, so that it alone decides. */
export class IntakeService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly storage: Storage,
    private readonly ledger: LedgerService,
    private readonly sheets: SheetsService,
    private readonly desk = new IntakeDesk(),
  ) {}

  /** Reads a file and keeps it; nothing is taken in yet. */
  async bring(sheetId: string, accountId: string, file: BroughtFile): Promise<Intake> {
    if (file.bytes > MAX_FILE_BYTES) throw tooLarge(file.bytes)
    const bytes = await readFile(file.path)
    const name = plainName(file.name)
    const { summary, crs } = await this.summarize(bytes, name)
    const id = randomUUID()
    const storageKey = `intake/${sheetId}/${id}`
    const sha256 = createHash('sha256').update(bytes).digest('hex')
    await this.storage.put(storageKey, bytes)
    try {
      const row = {
        id,
        sheetId,
        accountId,
        file: name,
        bytes: bytes.length,
        sha256,
        storageKey,
        crs,
        summary,
      }
      await insertIntake(this.dataSource.manager, row)
    } catch (cause) {
      await this.storage.remove(storageKey)
      throw cause
    }
    return this.get(sheetId, id)
  }

  /** Files brought to a sheet, newest first. */
  async list(sheetId: string): Promise<Intake[]> {
    return (await selectIntakes(this.dataSource.manager, sheetId)).map(toIntakeAnswer)
  }

  async get(sheetId: string, id: string): Promise<Intake> {
    return toIntakeAnswer(await this.find(sheetId, id))
  }

  /** What a mapping would take in and refuse; changes nothing. */
  async preview(sheetId: string, id: string, mapping: Mapping): Promise<IntakePreview> {
    const intake = await this.find(sheetId, id)
    requireFit(mapping, intake)
    const job = { mapping, file: await this.fileOf(intake), sheet: await this.sheetOf(sheetId) }
    const answer = await this.run({ task: 'preview', ...job })
    if (answer.outcome !== 'preview') throw changedFile(intake)
    return answer.preview
  }

  /** Takes a file in as one ledger entry: all that is accepted, or nothing at all. */
  async takeIn(
    sheetId: string,
    id: string,
    accountId: string,
    { mapping, message }: { mapping: Mapping; message: string },
  ): Promise<TakenIn> {
    const intake = await this.find(sheetId, id)
    requireRead(intake.state, intake)
    requireFit(mapping, intake)
    const job = { mapping, file: await this.fileOf(intake), sheet: await this.sheetOf(sheetId) }
    const answer = await this.run({ task: 'take-in', ...job })
    if (answer.outcome !== 'applied') throw changedFile(intake)
    const { applied, byKind } = answer
    requireSomething(applied, intake.file)
    const report = {
      accepted: applied.items.length,
      refused: applied.refusals.length,
      outside: applied.outside,
      leftOut: applied.leftOut,
    }
    const entry = await this.dataSource.transaction(async (em) => {
      requireRead((await lockIntakeState(em, id)) ?? 'discarded', intake)
      const words = message || takenInMessage(intake.file, byKind)
      const written = await this.ledger.appendItems(em, sheetId, accountId, applied.items, {
        kind: 'intake',
        message: words,
      })
      await markTakenIn(em, id, { revision: written.revision, mapping, report })
      return written
    })
    return { revision: entry.revision, entry, accepted: report.accepted, refused: report.refused }
  }

  /** Puts a file aside without taking it in; the original is kept. */
  async discard(sheetId: string, id: string): Promise<void> {
    const intake = await this.find(sheetId, id)
    await this.dataSource.transaction(async (em) => {
      requireRead((await lockIntakeState(em, id)) ?? 'discarded', intake)
      await markDiscarded(em, id)
    })
  }

  /** The original, byte for byte. */
  async original(sheetId: string, id: string): Promise<{ name: string; bytes: number; source: Readable }> {
    const intake = await this.find(sheetId, id)
    return { name: intake.file, bytes: intake.bytes, source: await this.storage.open(intake.storageKey) }
  }

  /** Ends the reading thread. */
  close(): Promise<void> {
    return this.desk.close()
  }

  private async find(sheetId: string, id: string): Promise<StoredIntake> {
    const intake = await findIntake(this.dataSource.manager, sheetId, id)
    if (!intake) throw problem('not-found', 'This file was not brought to this sheet.')
    return intake
  }

  private async summarize(
    bytes: Uint8Array,
    name: string,
  ): Promise<{ summary: FileSummary; crs: FileCrs | null }> {
    const read = (crs: FileCrs | null) => this.run({ task: 'read', file: { bytes, name, crs } })
    let crs: FileCrs | null = null
    let answer = await read(null)
    if (answer.outcome === 'asks-crs') {
      const found = await resolveFileCrs(this.dataSource.manager, answer.srid)
      if (found.outcome === 'refused') throw problem('unreadable-file', found.reason)
      crs = found.crs
      answer = await read(crs)
    }
    if (answer.outcome === 'summary') return { summary: answer.summary, crs }
    const reason = answer.outcome === 'unreadable' ? answer.reason : 'Its coordinate system is not clear.'
    throw problem('unreadable-file', `${name}: ${reason}`)
  }

  private async run<T extends IntakeTask>(task: T): Promise<TaskAnswer<T>> {
    try {
      return await this.desk.run(task)
    } catch (cause) {
      if (!(cause instanceof FileTooHard)) throw cause
      throw problem('unreadable-file', `${task.file.name}: ${cause.message} Split it into smaller files.`)
    }
  }

  private async fileOf(intake: StoredIntake): Promise<TaskFile> {
    const bytes = await buffer(await this.storage.open(intake.storageKey))
    return { bytes, name: intake.file, crs: intake.crs }
  }

  private async sheetOf(sheetId: string): Promise<TaskSheet> {
    const { crs, neatline } = await this.sheets.get(sheetId, null)
    const ring = neatline.map(([east, north]): [number, number] => [east, north])
    return { crs: { name: `EPSG:${crs.srid}`, proj4: crs.proj4 }, neatline: ring }
  }
}

const tooLarge = (bytes: number) =>
  problem(
    'file-too-large',
    `The file has ${Math.ceil(bytes / 1e6)} MB; files of up to ${MAX_FILE_BYTES / 1e6} MB are read.`,
  )

/** It was read when it was brought, and its bytes have not changed since. */
const changedFile = (intake: StoredIntake) =>
  new Error(`The original of intake ${intake.id} can no longer be read.`)

function requireRead(state: Intake['state'], intake: StoredIntake): void {
  if (state === 'read') return
  const what = state === 'taken-in' ? 'was taken in already' : 'was put aside'
  throw problem('wrong-state', `${intake.file} ${what}. Bring it again to read it anew.`)
}

function requireFit(mapping: Mapping, { summary }: StoredIntake): void {
  const errors = findMappingFaults(mapping, summary.columns)
  if (errors.length > 0) throw problem('invalid-input', errors[0]?.detail ?? '', { errors })
}

/** Last part of a sender's file name, without control characters; a name and never a path. */
function plainName(name: string): string {
  const last = name.split(/[/\\]/).at(-1) ?? ''
  const clean = last.replace(/[\p{Cc}\p{Cf}\p{Surrogate}]/gu, '').trim()
  return clean === '' ? 'unnamed' : clean.slice(-200)
}
