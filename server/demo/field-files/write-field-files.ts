import { mkdirSync, writeFileSync } from 'node:fs'
import { join, resolve } from 'node:path'
import { merrowSheets, merrowTruth } from '../merrow-island'
import { terrainFile } from '../terrain-file'
import { demoFieldFiles } from './field-files'

/** Writes the field files of the demo, and the elevation models of its sheets, to a folder: `npm run demo-files [folder]`. */
const tell = (name: string, about: string) => process.stdout.write(`${name.padEnd(28)} ${about}\n`)
const folder = resolve(process.argv[2] ?? 'field-files')
mkdirSync(folder, { recursive: true })
for (const { name, about, bytes } of demoFieldFiles()) {
  writeFileSync(join(folder, name), bytes)
  tell(name, about)
}
for (const { sheet, extent } of merrowSheets) {
  const name = `terrain-${sheet.number}.tif`
  writeFileSync(join(folder, name), terrainFile(merrowTruth.ground, extent))
  tell(name, `elevation model of sheet ${sheet.number}, GeoTIFF`)
}
process.stdout.write(`Written to ${folder}\n`)
