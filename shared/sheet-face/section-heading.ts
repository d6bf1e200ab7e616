import type { Millimetres } from '../units'
import { paragraph, rule, space, type Block } from './block'
import type { TypeScale } from './type-scale'

/** Heading of a section of the margin: tracked capitals, ruled off from what stands above. */
export const sectionHeading = (text: string, width: Millimetres, type: TypeScale): Block[] => [
  { ...space(4 * type.factor), staysWithNext: true },
  paragraph(text.toUpperCase(), width, type.section, { staysWithNext: true }),
  { ...space(0.8 * type.factor), staysWithNext: true },
  rule(width, 0.13),
  { ...space(1.8 * type.factor), staysWithNext: true },
]
