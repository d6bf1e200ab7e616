/** Words as they begin a sentence or a title: the first letter large, the rest as it was. */
export const upperFirst = (words: string): string => words.charAt(0).toUpperCase() + words.slice(1)

/** Words as they go on in a sentence. */
export const lowerFirst = (words: string): string => words.charAt(0).toLowerCase() + words.slice(1)
