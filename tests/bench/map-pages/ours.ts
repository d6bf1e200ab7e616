import { sheetProjection } from '@shared/geometry/projection'
import { SheetMap } from '@/map/sheet-map'
import { aCrowdedSheet, crowdedItems } from '../../support/crowded-sheet'
import { journeys, measureFrames, wait } from './measure'

const nothing = (): void => undefined
const [lines = 0, attitudes = 0] = location.hash.slice(1).split('-').map(Number)
const sheet = aCrowdedSheet()
const items = crowdedItems(lines, attitudes)
const target = document.getElementById('map')
if (!target) throw new TypeError('The page has no place for the map.')
let frames = 0
const begin = performance.now()
const map = new SheetMap({
  target,
  sheet,
  projection: sheetProjection(sheet.crs.proj4),
  handlers: {
    move: nothing,
    click: nothing,
    doubleClick: nothing,
    press: () => false,
    drag: nothing,
    release: nothing,
    leave: nothing,
    frame: () => (frames += 1),
    rest: nothing,
  },
})
map.setItems(items)
map.showPage(false)
while (frames === 0) await wait(1)
await wait(0)
window.bench = {
  firstPicture: performance.now() - begin,
  run: (journey) => measureFrames(journeys(map)[journey]),
  async show(percent) {
    const begin = performance.now()
    map.showPlace([289_000, 5_283_500], percent)
    do await wait(4)
    while (target.querySelector('[data-picture=drawing]'))
    return performance.now() - begin
  },
}
