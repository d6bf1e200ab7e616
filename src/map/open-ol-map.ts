import OlMap from 'ol/Map'
import View from 'ol/View'
import { defaults as defaultInteractions } from 'ol/interaction/defaults'
import MouseWheelZoom from 'ol/interaction/MouseWheelZoom'
import type { Sheet } from '@shared/api/sheets'
import type { Metres, XY } from '@shared/units'
import { viewProjection } from './projection'
import type { SheetLayer } from './sheet-layer'
import { pxPerMetreAt } from './view-frame'
import { ANIMATION_MS, reducesMotion } from './view-moves'

/** Farthest zoom in, as a share of print size. */
const MOST_SHARE = 16
/** Zoom of one notch of the wheel, powers of two. */
const WHEEL_LEVELS = 0.5

/** A bare OpenLayers map of a sheet: our layers, north up, wheel and drag, no controls. */
export const openOlMap = (
  target: HTMLElement,
  sheet: Sheet,
  layers: SheetLayer[],
  { center, farthest }: { center: XY; farthest: Metres },
): OlMap =>
  new OlMap({
    target,
    controls: [],
    interactions: defaultInteractions({
      altShiftDragRotate: false,
      pinchRotate: false,
      doubleClickZoom: false,
      shiftDragZoom: false,
      keyboard: false,
      mouseWheelZoom: false,
    }).extend([new MouseWheelZoom({ maxDelta: WHEEL_LEVELS, duration: reducesMotion() ? 0 : ANIMATION_MS })]),
    layers,
    view: new View({
      projection: viewProjection(sheet.crs),
      center,
      resolution: 10,
      minResolution: 1 / pxPerMetreAt(MOST_SHARE, sheet.scale),
      maxResolution: farthest,
      enableRotation: false,
      constrainResolution: false,
      showFullExtent: true,
    }),
  })
