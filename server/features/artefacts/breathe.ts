/** Lets the process answer others before long work goes on. */
export const breathe = (): Promise<void> => new Promise((resolve) => setImmediate(resolve))

/** Told how far a piece of work is: 0–1, and what is being done. */
export type Report = (progress: number, message: string) => Promise<void>
