/** One choice of a list. */
export interface Option {
  key: string
  title: string
}

/** Choices under one heading; without a title, choices for themselves. */
export interface OptionGroup {
  title: string
  options: readonly Option[]
}

/** A list without headings. */
export const plainList = (options: readonly Option[]): OptionGroup[] => [{ title: '', options }]
