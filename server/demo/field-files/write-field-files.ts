import { mkdirSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { demoFieldFiles } from './field-files'

/** Writes the field files of the demo to a folder: `npm run demo-files [folder]`. */
const folder = resolve(process.argv[2] ?? 'field-files')
mkdirSync(folder, { recursive: true })
for (const { name, about, bytes } of demoFieldFiles()) {
  writeFileSync(join(folder, name), bytes)
  process.stdout.write(`${name.padEnd(28)} ${about}\n`)
}
process.stdout.write(`Written to ${folder}\n`)
