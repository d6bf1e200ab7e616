import { computed, ref, shallowRef, watch } from 'vue'
import { discardIntake, listIntakes, uploadIntake, type Intake } from '@shared/api/intake'
import type { Problem } from '@shared/api/problems'
import { ApiProblem, call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'

/** A file on its way to the server, or one that was refused there. */
export interface Arrival {
  key: number
  name: string
  state: 'waiting' | 'reading' | 'refused'
  problem: Problem | null
}

/** The files brought to the open sheet: brings new ones, one after another, and knows which one is looked at. */
export function useIntakes() {
  const sheet = useSheetStore()
  const intakes = shallowRef<Intake[]>([])
  const arrivals = ref<Arrival[]>([])
  const selectedId = ref<string | null>(null)
  const problem = shallowRef<Problem | null>(null)
  const selected = computed(() => intakes.value.find((intake) => intake.id === selectedId.value) ?? null)
  let keys = 0
  let last: Promise<void> = Promise.resolve()

  async function read(number: string): Promise<void> {
    problem.value = null
    try {
      intakes.value = await call(listIntakes, { params: { sheet: number } })
      selectedId.value ??= intakes.value.find((intake) => intake.state === 'read')?.id ?? null
    } catch (error) {
      problem.value = problemOf(error)
    }
  }

  /** Brings files; each is read when those before it are. */
  function bring(files: readonly File[]): void {
    const number = sheet.sheet?.number
    if (number === undefined) return
    for (const file of files) {
      const arrival: Arrival = { key: keys++, name: file.name, state: 'waiting', problem: null }
      arrivals.value.push(arrival)
      last = last.then(() => bringOne(number, file, arrival.key))
    }
  }

  async function bringOne(number: string, file: File, key: number): Promise<void> {
    change(key, { state: 'reading' })
    try {
      const intake = await call(uploadIntake, { params: { sheet: number }, file })
      leave(key)
      if (sheet.sheet?.number !== number) return
      intakes.value = [intake, ...intakes.value]
      selectedId.value = intake.id
    } catch (error) {
      change(key, { state: 'refused', problem: problemOf(error) })
    }
  }

  function change(key: number, news: Partial<Arrival>): void {
    arrivals.value = arrivals.value.map((arrival) =>
      arrival.key === key ? { ...arrival, ...news } : arrival,
    )
  }

  /** Takes a refused file off the list. */
  function leave(key: number): void {
    arrivals.value = arrivals.value.filter((arrival) => arrival.key !== key)
  }

  /** Puts a file aside without taking it in. */
  async function discard(intake: Intake): Promise<void> {
    const number = sheet.sheet?.number
    if (number === undefined) return
    problem.value = null
    try {
      await call(discardIntake, { params: { sheet: number, intake: intake.id } })
      replace({ ...intake, state: 'discarded' })
    } catch (error) {
      problem.value = problemOf(error)
    }
  }

  function replace(intake: Intake): void {
    intakes.value = intakes.value.map((known) => (known.id === intake.id ? intake : known))
  }

  watch(
    () => sheet.sheet?.number,
    (number) => {
      intakes.value = []
      arrivals.value = []
      selectedId.value = null
      if (number !== undefined) void read(number)
    },
    { immediate: true },
  )

  return { intakes, arrivals, selected, selectedId, problem, bring, leave, discard, replace }
}

/** The problem that an error carries; errors of our own are not swallowed. */
export function problemOf(error: unknown): Problem {
  if (error instanceof ApiProblem) return error.problem
  throw error
}
