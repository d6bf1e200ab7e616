import { createPinia, setActivePinia } from 'pinia'
import { mount, RouterLinkStub } from '@vue/test-utils'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Intake, IntakePreview } from '@shared/api/intake'
import TakeInSlip from '@/components/intake/TakeInSlip.vue'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))
beforeEach(() => setActivePinia(createPinia()))

const preview: IntakePreview = {
  accepted: 41,
  refused: 2,
  outside: 1,
  leftOut: 0,
  byKind: [
    { kind: 'attitude', items: 40 },
    { kind: 'contact', items: 1 },
  ],
  refusals: [],
  echoes: [],
  sample: [],
}

const aSlip = (given: object = {}, intake: Partial<Intake> = {}) =>
  mount(TakeInSlip, {
    props: {
      // Of an intake, the slip reads no more than this.
      intake: { file: 'ridge.geojson', state: 'read', revision: null, ...intake } as Intake,
      preview,
      isCurrent: true,
      openQuestions: 0,
      readOnly: null,
      isTaking: false,
      problem: null,
      message: '',
      ...given,
    },
    global: { stubs: { RouterLink: RouterLinkStub } },
  })

describe('taking a file in', () => {
  it('is offered with the count, and with what the ledger will say', async () => {
    const slip = aSlip()
    const [take] = slip.findAll('button')
    expect(take?.text()).toBe('Take in 41 items')
    expect(slip.get('input').attributes('placeholder')).toBe(
      'took in “ridge.geojson”: 40 attitudes, 1 contact',
    )
    await take?.trigger('click')
    expect(slip.emitted('take')).toHaveLength(1)
  })

  it.each([
    ['a question is open', { openQuestions: 1 }, /Answer the question marked red first/],
    ['nothing would come in', { preview: { ...preview, accepted: 0 } }, /nothing would be taken in/],
    ['the sheet is not to be changed', { readOnly: 'The sheet is submitted.' }, /The sheet is submitted/],
  ])('waits while %s, and says so', async (_, given, reason) => {
    const slip = aSlip(given)
    const [take] = slip.findAll('button')
    expect(take?.attributes('disabled')).toBeDefined()
    expect(slip.get('[role=status]').text()).toMatch(reason)
  })

  it('waits for the preview of the mapping as it now is', () => {
    expect(aSlip({ isCurrent: false }).findAll('button')[0]?.attributes('disabled')).toBeDefined()
    expect(aSlip({ preview: null }).findAll('button')[0]?.attributes('disabled')).toBeDefined()
  })

  it('happens once, however often one clicks', async () => {
    const slip = aSlip({ isTaking: true })
    await slip.findAll('button')[0]?.trigger('click')
    expect(slip.emitted('take')).toBeUndefined()
  })

  it('says afterwards where it is', () => {
    const slip = aSlip({}, { state: 'taken-in', revision: 14 })
    expect(slip.get('[role=status]').text()).toContain('Taken in at revision 14')
    expect(slip.find('button').exists()).toBe(false)
  })
})
