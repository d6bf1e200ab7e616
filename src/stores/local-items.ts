import { editedId } from '@shared/changes/change-set'
import type { Item, ItemKind, ItemOf } from '@shared/items/item'
import type { Batch } from '@/offline/batches'

/** The items of the open sheet: what the server has confirmed, and what the screen shows, which is that plus the
 *  changes that wait. Plain maps, outside Vue's reactivity: a sheet has thousands of items. */
export class LocalItems {
  private readonly confirmed = new Map<string, Item>()
  private readonly shown = new Map<string, Item>()

  get(id: string): Item | undefined {
    return this.shown.get(id)
  }

  /** As the server has it, without the changes that wait. */
  confirmedItem(id: string): Item | undefined {
    return this.confirmed.get(id)
  }

  all(): Item[] {
    return [...this.shown.values()]
  }

  ofKind<K extends ItemKind>(kind: K): ItemOf<K>[] {
    const found: ItemOf<K>[] = []
    for (const item of this.shown.values()) if (isOfKind(item, kind)) found.push(item)
    return found
  }

  /** Starts again from a whole revision. */
  reset(items: readonly Item[]): void {
    this.confirmed.clear()
    this.shown.clear()
    for (const item of items) {
      this.confirmed.set(item.id, item)
      this.shown.set(item.id, item)
    }
  }

  /** Takes over what the server says of some items; what is shown follows with `show`. */
  confirm(put: readonly Item[], removed: readonly string[]): void {
    for (const item of put) this.confirmed.set(item.id, item)
    for (const id of removed) this.confirmed.delete(id)
  }

  /** Works out again what is shown of some items: the last waiting edit, or else what is confirmed. */
  show(ids: Iterable<string>, batches: readonly Batch[]): void {
    const waiting = new Map<string, Item | null>()
    for (const batch of batches) for (const edit of batch.edits) waiting.set(editedId(edit), edit.after)
    for (const id of ids) {
      const item = waiting.has(id) ? waiting.get(id) : this.confirmed.get(id)
      if (item) this.shown.set(id, item)
      else this.shown.delete(id)
    }
  }
}

function isOfKind<K extends ItemKind>(item: Item, kind: K): item is ItemOf<K> {
  return item.kind === kind
}
