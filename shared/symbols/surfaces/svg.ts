import type { Box } from '../../geometry/box'
import type { DisplayList, Path } from '../display-list'
import { replay, type Paint, type Surface, type TextRun, type Tiling } from '../interpreter'

/** A display list as the text of one SVG image, to be set inline or kept as a file. Its size is in true millimetres.
 *  @param box the part of the list's plane to show, millimetres, y up */
export function toSvg(list: DisplayList, box: Box): string {
  const surface = svgSurface()
  replay(list, surface, { scale: 1, x: -box.x, y: box.y + box.height, flipY: true })
  const [width, height] = [short(box.width), short(box.height)]
  return (
    `<svg xmlns="http://www.w3.org/2000/svg" width="${width}mm" height="${height}mm" ` +
    `viewBox="0 0 ${width} ${height}">${surface.parts.join('')}</svg>`
  )
}

/** A surface that writes SVG elements. */
function svgSurface(): Surface & { parts: string[] } {
  const parts: string[] = []
  const defined = new Set<string>()
  let clips = 0
  return {
    parts,
    path: (path, paint) => {
      parts.push(`<path d="${pathData(path)}" ${paintAttributes(paint)}/>`)
    },
    tile(path, tiling) {
      const id = `tile-${hash(tilingName(tiling))}`
      if (!defined.has(id)) parts.push(patternElement(id, tiling))
      defined.add(id)
      parts.push(`<path d="${pathData(path)}" fill="url(#${id})" fill-rule="evenodd"/>`)
    },
    text: (run) => {
      parts.push(textElement(run))
    },
    clip(path) {
      const data = pathData(path)
      // Several images stand in one page: the id follows from what it is, so that two that clash are also the same.
      const id = `clip-${hash(data)}`
      parts.push(`<clipPath id="${id}"><path d="${data}" clip-rule="evenodd"/></clipPath>`)
      parts.push(`<g clip-path="url(#${id})">`)
      clips++
    },
    group(name, draw) {
      const outer = clips
      clips = 0
      parts.push(`<g data-part="${escapeText(name)}">`)
      draw()
      parts.push('</g>'.repeat(clips + 1))
      clips = outer
    },
  }
}

/** A ten-thousandth of a millimetre is far finer than any print. */
const short = (value: number): string => String(Math.round(value * 10_000) / 10_000)

const letters = { move: 'M', line: 'L', curve: 'C', close: 'Z' } as const

/** Path data of an SVG path element. */
export const pathData = (path: Path): string =>
  path.map(([kind, ...numbers]) => letters[kind] + numbers.map(short).join(' ')).join('')

const paintAttributes = (paint: Paint): string =>
  paint.paint === 'stroke'
    ? `fill="none" stroke="${paint.colour}" stroke-width="${short(paint.width)}" ` +
      `stroke-linecap="${paint.cap}" stroke-linejoin="round"`
    : `fill="${paint.colour}" fill-rule="evenodd"` +
      (paint.opacity === 1 ? '' : ` fill-opacity="${short(paint.opacity)}"`)

/** A tiling's whole look in words: tilings of one name are drawn alike. */
const tilingName = ({ name, colour, width, height, x, y }: Tiling): string =>
  [name, colour, ...[width, height, x, y].map(short)].join(' ')

function patternElement(id: string, tiling: Tiling): string {
  const { x, y, width, height } = tiling
  const cell = svgSurface()
  tiling.draw(cell)
  const [left, top, wide, high] = [x, y, width, height].map(short)
  return (
    `<pattern id="${id}" patternUnits="userSpaceOnUse" x="${left}" y="${top}" width="${wide}" height="${high}">` +
    `${cell.parts.join('')}</pattern>`
  )
}

function textElement(run: TextRun): string {
  const turn = run.turn === 0 ? '' : ` transform="rotate(${short(run.turn)} ${short(run.x)} ${short(run.y)})"`
  const tracking = run.tracking === 0 ? '' : ` letter-spacing="${short(run.tracking)}"`
  const halo = run.halo
    ? ` stroke="${run.halo.colour}" stroke-width="${short(run.halo.width)}" stroke-linejoin="round" paint-order="stroke"`
    : ''
  return (
    `<text x="${short(run.x)}" y="${short(run.y)}" font-family="Lato, sans-serif" font-size="${short(run.size)}" ` +
    `font-weight="${run.weight}" fill="${run.colour}"${tracking}${halo}${turn}>${escapeText(run.text)}</text>`
  )
}

/** Text made safe for SVG, as content or attribute; control characters, which XML does not know, are left out. */
const escapeText = (text: string): string =>
  text
    .replace(/[\u0000-\u0008\u000b\u000c\u000e-\u001f\ufffe\uffff]/g, '')
    .replaceAll('&', '&amp;')
    .replaceAll('<', '&lt;')
    .replaceAll('>', '&gt;')
    .replaceAll('"', '&quot;')

/** A short name for a text: FNV-1a, 32 bits. Source: common practice. */
function hash(text: string): string {
  let value = 0x811c9dc5
  for (let index = 0; index < text.length; index++) {
    value = Math.imul(value ^ text.charCodeAt(index), 0x01000193)
  }
  return (value >>> 0).toString(36)
}
