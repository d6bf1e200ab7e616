import { computed, reactive, ref, shallowRef, watch } from 'vue'
import { createSheet, getCrs, type Crs, type NewSheet, type Sheet } from '@shared/api/sheets'
import type { Problem } from '@shared/api/problems'
import { emptyDraft, readDraft, sides, type DraftErrors, type DraftField } from '@shared/sheets/sheet-draft'
import { layOutSheet } from '@shared/sheets/sheet-layout'
import { ApiProblem, call } from '@/api/client'
import { sentencesAt } from '@/api/problem'

/** Which field shows a sentence of the server about a place in the request. */
const pointers: Record<string, DraftField> = {
  '/number': 'number',
  '/title': 'title',
  '/authors': 'authors',
  '/scale': 'scale',
  '/srid': 'srid',
  '/page': 'page',
  '/area': 'north',
  ...Object.fromEntries(sides.map((side) => [`/area/${side}`, side])),
}

/** A new sheet as it is being written: what was typed, what follows from it, what stands in the way, and creating it. */
export function useNewSheet() {
  const draft = reactive(emptyDraft())
  const read = computed(() => readDraft(draft))
  const { crs, crsError } = useCrs(() => read.value.srid)

  const laidOut = computed(() => {
    const { area, scale, page } = read.value
    return area && scale && crs.value ? layOutSheet(area, crs.value, scale, page) : undefined
  })
  const layout = computed(() => (laidOut.value?.outcome === 'layout' ? laidOut.value.layout : undefined))

  const refusal = ref<Problem | null>(null)
  const isCreating = ref(false)
  const visited = reactive(new Set<DraftField>())
  const isAsked = ref(false)

  const allErrors = computed<DraftErrors>(() => {
    const errors: DraftErrors = { ...read.value.errors }
    if (crsError.value) errors.srid ??= crsError.value
    const laid = laidOut.value
    if (laid?.outcome === 'refused') errors[laid.field === 'srid' ? 'srid' : 'north'] ??= laid.reason
    if (laid?.outcome === 'layout' && !laid.layout.fits) errors.page ??= laid.layout.reason
    for (const [pointer, field] of Object.entries(pointers)) {
      const said = refusal.value?.errors?.filter((error) => error.pointer === pointer) ?? []
      if (said.length) errors[field] ??= said.map(({ detail }) => detail).join(' ')
    }
    return errors
  })
  /** Sentences to show: those of fields already left, and all once it was asked to create. */
  const errors = computed<DraftErrors>(() =>
    isAsked.value
      ? allErrors.value
      : Object.fromEntries(Object.entries(allErrors.value).filter(([field]) => isVisited(field))),
  )
  const isVisited = (field: string): boolean =>
    [...visited].some((known) => known === field) || field === 'page'

  // What the server refused has been changed: its sentence goes.
  watch(draft, () => (refusal.value = null))

  /** Creates the sheet; undefined where something stands in the way, or while it is being created already. */
  async function create(): Promise<Sheet | undefined> {
    if (isCreating.value) return undefined
    isAsked.value = true
    const sheet = toNewSheet()
    if (!sheet) return undefined
    isCreating.value = true
    try {
      return await call(createSheet, { body: sheet })
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      refusal.value = error.problem
      return undefined
    } finally {
      isCreating.value = false
    }
  }

  function toNewSheet(): NewSheet | undefined {
    const { area, srid, scale } = read.value
    const page = layout.value?.page
    if (Object.keys(allErrors.value).length || !area || !srid || !scale || !page) return undefined
    const { number, title, authors, attitudeConvention } = draft
    return { number, title, authors, attitudeConvention, area, srid, scale, page }
  }

  const visit = (field: DraftField): void => void visited.add(field)
  /** Sentences of the server that no field shows. */
  const otherProblem = computed(() => {
    const problem = refusal.value
    if (!problem) return null
    return Object.keys(pointers).some((pointer) => sentencesAt(problem, pointer).length) ? null : problem
  })

  return { draft, read, crs, layout, errors, problem: otherProblem, isCreating, visit, create }
}

/** The projected system with an EPSG code, asked for once per code. */
function useCrs(srid: () => number | undefined) {
  const known = new Map<number, Crs>()
  const crs = shallowRef<Crs>()
  const crsError = ref('')
  let timer: ReturnType<typeof setTimeout> | undefined

  async function ask(code: number): Promise<void> {
    try {
      const found = await call(getCrs, { params: { srid: code } })
      known.set(code, found)
      if (srid() === code) crs.value = found
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      if (srid() === code) crsError.value = error.problem.detail
    }
  }

  watch(
    srid,
    (code) => {
      clearTimeout(timer)
      crsError.value = ''
      crs.value = code === undefined ? undefined : known.get(code)
      // A code is typed figure by figure: the server is asked when the hand rests.
      if (code !== undefined && !crs.value) timer = setTimeout(() => void ask(code), 250)
    },
    { immediate: true },
  )
  return { crs, crsError }
}
