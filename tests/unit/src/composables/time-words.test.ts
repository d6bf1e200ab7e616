import { describe, expect, it } from 'vitest'
import { timeAgo, timeSince } from '@/composables/time-words'

const NOW = Date.parse('2026-03-04T12:00:00Z')
const before = (ms: number) => new Date(NOW - ms).toISOString()
const MINUTE = 60_000
const HOUR = 60 * MINUTE
const DAY = 24 * HOUR

describe('how long ago', () => {
  it.each([
    [0, 'now', 'just now'],
    [-5000, 'now', 'just now'],
    [59_999, 'now', 'just now'],
    [MINUTE, '1 min', '1 min ago'],
    [HOUR - 1, '59 min', '59 min ago'],
    [HOUR, '1 h', '1 h ago'],
    [DAY, '1 d', '1 d ago'],
    [7 * DAY - 1, '6 d', '6 d ago'],
  ])('%i ms is %s', (ms, short, sentence) => {
    expect(timeSince(before(ms), NOW)).toBe(short)
    expect(timeAgo(before(ms), NOW)).toBe(sentence)
  })

  it('is a date from a week on', () => {
    expect(timeAgo('2025-11-12T12:00:00Z', NOW)).toBe('on 12 November 2025')
  })
})
