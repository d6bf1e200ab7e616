/** Types of `debian.mjs` for the tests. */
export function findProgram(name: string): string | undefined
export function ensurePostgres(): string
