import { isSidedFold, type FaultType } from '../items/lines'
import type { LineTarget } from './mapping'

/** What lies on the side of a fault that its symbol shows; undefined where the symbol shows none. */
export function faultSideMeaning(type: FaultType): string | undefined {
  if (type === 'reverse' || type === 'thrust') return 'upper plate'
  if (type === 'normal') return 'downthrown side'
  return type === 'rotational' ? 'downthrown side at its start' : undefined
}

/** Whether a target is a fault whose symbol has a side. */
export const isSidedFault = (target: LineTarget): boolean =>
  target.kind === 'fault' && faultSideMeaning(target.type) !== undefined

/** Whether a target is a fold whose symbol has a side. */
export const isSidedAxis = (target: LineTarget): boolean =>
  target.kind === 'axial-trace' && isSidedFold(target.form)
