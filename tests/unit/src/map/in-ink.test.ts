import { describe, expect, it } from 'vitest'
import type { DisplayList } from '@shared/symbols/display-list'
import { inInk } from '@/map/in-ink'

describe('a drawing in one ink', () => {
  it('has that ink in every mark, also within groups; paper stays paper', () => {
    const path = [['move', 0, 0]] as const
    const list: DisplayList = [
      { mark: 'stroke', path, width: 0.2, ink: 'black' },
      { mark: 'fill', path, ink: 'paper' },
      { mark: 'group', name: 'arrows', marks: [{ mark: 'fill', path, ink: '#8fae9f' }] },
    ]
    expect(inInk(list, 'fold')).toEqual([
      { mark: 'stroke', path, width: 0.2, ink: 'fold' },
      { mark: 'fill', path, ink: 'paper' },
      { mark: 'group', name: 'arrows', marks: [{ mark: 'fill', path, ink: 'fold' }] },
    ])
  })
})
