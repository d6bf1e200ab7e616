/** What the scripts tell whoever runs them: one plain sentence per step. */
export const say = (sentence) => console.log(sentence)

/** A reason to stop that the reader can do something about; shown without a stack. */
export class Stop extends Error {}

/** Ends a script: sentences for what we foresaw, the whole fault for what we did not. */
export function fail(fault) {
  console.error(fault instanceof Stop ? `\n${fault.message}` : fault)
  process.exitCode = 1
}
