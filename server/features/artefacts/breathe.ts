/** Lets the process answer others before long work goes on. */
export const breathe = (): Promise<void> => new Promise((resolve) => setImmediate(resolve))
