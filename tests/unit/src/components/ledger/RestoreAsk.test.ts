import { createPinia, setActivePinia } from 'pinia'
import { flushPromises, mount } from '@vue/test-utils'
import { beforeEach, describe, expect, it, vi } from 'vitest'
import type { RestorePreview } from '@shared/api/restores'
import { toDifference } from '@shared/changes/differences'
import { ownProblem } from '@/api/problem'
import { ApiProblem, call } from '@/api/client'
import RestoreAsk from '@/components/ledger/RestoreAsk.vue'
import { aRow, tove } from '../../../../support/ledger-rows'
import { useSheetFake } from '../../../../support/open-sheet-fake'
import { aPoint } from '../../../../support/sheet-items'

vi.mock('@/stores/sheet', async () => ({
  useSheetStore: (await import('../../../../support/open-sheet-fake')).useSheetFake,
}))
vi.mock('@/api/client', async (original) => ({ ...(await original<object>()), call: vi.fn() }))

const attitude = aPoint('attitude', [284_500, 5_278_400], {
  type: 'bedding',
  strike: 40,
  dip: 35,
  station: '14',
})
const entry = aRow(12, { author: tove, message: 'dip of attitude 14: 35 → 53' })
const aPreview = (overrides: Partial<RestorePreview> = {}): RestorePreview => ({
  base: 418,
  counts: [{ kind: 'attitude', added: 0, removed: 1, moved: 0, reattributed: 0 }],
  differences: [toDifference({ before: attitude, after: null })],
  later: [],
  laterItems: 0,
  message: 'took back entry 11: took in “traverse.csv”',
  obstacle: null,
  ...overrides,
})
const answered = (message: string) => ({ revision: 419, entry: { ...entry, revision: 419, message } })

/** What the server was asked: endpoint and body. */
const asked = () =>
  vi.mocked(call).mock.calls.map(([endpoint, input]) => ({ id: endpoint.id, ...(input as object) }))

async function ask(preview: RestorePreview, waiting = 0) {
  const sheet = useSheetFake()
  sheet.start([])
  sheet.saved = { state: 'saved', revision: 418, waiting }
  vi.mocked(call).mockResolvedValueOnce(preview)
  const wrapper = mount(RestoreAsk, { props: { restore: { what: 'entry', revision: 11 } } })
  await flushPromises()
  const act = () => wrapper.findAll('button').find((button) => button.text() === 'Take it back')
  return { wrapper, act }
}

beforeEach(() => {
  setActivePinia(createPinia())
  vi.mocked(call).mockReset()
})

describe('taking an entry back', () => {
  it('says first what it would do, and changes nothing by itself', async () => {
    const { wrapper } = await ask(aPreview())
    expect(wrapper.text()).toContain('This would remove 1 attitude.')
    expect(wrapper.text()).toContain('attitude 14: removed')
    expect(asked().map(({ id }) => id)).toEqual(['previewRestore'])
  })

  it('is done on the revision that was previewed, with the message that was written', async () => {
    const { wrapper, act } = await ask(aPreview())
    await wrapper.find('input[type=text]').setValue('the file was of another sheet')
    vi.mocked(call).mockResolvedValueOnce(answered('the file was of another sheet'))
    await act()?.trigger('click')
    await flushPromises()
    expect(asked()[1]).toMatchObject({
      id: 'restoreSheet',
      body: {
        restore: { what: 'entry', revision: 11 },
        base: 418,
        message: 'the file was of another sheet',
        undoLater: false,
      },
    })
    expect(wrapper.text()).toContain('Done, as revision 419')
  })

  it('names later changes, and is not to be done before they may be undone too', async () => {
    const later = [{ id: attitude.id, kind: 'attitude' as const, name: 'attitude 14', entries: [entry] }]
    const { wrapper, act } = await ask(aPreview({ later, laterItems: 1 }))
    expect(wrapper.text()).toContain('Not without undoing later changes of 1 item')
    expect(wrapper.text()).toContain('revision 12, Tove Orr: dip of attitude 14: 35 → 53')
    expect(act()?.attributes('disabled')).toBeDefined()
    await wrapper.find('input[type=checkbox]').setValue(true)
    vi.mocked(call).mockResolvedValueOnce(answered(''))
    await act()?.trigger('click')
    await flushPromises()
    expect(asked()[1]).toMatchObject({ body: { undoLater: true } })
  })

  it('goes by the same key when it is tried again after a lost answer', async () => {
    const { wrapper, act } = await ask(aPreview())
    vi.mocked(call).mockRejectedValueOnce(
      new ApiProblem(ownProblem('unavailable', 'The server does not answer.')),
    )
    await act()?.trigger('click')
    await flushPromises()
    expect(wrapper.text()).toContain('The server does not answer.')
    vi.mocked(call).mockResolvedValueOnce(answered(''))
    await act()?.trigger('click')
    await flushPromises()
    const [, first, second] = asked() as { headers?: Record<string, string> }[]
    expect(first?.headers?.['Idempotency-Key']).toMatch(/^[0-9a-f-]{36}$/)
    expect(second?.headers).toEqual(first?.headers)
  })

  it('offers nothing where something stands in the way, or changes of this page still wait', async () => {
    const unit = 'Unit Sv still has labels.'
    const stopped = await ask(aPreview({ obstacle: unit }))
    expect(stopped.wrapper.text()).toContain(unit)
    expect(stopped.act()).toBeUndefined()
    const waiting = await ask(aPreview(), 2)
    expect(waiting.wrapper.text()).toContain('Your last changes are not saved yet')
    expect(waiting.act()).toBeUndefined()
  })
})
