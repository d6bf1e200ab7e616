const MINUTE_MS = 60_000
const HOUR_MS = 60 * MINUTE_MS
const DAY_MS = 24 * HOUR_MS

/** How long ago a moment was, short, for a column: `now`, `12 min`, `3 h`, `2 d`; from a week on its date.
 *  @param at ISO 8601   @param nowMs milliseconds since 1970 */
export function timeSince(at: string, nowMs: number): string {
  const passedMs = nowMs - Date.parse(at)
  if (passedMs < MINUTE_MS) return 'now'
  if (passedMs < HOUR_MS) return `${Math.floor(passedMs / MINUTE_MS)} min`
  if (passedMs < DAY_MS) return `${Math.floor(passedMs / HOUR_MS)} h`
  if (passedMs < 7 * DAY_MS) return `${Math.floor(passedMs / DAY_MS)} d`
  return dayWords(at)
}

/** The same for a sentence: `just now`, `12 min ago`, `on 4 March 2026`. */
export function timeAgo(at: string, nowMs: number): string {
  const since = timeSince(at, nowMs)
  if (since === 'now') return 'just now'
  return nowMs - Date.parse(at) < 7 * DAY_MS ? `${since} ago` : `on ${since}`
}

const date = new Intl.DateTimeFormat('en-GB', { day: 'numeric', month: 'long', year: 'numeric' })
const clock = new Intl.DateTimeFormat('en-GB', { hour: '2-digit', minute: '2-digit' })

/** The day of a moment where the reader is: `4 March 2026`. */
export const dayWords = (at: string): string => date.format(new Date(at))

/** The time of day of a moment where the reader is: `14:05`. */
export const clockWords = (at: string): string => clock.format(new Date(at))
