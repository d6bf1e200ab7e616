import { defineStore } from 'pinia'
import { reactive } from 'vue'
import type { Intake } from '@shared/api/intake'
import { mappingSchema, type Mapping } from '@shared/intake/mapping'

/** What a person has changed of a file's proposed mapping and not taken in yet. */
export interface IntakeDraft {
  mapping: Mapping
  /** Fields whose question has been answered. */
  answered: Set<string>
  message: string
}

/** Mappings under way, by intake: they survive going to another place of the workplace and back. */
export const useIntakeStore = defineStore('intake', () => {
  const drafts = reactive(new Map<string, IntakeDraft>())

  /** The draft of a file, begun from its proposal. */
  function draftOf(intake: Intake): IntakeDraft {
    if (!drafts.has(intake.id)) {
      // Parsing copies it, and fills in what a proposal made by an older version does not have.
      const mapping = mappingSchema.parse(intake.proposal)
      drafts.set(intake.id, { mapping, answered: new Set(), message: '' })
    }
    // Just put there if it was missing; the map's own value is the reactive one.
    return drafts.get(intake.id) as IntakeDraft
  }

  const forget = (id: string): boolean => drafts.delete(id)

  return { drafts, draftOf, forget }
})
