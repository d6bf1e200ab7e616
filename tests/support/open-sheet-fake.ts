import { defineStore } from 'pinia'
import { computed, ref, shallowRef } from 'vue'
import type { Role } from '@shared/api/accounts'
import type { Face } from '@shared/api/faces'
import type { LedgerEntry, Sheet } from '@shared/api/sheets'
import { editedId, type Edit } from '@shared/changes/change-set'
import { sheetProjection, type SheetProjection } from '@shared/geometry/projection'
import type { Item, ItemKind, ItemOf } from '@shared/items/item'
import { checkEdits } from '@/stores/check-edits'
import { LocalItems } from '@/stores/local-items'

/** A sheet of the demo's kind: UTM zone 26N, west of its central meridian. */
export const aSheet = (overrides: Partial<Sheet> = {}): Sheet => ({
  number: 'MI-14',
  title: 'Gannet Head, Merrow Island',
  scale: 24_000,
  crs: {
    srid: 32626,
    name: 'WGS 84 / UTM zone 26N',
    proj4: '+proj=utm +zone=26 +datum=WGS84 +units=m +no_defs',
  },
  neatline: [
    [284_000, 5_278_000],
    [294_000, 5_278_000],
    [294_000, 5_289_000],
    [284_000, 5_289_000],
    [284_000, 5_278_000],
  ],
  footprint: [],
  page: { width: 841, height: 594 },
  state: 'drafting',
  revision: 418,
  edition: 1,
  myRoles: ['editor'],
  lastEntry: null,
  ...overrides,
})

/** The open sheet without a server: items, the one door with its real checks, and what was committed. */
export const useSheetFake = defineStore('sheet', () => {
  const sheet = shallowRef<Sheet | null>(aSheet())
  const projection = shallowRef<SheetProjection>(sheetProjection(aSheet().crs.proj4))
  const itemsVersion = ref(0)
  const faces = shallowRef<Face[]>([])
  const facesRevision = ref<number | null>(418)
  const entries = shallowRef<LedgerEntry[]>([])
  const saved = shallowRef({ state: 'saved', revision: 418, waiting: 1 })
  const committed = shallowRef<{ label: string; edits: Edit[] }[]>([])
  const roles = computed<readonly Role[]>(() => sheet.value?.myRoles ?? [])
  const readOnly = computed(() => (sheet.value?.state === 'drafting' ? null : 'The sheet is submitted.'))
  const mayEdit = computed(() => readOnly.value === null)
  let local = new LocalItems()

  function start(items: readonly Item[], as: Partial<Sheet> = {}): void {
    sheet.value = aSheet(as)
    local = new LocalItems()
    local.reset(items)
    committed.value = []
    itemsVersion.value += 1
  }

  function commit(label: string, edits: readonly Edit[]) {
    const checked = checkEdits(edits, (id) => local.get(id))
    if (checked.outcome === 'refused') return checked
    local.confirm(
      checked.edits.flatMap((edit) => edit.after ?? []),
      checked.edits.filter((edit) => !edit.after).map(editedId),
    )
    local.show(checked.edits.map(editedId), [])
    committed.value = [...committed.value, { label, edits: checked.edits }]
    itemsVersion.value += 1
    return { outcome: 'done' } as const
  }

  const get = (id: string): Item | undefined => local.get(id)
  const all = (): Item[] => local.all()
  const ofKind = <K extends ItemKind>(kind: K): ItemOf<K>[] => local.ofKind(kind)

  return {
    sheet,
    projection,
    itemsVersion,
    faces,
    facesRevision,
    entries,
    saved,
    committed,
    roles,
    readOnly,
    mayEdit,
    start,
    commit,
    get,
    all,
    ofKind,
  }
})
