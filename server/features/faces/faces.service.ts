import type { DataSource, EntityManager } from 'typeorm'
import type { Face } from '@shared/api/faces'
import {
  buildFaces,
  getBuildState,
  lockBuilding,
  selectBuiltFaces,
  selectStoredFaces,
  storeBuiltFaces,
  type BuildState,
} from './faces.queries'

/** The faces of a sheet, largest first, and the revision that they hold for. */
export interface FacesAt {
  revision: number
  faces: Face[]
}

/** Gives the unit areas of sheets, building them when linework or labels have changed since they were last built. */
export class FacesService {
  /** Builds under way in this process, by sheet: whoever asks meanwhile waits without holding a connection. */
  private readonly building = new Map<string, Promise<FacesAt>>()

  constructor(private readonly dataSource: DataSource) {}

  /** Faces of the revision that is the latest when asked, or of a later one. */
  async list(sheetId: string): Promise<FacesAt> {
    const stored = await this.findFresh(sheetId)
    if (stored) return stored
    const running = this.building.get(sheetId)
    if (running) {
      // It may have begun before the newest revision: its result counts only if it is still fresh.
      await running
      const fresh = await this.findFresh(sheetId)
      if (fresh) return fresh
    }
    return this.build(sheetId)
  }

  /** Faces of a sheet at any revision, within the caller's transaction; nothing is stored. */
  async facesAt(em: EntityManager, sheetId: string, revision: number): Promise<Face[]> {
    await buildFaces(em, sheetId, revision)
    const faces = await selectBuiltFaces(em)
    await em.query('DROP TABLE built_face')
    return faces
  }

  private findFresh(sheetId: string): Promise<FacesAt | undefined> {
    return this.dataSource.transaction('REPEATABLE READ', async (em) => {
      const state = await getBuildState(em, sheetId)
      if (isStale(state)) return undefined
      return { revision: state.revision, faces: await selectStoredFaces(em, sheetId) }
    })
  }

  private build(sheetId: string): Promise<FacesAt> {
    const joined = this.building.get(sheetId)
    if (joined) return joined
    const begun = this.buildAlone(sheetId).finally(() => this.building.delete(sheetId))
    this.building.set(sheetId, begun)
    return begun
  }

  /** One builder at a time over all processes: who comes second finds the work done. */
  private buildAlone(sheetId: string): Promise<FacesAt> {
    return this.dataSource.transaction(async (em) => {
      await lockBuilding(em, sheetId)
      const state = await getBuildState(em, sheetId)
      if (isStale(state)) {
        await buildFaces(em, sheetId, state.revision)
        await storeBuiltFaces(em, sheetId, state.revision)
      }
      return { revision: state.revision, faces: await selectStoredFaces(em, sheetId) }
    })
  }
}

const isStale = ({ builtFrom, lineworkRevision }: BuildState): boolean =>
  builtFrom === null || builtFrom < lineworkRevision
