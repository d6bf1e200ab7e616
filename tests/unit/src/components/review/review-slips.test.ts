import { createPinia, setActivePinia } from 'pinia'
import { mount, RouterLinkStub } from '@vue/test-utils'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { Submission } from '@shared/api/review'
import ContentsTable from '@/components/review/ContentsTable.vue'
import DecisionForm from '@/components/review/DecisionForm.vue'
import ReleaseSlip from '@/components/review/ReleaseSlip.vue'
import SubmissionSlip from '@/components/review/SubmissionSlip.vue'
import { useSheetFake } from '../../../../support/open-sheet-fake'
import { aSheetFace, aUnit } from '../../../../support/sheet-items'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))

beforeEach(() => setActivePinia(createPinia()))

const person = { id: '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e01', name: 'Tove Orr', initials: 'TO' }
const approver = { id: '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e02', name: 'Edda Marr', initials: 'EM' }
const aSubmission = (overrides: Partial<Submission> = {}): Submission => ({
  id: '5b0c1d1e-7a3f-4c58-9b4a-0d6f2f1a9e03',
  revision: 418,
  since: 400,
  digest: 'd'.repeat(64),
  submittedBy: person,
  at: '2026-12-01T10:00:00.000Z',
  message: 'For edition 2',
  contents: [
    { kind: 'contact', items: 14 },
    { kind: 'sheet-face', items: 1 },
  ],
  differences: [{ kind: 'contact', added: 3, changed: 2, removed: 1 }],
  authors: [person],
  entries: [],
  decision: null,
  obstacle: null,
  job: null,
  edition: null,
  ...overrides,
})
const slip = () => mount(SubmissionSlip, { props: { submission: aSubmission(), isBusy: false }, global })
const global = { stubs: { RouterLink: RouterLinkStub } }

describe('an approver’s decision', () => {
  const form = () => mount(DecisionForm, { props: { revision: 418, edition: 2, isBusy: false } })

  it('is an approval with or without a note', async () => {
    const wrapper = form()
    await wrapper.find('textarea').setValue('  Sound. ')
    await wrapper.find('form').trigger('submit')
    expect(wrapper.emitted('decide')).toEqual([['approved', 'Sound.']])
  })

  it('asks what has to change before it returns the sheet', async () => {
    const wrapper = form()
    const back = wrapper.findAll('button').find((button) => button.text() === 'Return it')
    await back?.trigger('click')
    expect(wrapper.emitted('decide')).toBeUndefined()
    expect(wrapper.text()).toContain('Say what has to change')
    await wrapper.find('textarea').setValue('The north contact is open.')
    await back?.trigger('click')
    expect(wrapper.emitted('decide')).toEqual([['returned', 'The north contact is open.']])
  })
})

it('shows what is new since the edition before, in figures', () => {
  const rows = mount(ContentsTable, { props: { revision: aSubmission() } })
    .findAll('tbody tr')
    .map((row) => row.text().replaceAll(/\s+/g, ' '))
  expect(rows).toEqual(['contacts14+32−1'])
})

describe('a submission', () => {
  it('tells whoever may not decide why, instead of a form', () => {
    const obstacle = 'You submitted revision 418 yourself; another approver has to look at it.'
    const wrapper = mount(SubmissionSlip, {
      props: { submission: aSubmission({ obstacle }), isBusy: false },
      global,
    })
    expect(wrapper.text()).toContain(obstacle)
    expect(wrapper.find('form').exists()).toBe(false)
  })

  it('that was returned shows by whom and why', () => {
    const decision = {
      decision: 'returned' as const,
      by: approver,
      at: '2026-12-01T11:00:00.000Z',
      note: 'Open contact.',
    }
    const wrapper = mount(SubmissionSlip, {
      props: { submission: aSubmission({ decision }), isBusy: false },
      global,
    })
    expect(wrapper.text()).toContain('Revision 418 was returned')
    expect(wrapper.text()).toContain('Edda Marr')
    expect(wrapper.text()).toContain('Open contact.')
  })
})

describe('a release', () => {
  const decision = { decision: 'approved' as const, by: approver, at: '2026-12-01T11:00:00.000Z', note: '' }
  const slip = (overrides: Partial<Submission>, job: Submission['job']) =>
    mount(ReleaseSlip, {
      props: { submission: aSubmission({ decision, ...overrides }), job, isBusy: false },
      global,
    })
  const job = {
    id: person.id,
    kind: 'release' as const,
    sheet: 'MI-14',
    progress: 0.42,
    message: 'Drawing attitudes',
  }

  it('shows how far it is', () => {
    const wrapper = slip({}, { ...job, state: 'running' })
    expect(wrapper.find('progress').attributes('value')).toBe('42')
    expect(wrapper.text()).toContain('Drawing attitudes')
    expect(wrapper.find('button').exists()).toBe(false)
  })

  it('that failed says why and can be asked for again', async () => {
    const wrapper = slip({}, { ...job, state: 'failed', message: 'The disk is full.' })
    expect(wrapper.text()).toContain('The disk is full.')
    await wrapper.find('button').trigger('click')
    expect(wrapper.emitted('release')).toHaveLength(1)
  })

  it('that is done leads to the catalogue', () => {
    const wrapper = slip({ edition: 2 }, { ...job, state: 'done' })
    expect(wrapper.findComponent(RouterLinkStub).props('to')).toBe('/catalogue/MI-14/2')
  })
})

describe('doubts about a submission', () => {
  const ring: [number, number][] = [[0, 0], [100, 0], [100, 100], [0, 0]] // prettier-ignore

  it('tell an approver of areas without a unit, with the way to each', () => {
    const sheet = useSheetFake()
    sheet.start([aUnit({}), aSheetFace({ authors: 'Rosa Kelp' })])
    sheet.faces = [
      { unit: null, rings: [ring] },
      { unit: null, rings: [ring] },
    ]
    const links = slip().findComponent({ name: 'DoubtsList' }).findAllComponents(RouterLinkStub)
    expect(slip().text()).toContain('2 areas have no unit label')
    expect(links.map((link) => link.text())).toEqual(['1', '2'])
  })

  it('are not told while the unit areas are not built yet', () => {
    const sheet = useSheetFake()
    sheet.start([])
    sheet.facesRevision = null
    expect(slip().find('.doubts').exists()).toBe(false)
  })
})
