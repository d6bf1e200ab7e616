import type { Intake } from '@shared/api/intake'

/** A file's size for people: 812 bytes, 79 kB, 2.8 MB. */
export function fileSize(bytes: number): string {
  if (bytes < 1000) return `${bytes} bytes`
  if (bytes < 1_000_000) return `${Math.round(bytes / 1000)} kB`
  return `${(bytes / 1_000_000).toFixed(1)} MB`
}

/** What has become of a file that was brought. */
export function fateOf(intake: Intake): string {
  if (intake.state === 'taken-in') return `taken in at revision ${intake.revision ?? ''}`
  return intake.state === 'discarded' ? 'put aside' : 'waiting to be taken in'
}
