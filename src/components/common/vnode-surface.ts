import { h, type VNode } from 'vue'
import type { Paint, Surface, TextRun, Tiling } from '@shared/symbols/interpreter'
import { pathData } from '@shared/symbols/surfaces/svg'

/** A surface that makes SVG elements as Vue nodes, so that a drawing needs no markup set as text.
 *  @param colourOf what a colour is shown as; itself for a true picture, `currentColor` for a plain one
 *  @param id a name that no other drawing of the page has: its tiles are called by it */
export function vnodeSurface(colourOf: (colour: string) => string, id: string): Surface & { nodes: VNode[] } {
  let tiles = 0
  const surface = {
    nodes: [] as VNode[],
    path: (path: Parameters<Surface['path']>[0], paint: Paint) => {
      surface.nodes.push(h('path', { d: pathData(path), ...paintAttributes(paint, colourOf) }))
    },
    tile: (path: Parameters<Surface['path']>[0], tiling: Tiling) => {
      const tile = `${id}-${tiles++}`
      surface.nodes.push(
        patternNode(tile, tiling, colourOf),
        h('path', { d: pathData(path), fill: `url(#${tile})`, 'fill-rule': 'evenodd' }),
      )
    },
    text: (run: TextRun) => {
      surface.nodes.push(h('text', textAttributes(run, colourOf), run.text))
    },
    /** Samples are cut by their own frame: a clip would need an id in the page. */
    clip: () => undefined,
    group: (_name: string, draw: () => void) => draw(),
  }
  return surface
}

function patternNode(id: string, tiling: Tiling, colourOf: (colour: string) => string): VNode {
  const { x, y, width, height } = tiling
  const cell = vnodeSurface(colourOf, id)
  tiling.draw(cell)
  return h('pattern', { id, patternUnits: 'userSpaceOnUse', x, y, width, height }, cell.nodes)
}

const paintAttributes = (paint: Paint, colourOf: (colour: string) => string) =>
  paint.paint === 'stroke'
    ? {
        fill: 'none',
        stroke: colourOf(paint.colour),
        'stroke-width': paint.width,
        'stroke-linecap': paint.cap,
        'stroke-linejoin': 'round',
      }
    : { fill: colourOf(paint.colour), 'fill-rule': 'evenodd', 'fill-opacity': paint.opacity }

const textAttributes = (run: TextRun, colourOf: (colour: string) => string) => ({
  x: run.x,
  y: run.y,
  'font-family': 'Lato, sans-serif',
  'font-size': run.size,
  'font-weight': run.weight,
  fill: colourOf(run.colour),
  ...(run.tracking ? { 'letter-spacing': run.tracking } : {}),
  ...(run.turn ? { transform: `rotate(${run.turn} ${run.x} ${run.y})` } : {}),
  ...(run.halo
    ? {
        stroke: run.halo.colour,
        'stroke-width': run.halo.width,
        'stroke-linejoin': 'round',
        'paint-order': 'stroke',
      }
    : {}),
})
