import { createPinia, setActivePinia } from 'pinia'
import { afterEach, beforeEach, describe, expect, it, vi } from 'vitest'
import { effectScope, nextTick, reactive } from 'vue'
import type { Intake, IntakePreview } from '@shared/api/intake'
import { useIntakePreview } from '@/composables/useIntakePreview'
import { aMapping } from '../../../support/intake-records'

/** As it goes over the wire: later changes do not reach it. */
const asSent = <T>(value: T): T => JSON.parse(JSON.stringify(value))

const asked: { mapping: unknown; answer: (preview: Partial<IntakePreview>) => void }[] = []
vi.mock('@/api/client', () => ({
  ApiProblem: class extends Error {},
  call: (_: unknown, { body }: { body: { mapping: unknown } }) =>
    new Promise((resolve) => asked.push({ mapping: asSent(body.mapping), answer: resolve })),
}))
vi.mock('@/stores/sheet', () => ({ useSheetStore: () => ({ sheet: { number: 'MI-14' } }) }))

beforeEach(() => {
  setActivePinia(createPinia())
  vi.useFakeTimers()
  asked.length = 0
})
afterEach(() => void vi.useRealTimers())

/** The preview of a file whose mapping a person changes. */
function aPreview() {
  const subject = reactive({ intake: { id: 'a' }, mapping: aMapping({}) })
  const scope = effectScope()
  // Of an intake, the preview reads no more than its id.
  const read = () => ({ intake: subject.intake as Intake, mapping: subject.mapping })
  const made = scope.run(() => useIntakePreview(read))
  if (!made) throw new Error('The scope is closed.')
  return { subject, scope, ...made }
}

describe('the preview', () => {
  it('is asked for at once, and again when the hand rests', async () => {
    const { subject, preview, isCurrent } = aPreview()
    await vi.advanceTimersByTimeAsync(0)
    asked[0]?.answer({ accepted: 1 })
    await vi.advanceTimersByTimeAsync(0)
    expect([preview.value?.accepted, isCurrent.value]).toEqual([1, true])
    for (const side of ['left', 'right', 'left'] as const) {
      subject.mapping.lines.faultSide = side
      await vi.advanceTimersByTimeAsync(100)
    }
    expect([asked.length, isCurrent.value]).toEqual([1, false])
    await vi.advanceTimersByTimeAsync(400)
    expect(asked).toHaveLength(2)
    expect(asked[1]?.mapping).toMatchObject({ lines: { faultSide: 'left' } })
  })

  it('drops the answer for a mapping that has changed meanwhile', async () => {
    const { subject, preview } = aPreview()
    await vi.advanceTimersByTimeAsync(0)
    subject.mapping.lines.faultSide = 'left'
    await vi.advanceTimersByTimeAsync(500)
    asked[1]?.answer({ accepted: 2 })
    asked[0]?.answer({ accepted: 1 })
    await vi.advanceTimersByTimeAsync(0)
    expect(preview.value?.accepted).toBe(2)
  })

  it('forgets the last file when another is looked at, and asks nothing once it is gone', async () => {
    const { subject, scope, preview } = aPreview()
    await vi.advanceTimersByTimeAsync(0)
    asked[0]?.answer({ accepted: 1 })
    await vi.advanceTimersByTimeAsync(0)
    subject.intake = { id: 'b' }
    await nextTick()
    expect(preview.value).toBeNull()
    scope.stop()
    await vi.advanceTimersByTimeAsync(1000)
    expect(asked).toHaveLength(1)
  })
})
