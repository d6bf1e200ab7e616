import { computed, ref, shallowRef, watch } from 'vue'
import type { z } from 'zod'
import type { Job } from '@shared/api/jobs'
import type { Problem } from '@shared/api/problems'
import {
  decideSubmission,
  getSubmission,
  getSubmittable,
  releaseSheet,
  submitSheet,
  type Submission,
} from '@shared/api/review'
import { ApiProblem, call } from '@/api/client'
import { useSheetStore } from '@/stores/sheet'

export type Submittable = z.infer<typeof getSubmittable.answer>

/** The review of the open sheet: what is submitted, what could be, and the steps from one to the other. It follows the
 *  sheet: whoever submits, decides or releases elsewhere, it shows it. */
export function useReview() {
  const sheet = useSheetStore()
  const submission = shallowRef<Submission | null>(null)
  const submittable = shallowRef<Submittable | null>(null)
  const isLoaded = ref(false)
  const isBusy = ref(false)
  const problem = ref<Problem | null>(null)

  const number = computed(() => sheet.sheet?.number)
  const state = computed(() => sheet.sheet?.state)
  /** The release job as last announced; before any announcement, as it was read. */
  const job = computed<Job | null>(() => {
    const known = submission.value?.job ?? null
    return (known && sheet.jobs.find((each) => each.id === known.id)) ?? known
  })
  const isFinished = computed(() => job.value?.state === 'done' || job.value?.state === 'failed')

  watch(
    () => [number.value, state.value, sheet.saved.revision, isFinished.value],
    () => void guard(load),
    { immediate: true },
  )

  async function load(): Promise<void> {
    const current = number.value
    if (!current) return
    const params = { sheet: current }
    const isDrafting = state.value === 'drafting'
    const [latest, next] = await Promise.all([
      call(getSubmission, { params }),
      isDrafting ? call(getSubmittable, { params }) : Promise.resolve(null),
    ])
    if (number.value !== current) return
    submission.value = latest
    submittable.value = next
    isLoaded.value = true
  }

  /** Runs a step; a problem is kept to be shown, and what is shown then is what holds now. */
  async function guard(step: () => Promise<unknown>): Promise<void> {
    try {
      await step()
    } catch (error) {
      if (!(error instanceof ApiProblem)) throw error
      problem.value = error.problem
    }
  }

  async function take(step: (params: { sheet: string }) => Promise<unknown>): Promise<void> {
    const current = number.value
    if (!current || isBusy.value) return
    isBusy.value = true
    problem.value = null
    try {
      await guard(() => step({ sheet: current }))
      await guard(load)
    } finally {
      isBusy.value = false
    }
  }

  const submit = (message: string): Promise<void> =>
    take((params) =>
      call(submitSheet, { params, body: { revision: submittable.value?.revision ?? 0, message } }),
    )

  /** Decides on the submission as shown: its digest goes with the decision. */
  const decide = (decision: 'approved' | 'returned', note: string): Promise<void> =>
    take((params) =>
      call(decideSubmission, { params, body: { decision, note, digest: submission.value?.digest ?? '' } }),
    )

  const release = (): Promise<void> => take((params) => call(releaseSheet, { params }))

  return { submission, submittable, job, isLoaded, isBusy, problem, submit, decide, release }
}
