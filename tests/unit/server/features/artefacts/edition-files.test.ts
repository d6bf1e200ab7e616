import { expect, it } from 'vitest'
import { downloadName } from '../../../../../server/features/artefacts/edition-files'

it.each([
  ['sheet.pdf', 'MI-14-edition-1.pdf'],
  ['data.geojson', 'MI-14-edition-1.geojson'],
  ['sheet.svg', 'MI-14-edition-1.svg'],
  ['manifest.json', 'MI-14-edition-1-manifest.json'],
])('a download of %s is called %s', (name, expected) => {
  expect(downloadName('MI-14', 1, name)).toBe(expected)
})
