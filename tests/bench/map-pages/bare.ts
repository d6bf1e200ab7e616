import Feature from 'ol/Feature'
import OlMap from 'ol/Map'
import View from 'ol/View'
import { easeOut } from 'ol/easing'
import LineString from 'ol/geom/LineString'
import Point from 'ol/geom/Point'
import VectorLayer from 'ol/layer/Vector'
import VectorSource from 'ol/source/Vector'
import Circle from 'ol/style/Circle'
import Stroke from 'ol/style/Stroke'
import Style from 'ol/style/Style'
import { pxPerMetreAt } from '@/map/view-frame'
import { aCrowdedSheet, crowdedItems } from '../../support/crowded-sheet'
import { journeys, measureFrames } from './measure'

const [lines = 0, attitudes = 0] = location.hash.slice(1).split('-').map(Number)
const sheet = aCrowdedSheet()
const items = crowdedItems(lines, attitudes)
const stroke = new Stroke({ color: '#1f1b16', width: 1 })
const style = new Style({ stroke, image: new Circle({ radius: 3, stroke }) })
const begin = performance.now()
const source = new VectorSource({
  features: items.flatMap((item) => {
    if (item.geometry === null) return []
    const geometry =
      item.geometry.type === 'Point'
        ? new Point(item.geometry.coordinates)
        : new LineString(item.geometry.coordinates)
    return [new Feature(geometry)]
  }),
})
const view = new View({ center: [289_000, 5_283_500], resolution: 1 / pxPerMetreAt(0.5, sheet.scale) })
const map = new OlMap({
  target: 'map',
  controls: [],
  layers: [new VectorLayer({ source, style })],
  view,
})
await new Promise<void>((resolve) => map.once('rendercomplete', () => resolve()))

const go = (center: number[], resolution: number): void => {
  view.cancelAnimations()
  view.animate({ center, resolution, duration: 160, easing: easeOut })
}
const at = (): { center: number[]; resolution: number } => ({
  center: view.getCenter() ?? [0, 0],
  resolution: view.getResolution() ?? 1,
})
const movable = {
  panBy(rightPx: number, downPx: number): void {
    const { center, resolution } = at()
    go([(center[0] ?? 0) + rightPx * resolution, (center[1] ?? 0) - downPx * resolution], resolution)
  },
  zoomBy: (factor: number): void => go(at().center, at().resolution / factor),
}
window.bench = {
  firstPicture: performance.now() - begin,
  run: (journey) => measureFrames(journeys(movable)[journey]),
  async show(percent) {
    const begin = performance.now()
    const whole = new Promise<void>((resolve) => map.once('rendercomplete', () => resolve()))
    view.setCenter([289_000, 5_283_500])
    view.setResolution(1 / pxPerMetreAt(percent / 100, sheet.scale))
    await whole
    return performance.now() - begin
  },
}
