import { openDB, type DBSchema, type IDBPDatabase } from 'idb'
import type { Batch } from './batches'
import { newId } from './new-id'

/** What one open page of a sheet has not yet had acknowledged. */
interface OutboxRecord {
  /** Id of the page that wrote it; also the name of the lock that the page holds while it lives. */
  page: string
  /** Account and sheet, so that nobody sends another person's changes. */
  owner: string
  batches: readonly Batch[]
}

interface OutboxSchema extends DBSchema {
  outbox: { key: string; value: OutboxRecord; indexes: { owner: string } }
}

/** Where unsent changes are kept until they are acknowledged. */
export interface Outbox {
  /** Changes that pages closed before left behind, oldest first. They belong to this outbox from now on. */
  adopt(): Promise<Batch[]>
  /** Writes down what waits now; an empty list removes the record. Writes happen in the order of the calls. */
  save(batches: readonly Batch[]): Promise<void>
  close(): void
  /** False where the browser keeps nothing: then closing the page loses what waits, and the page must say so. */
  keeps: boolean
}

const lockName = (page: string): string => `sheetwright-page-${page}`

/** The outbox of one account on one sheet, in IndexedDB. Each open page has its own record and holds a lock of the same
 *  name; a record whose lock is free belongs to a page that is gone, and is adopted. */
export async function openOutbox(account: string, sheet: string): Promise<Outbox> {
  const database = await openDatabase()
  if (!database) return memoryOutbox()
  const page = newId()
  const owner = `${account} ${sheet}`
  const releases = [await holdLock(page)]
  let last: Promise<unknown> = Promise.resolve()
  const inOrder = <T>(work: () => Promise<T>): Promise<T> => {
    const next = last.then(work, work)
    last = next.catch(() => undefined)
    return next
  }
  return {
    keeps: true,
    adopt: () =>
      inOrder(async () => {
        const adopted: OutboxRecord[] = []
        for (const record of await database.getAllFromIndex('outbox', 'owner', owner)) {
          if (record.page === page) continue
          const release = await holdLock(record.page)
          if (!release) continue
          releases.push(release)
          adopted.push(record)
        }
        const batches = adopted.flatMap((record) => record.batches)
        const exchange = database.transaction('outbox', 'readwrite')
        if (batches.length > 0) await exchange.store.put({ page, owner, batches })
        await Promise.all(adopted.map((record) => exchange.store.delete(record.page)))
        await exchange.done
        return batches
      }),
    save: (batches) =>
      inOrder(async () => {
        if (batches.length === 0) await database.delete('outbox', page)
        else await database.put('outbox', { page, owner, batches })
      }),
    close() {
      void inOrder(async () => {
        releases.forEach((release) => release?.())
        database.close()
      })
    },
  }
}

/** An outbox that forgets with the page: for browsers that refuse IndexedDB, for example in a private window. */
export function memoryOutbox(): Outbox {
  return { keeps: false, adopt: async () => [], save: async () => {}, close: () => {} }
}

async function openDatabase(): Promise<IDBPDatabase<OutboxSchema> | undefined> {
  if (typeof indexedDB === 'undefined') return undefined
  try {
    return await openDB<OutboxSchema>('sheetwright', 1, {
      upgrade(database) {
        database.createObjectStore('outbox', { keyPath: 'page' }).createIndex('owner', 'owner')
      },
    })
  } catch {
    // Refused by the browser's settings; the page works on and says that it keeps nothing.
    return undefined
  }
}

/** Holds a page's lock and answers how to let it go; undefined where a living page holds it. */
function holdLock(page: string): Promise<(() => void) | undefined> {
  // Without the Lock API (insecure origins) a page cannot tell whether another lives; records are then adopted at once.
  if (!('locks' in navigator)) return Promise.resolve(() => {})
  return new Promise((resolve) => {
    void navigator.locks.request(lockName(page), { ifAvailable: true }, (lock) => {
      if (!lock) return resolve(undefined)
      return new Promise<void>((release) => resolve(() => release()))
    })
  })
}
