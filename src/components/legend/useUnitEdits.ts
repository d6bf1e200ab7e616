import { computed } from 'vue'
import { byRank, placeForAge, rankBetween, ranksAfterMove, ranksInOrder } from '@shared/legend/rank'
import type { ItemOf } from '@shared/items/item'
import type { UnitProperties } from '@shared/items/legend'
import { useItemEdits, type Refusal } from '@/composables/useItemEdits'
import { newId } from '@/offline/new-id'
import { useSheetStore } from '@/stores/sheet'

type Unit = ItemOf<'unit'>

/** What an editor does to the legend's units; everything goes through the sheet's one door into the ledger. */
export function useUnitEdits() {
  const sheet = useSheetStore()
  const { commit, change, remove } = useItemEdits()
  /** Compilers draw with the legend; its units are the editors' to change. */
  const mayEditUnits = computed(() => sheet.mayEdit && sheet.roles.includes('editor'))

  const sorted = (): Unit[] => byRank(sheet.ofKind('unit'))

  const edit = (unit: Unit, properties: Partial<UnitProperties>): Refusal => change(unit, properties)

  /** Puts a new unit where its age belongs. */
  function add(properties: Omit<UnitProperties, 'rank'>): Refusal {
    const units = sorted()
    const place = placeForAge(
      properties.age,
      units.map((unit) => unit.properties),
    )
    const rank = rankBetween(units[place - 1]?.properties.rank, units[place]?.properties.rank)
    if (rank !== undefined) return commit([added({ ...properties, rank })])
    const ranks = ranksInOrder(units.length + 1)
    const others = units.map((unit, index) => reranked(unit, ranks[index < place ? index : index + 1] ?? 0))
    return commit([added({ ...properties, rank: ranks[place] ?? 0 }), ...others])
  }

  /** Moves a unit to another place of the list, 0 for the top. */
  function move(unit: Unit, place: number): Refusal {
    const units = sorted()
    const at = Math.min(Math.max(place, 0), units.length - 1)
    const ranks = new Map(ranksAfterMove(units, unit.id, at).map(({ id, rank }) => [id, rank]))
    return commit(
      units.flatMap((each) => {
        const rank = ranks.get(each.id)
        return rank === undefined ? [] : [reranked(each, rank)]
      }),
    )
  }

  /** Moves a unit some places down, or up where negative. */
  const moveBy = (unit: Unit, places: number): Refusal =>
    move(unit, sorted().findIndex((each) => each.id === unit.id) + places)

  /** Removes a unit that no label names. Answers why not, in a sentence, where one does. */
  function removeUnit(unit: Unit): string | undefined {
    const labels = sheet.ofKind('unit-label').filter((label) => label.properties.unit === unit.id).length
    if (labels > 0) {
      const use = labels === 1 ? '1 unit label uses it' : `${labels} unit labels use it`
      return `${unit.properties.name} cannot be removed: ${use}. Give them another unit, or remove them first.`
    }
    return Object.values(remove([unit]) ?? {})[0]
  }

  return { mayEditUnits, edit, add, move, moveBy, removeUnit, sorted }
}

const added = (properties: UnitProperties) => ({
  before: null,
  after: { id: newId(), kind: 'unit', geometry: null, properties } as const,
})

const reranked = (unit: Unit, rank: number) => ({
  before: unit,
  after: { ...unit, properties: { ...unit.properties, rank } },
})
