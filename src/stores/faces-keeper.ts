import type { Face } from '@shared/api/faces'
import type { Edit } from '@shared/changes/change-set'
import type { ItemKind } from '@shared/items/item'

/** Kinds that unit areas are derived from. */
const facesFollow: ReadonlySet<ItemKind> = new Set(['contact', 'fault', 'unit-label'])

/** Whether unit areas have to be built again after an item of this kind changed. */
export const shapesFaces = (kind: ItemKind): boolean => facesFollow.has(kind)
export const editsShapeFaces = (edits: readonly Edit[]): boolean =>
  edits.some(({ before, after }) => {
    const kind = (after ?? before)?.kind
    return kind !== undefined && shapesFaces(kind)
  })

/** Pause after a change before unit areas are asked for, milliseconds: a run of strokes asks once. */
const PAUSE_MS = 350

export interface FacesKeeperPorts {
  read(): Promise<{ revision: number; faces: Face[] }>
  show(faces: Face[], revision: number): void
  later(work: () => void, delayMs: number): () => void
}

/** Asks for unit areas after saved changes, once per run of changes and never two at a time. */
export function facesKeeper(ports: FacesKeeperPorts): { refresh(): void; close(): void } {
  let cancel: () => void = () => {}
  let reading = false
  let again = false
  let closed = false
  async function read(): Promise<void> {
    if (reading) {
      again = true
      return
    }
    reading = true
    try {
      const { revision, faces } = await ports.read()
      if (!closed) ports.show(faces, revision)
    } catch {
      // The areas on screen keep the revision they were built from, which the foot shows; the next change asks again.
    } finally {
      reading = false
    }
    if (again && !closed) {
      again = false
      await read()
    }
  }
  return {
    refresh() {
      cancel()
      cancel = ports.later(() => void read(), PAUSE_MS)
    },
    close() {
      closed = true
      cancel()
    },
  }
}
