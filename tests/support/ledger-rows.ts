import type { LedgerRow } from '@shared/api/ledger'

export const rosa = { id: '00000000-0000-4000-8000-000000000001', name: 'Rosa Kelp', initials: 'RK' }
export const tove = { id: '00000000-0000-4000-8000-000000000002', name: 'Tove Orr', initials: 'TO' }

/** An entry as the ledger lists it. */
export const aRow = (revision: number, overrides: Partial<LedgerRow> = {}): LedgerRow => ({
  revision,
  kind: 'edit',
  author: rosa,
  at: '2026-03-04T15:00:00Z',
  message: 'drew 1 contact',
  what: 'drew 1 contact',
  changed: 1,
  name: null,
  ...overrides,
})
