import Layer from 'ol/layer/Layer'
import type { FrameState } from 'ol/Map'
import ViewHint from 'ol/ViewHint'
import type { ViewFrame } from './view-frame'

/** A frame longer than this is felt when it comes sixty times a second, milliseconds. */
const SMOOTH_MS = 14

export interface PaintRequest {
  context: CanvasRenderingContext2D
  view: ViewFrame
  ratio: number
  /** False while the view is moving. */
  settle: boolean
}

/** A canvas of our own in an OpenLayers map. It is drawn again only when the view or its content changed. While the view
 *  moves and drawing is slow, the last picture is shifted and stretched instead, and drawn again when the view rests. */
export class SheetLayer extends Layer {
  private readonly canvas = document.createElement('canvas')
  private readonly context: CanvasRenderingContext2D
  private drawn: { key: string; view: ViewFrame; settled: boolean } | null = null
  private version = 0
  private costMs = 0

  constructor(private readonly paint: (request: PaintRequest) => void) {
    super({})
    const context = this.canvas.getContext('2d')
    if (!context) throw new TypeError('This browser has no 2D canvas.')
    this.context = context
    this.canvas.style.cssText = 'position:absolute;inset:0;transform-origin:0 0'
  }

  /** What is to be drawn has changed. */
  touch(): void {
    this.version += 1
    this.changed()
  }

  override render(frame: FrameState | null): HTMLElement {
    if (!frame) return this.canvas
    const view = viewOf(frame)
    const hints = [frame.viewHints[ViewHint.ANIMATING], frame.viewHints[ViewHint.INTERACTING]]
    const moving = hints.some((hint) => hint !== undefined && hint > 0)
    const key = [
      this.version,
      ...view.center,
      view.pxPerMetre,
      view.width,
      view.height,
      frame.pixelRatio,
    ].join(' ')
    if (this.drawn?.key === key && (this.drawn.settled || moving)) return this.canvas
    if (moving && this.drawn && this.costMs > SMOOTH_MS) this.shift(view, this.drawn.view)
    else this.draw(frame, view, { key, settle: !moving })
    return this.canvas
  }

  private draw(frame: FrameState, view: ViewFrame, { key, settle }: { key: string; settle: boolean }): void {
    const ratio = frame.pixelRatio
    const [width, height] = [Math.round(view.width * ratio), Math.round(view.height * ratio)]
    if (this.canvas.width !== width || this.canvas.height !== height) {
      this.canvas.width = width
      this.canvas.height = height
      this.canvas.style.width = `${view.width}px`
      this.canvas.style.height = `${view.height}px`
    }
    this.canvas.style.transform = ''
    const begin = performance.now()
    this.paint({ context: this.context, view, ratio, settle })
    this.costMs = performance.now() - begin
    this.drawn = { key, view, settled: settle }
  }

  private shift(view: ViewFrame, old: ViewFrame): void {
    const scale = view.pxPerMetre / old.pxPerMetre
    const x = view.width / 2 + (old.center[0] - view.center[0]) * view.pxPerMetre - (old.width / 2) * scale
    const y = view.height / 2 - (old.center[1] - view.center[1]) * view.pxPerMetre - (old.height / 2) * scale
    this.canvas.style.transform = `translate(${x}px, ${y}px) scale(${scale})`
  }
}

/** The frame that OpenLayers is about to show, in our words. */
export function viewOf(frame: FrameState): ViewFrame {
  const [width = 0, height = 0] = frame.size
  const [east = 0, north = 0] = frame.viewState.center
  return { center: [east, north], pxPerMetre: 1 / frame.viewState.resolution, width, height }
}
