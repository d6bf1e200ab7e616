import type { Readable } from 'node:stream'
import type { DataSource, EntityManager } from 'typeorm'
import type { Artefact, Edition } from '@shared/api/catalogue'
import { problem } from '../../platform/problem'
import type { Storage } from '../../platform/storage'
import {
  findEdition,
  findEditionRevision,
  findLatestEdition,
  getStorageKey,
  selectEditions,
  type StoredEdition,
} from './editions.queries'

/** Reads released editions. Everyone may: nothing here asks who. */
export class EditionsService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly storage: Storage,
  ) {}

  /** Editions, newest first; those whose sheet number, title or authors contain a text, if given. */
  async list(text?: string): Promise<Edition[]> {
    return (await selectEditions(this.dataSource.manager, text)).map(toEditionAnswer)
  }

  /** One edition of a sheet. */
  async get(sheetNumber: string, edition: number): Promise<Edition> {
    const row = await findEdition(this.dataSource.manager, sheetNumber, edition)
    if (!row) throw problem('not-found', `Sheet ${sheetNumber} has no released edition ${edition}.`)
    return toEditionAnswer(row)
  }

  /** A file of an edition, to be read once. */
  async openFile(
    sheetNumber: string,
    edition: number,
    name: string,
  ): Promise<{ artefact: Artefact; open: () => Promise<Readable> }> {
    const { artefacts } = await this.get(sheetNumber, edition)
    const artefact = artefacts.find((file) => file.name === name)
    if (!artefact) {
      throw problem('not-found', `Edition ${edition} of sheet ${sheetNumber} has no file of this name.`)
    }
    const key = await getStorageKey(this.dataSource.manager, sheetNumber, edition, artefact.name)
    return { artefact, open: () => this.storage.open(key) }
  }

  /** Revision that an edition of a sheet was made of; undefined where there is no such edition. */
  async findRevision(em: EntityManager, sheetId: string, edition: number): Promise<number | undefined> {
    return findEditionRevision(em, sheetId, edition)
  }

  /** Number and revision of the latest edition of a sheet; undefined before the first. */
  async findLatest(
    em: EntityManager,
    sheetId: string,
  ): Promise<{ number: number; revision: number } | undefined> {
    return findLatestEdition(em, sheetId)
  }
}

function toEditionAnswer({ srid, crsName, releasedAt, ...rest }: StoredEdition): Edition {
  return {
    ...rest,
    crs: { srid, name: crsName },
    releasedAt: releasedAt.toISOString(),
    artefacts: rest.artefacts ?? [],
  }
}
