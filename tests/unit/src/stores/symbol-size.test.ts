import { beforeEach, describe, expect, it } from 'vitest'
import { effectScope, nextTick, ref } from 'vue'
import { useSymbolSize } from '@/stores/symbol-size'

beforeEach(() => localStorage.clear())

const sizeFor = (person: { value: string | undefined }) => {
  const size = effectScope().run(() => useSymbolSize(() => person.value))
  if (!size) throw new Error('There is no size.')
  return size
}

describe('how symbols are shown beyond 100 %', () => {
  it('is print size, until a person chooses; and is kept for them', async () => {
    const person = ref<string | undefined>('rina')
    const size = sizeFor(person)
    expect(size.value).toBe('print')
    size.value = 'screen'
    await nextTick()
    expect(sizeFor(person).value).toBe('screen')
  })

  it('is another person’s own choice', async () => {
    const person = ref<string | undefined>('rina')
    const size = sizeFor(person)
    size.value = 'screen'
    await nextTick()
    person.value = 'tove'
    await nextTick()
    expect(size.value).toBe('print')
    person.value = 'rina'
    await nextTick()
    expect(size.value).toBe('screen')
  })

  it('is not kept where nobody is signed in', async () => {
    const size = sizeFor(ref(undefined))
    size.value = 'screen'
    await nextTick()
    expect(localStorage.length).toBe(0)
  })
})
