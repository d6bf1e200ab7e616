import Layer from 'ol/layer/Layer'
import type { FrameState } from 'ol/Map'
import ViewHint from 'ol/ViewHint'
import type { ViewFrame } from './view-frame'

/** How long drawing may take of one frame: while the view moves; at rest; and for a change of content, as long as lets most
 *  sheets show it in the same frame. Milliseconds. */
const BUDGET_MS = { moving: 10, resting: 24, changed: 120 } as const
/** A picture that takes no longer than this is drawn anew in every frame, milliseconds. */
const QUICK_MS = 8
/** A picture that takes longer waits until the view has rested for a moment: the wheel turns by notches. */
const QUIET_MS = 70
/** A shifted picture is drawn anew, view moving or not, once it leaves this share of the view bare, or is stretched or shrunk
 *  by this factor. */
const MOST_BARE = 0.15
const MOST_STRETCH = 1.6

export interface PaintRequest {
  context: CanvasRenderingContext2D
  view: ViewFrame
  ratio: number
  /** False while the view is moving, and for the first picture. */
  settle: boolean
  /** Nothing is shown yet: what takes long may be drawn plainly. */
  isFirst: boolean
}

/** Draws a picture, pausing now and then. */
export type Painter = (request: PaintRequest) => Iterator<unknown>

/** What a canvas shows. */
interface Picture {
  key: string
  version: number
  view: ViewFrame
  settled: boolean
}

/** A picture of our own in an OpenLayers map. It is drawn on a hidden canvas, a little in each frame, and shown when it is
 *  whole; until then the last one is shifted and stretched to where the view has moved. A small sheet is whole at once. */
export class SheetLayer extends Layer {
  /** What the picture stands in, to be styled as a whole. */
  readonly box = document.createElement('div')
  private front = openCanvas()
  private back = openCanvas()
  private shown: Picture | null = null
  private job: { picture: Picture; steps: Iterator<unknown>; spentMs: number } | null = null
  private version = 0
  private costMs = 0
  private movedAt = 0

  constructor(private readonly paint: Painter) {
    super({})
    this.box.style.cssText = 'position:absolute;inset:0;overflow:hidden'
    this.box.append(this.front.canvas, this.back.canvas)
    this.back.canvas.style.visibility = 'hidden'
  }

  /** What is to be drawn has changed. */
  touch(): void {
    this.version += 1
    this.changed()
  }

  override render(frame: FrameState | null): HTMLElement {
    if (!frame) return this.box
    const wanted = this.pictureOf(frame)
    if (!wanted.settled) this.movedAt = performance.now()
    const isShown = this.isShown(wanted)
    if (isShown) this.job = null
    else if (this.mayDraw(wanted)) this.draw(wanted, frame.pixelRatio)
    if (this.shown) place(this.front.canvas, wanted.view, this.shown.view)
    const isWaiting = !this.isShown(wanted)
    // For tests and benches: whether the picture is the one of this view, whole and settled.
    this.box.dataset['picture'] = isWaiting ? 'drawing' : 'drawn'
    if (isWaiting && wanted.settled) requestAnimationFrame(() => this.changed())
    return this.box
  }

  private pictureOf(frame: FrameState): Picture {
    const view = viewOf(frame)
    const hints = [frame.viewHints[ViewHint.ANIMATING], frame.viewHints[ViewHint.INTERACTING]]
    const { version } = this
    const key = [version, ...view.center, view.pxPerMetre, view.width, view.height, frame.pixelRatio].join(
      ' ',
    )
    return { key, version, view, settled: !hints.some((hint) => hint !== undefined && hint > 0) }
  }

  private isShown({ key, settled }: Picture): boolean {
    return this.shown?.key === key && (this.shown.settled || !settled)
  }

  /** A changed content is drawn at once. For another view a picture that takes long waits until the view rests: while it
   *  moves, the last one is shifted. */
  private mayDraw(wanted: Picture): boolean {
    if (this.shown?.version !== wanted.version || this.costMs <= QUICK_MS) return true
    if (wanted.settled) return performance.now() - this.movedAt > QUIET_MS
    return this.job !== null || strays(this.shown.view, wanted.view)
  }

  /** Goes on with the picture that is in the making, or begins it. While the view moves on, a picture is finished for where
   *  it was begun. */
  private draw(wanted: Picture, ratio: number): void {
    const current = this.job?.picture
    const isOther = current?.key !== wanted.key || current.settled !== wanted.settled
    if (current?.version !== wanted.version || (wanted.settled && isOther)) this.begin(wanted, ratio)
    const isChanged = this.shown?.version !== wanted.version
    this.work(BUDGET_MS[isChanged ? 'changed' : wanted.settled ? 'resting' : 'moving'])
  }

  private begin(wanted: Picture, ratio: number): void {
    // The first picture of all is drawn from what is ready, so that there is something to see at once.
    const isFirst = this.shown === null
    const picture = { ...wanted, settled: wanted.settled && !isFirst }
    const { canvas, context } = this.back
    const { view } = picture
    // Setting the size also clears the canvas and whatever an unfinished picture had set.
    canvas.width = Math.round(view.width * ratio)
    canvas.height = Math.round(view.height * ratio)
    canvas.style.width = `${view.width}px`
    canvas.style.height = `${view.height}px`
    this.job = {
      picture,
      steps: this.paint({ context, view, ratio, settle: picture.settled, isFirst }),
      spentMs: 0,
    }
  }

  private work(budgetMs: number): void {
    if (!this.job) return
    const { picture, steps } = this.job
    const begin = performance.now()
    const until = this.shown ? begin + budgetMs : Infinity
    let isWhole = false
    while (!isWhole && performance.now() < until) isWhole = steps.next().done === true
    this.job.spentMs += performance.now() - begin
    if (isWhole) this.show(picture, this.job.spentMs)
  }

  private show(picture: Picture, costMs: number): void {
    ;[this.front, this.back] = [this.back, this.front]
    this.front.canvas.style.visibility = ''
    this.back.canvas.style.visibility = 'hidden'
    this.shown = picture
    this.costMs = costMs
    this.job = null
  }
}

function openCanvas(): { canvas: HTMLCanvasElement; context: CanvasRenderingContext2D } {
  const canvas = document.createElement('canvas')
  const context = canvas.getContext('2d')
  if (!context) throw new TypeError('This browser has no 2D canvas.')
  canvas.style.cssText = 'position:absolute;inset:0;transform-origin:0 0'
  return { canvas, context }
}

/** Whether a picture of one view shows too little, or too coarsely, in another. */
function strays(drawn: ViewFrame, view: ViewFrame): boolean {
  const stretch = view.pxPerMetre / drawn.pxPerMetre
  if (stretch > MOST_STRETCH || stretch < 1 / MOST_STRETCH) return true
  const bareX =
    Math.abs(view.center[0] - drawn.center[0]) * view.pxPerMetre + (view.width * (1 - stretch)) / 2
  const bareY =
    Math.abs(view.center[1] - drawn.center[1]) * view.pxPerMetre + (view.height * (1 - stretch)) / 2
  return bareX > view.width * MOST_BARE || bareY > view.height * MOST_BARE
}

/** Shifts and stretches a picture of one view to lie where its ground is in another. */
function place(canvas: HTMLCanvasElement, view: ViewFrame, drawn: ViewFrame): void {
  const scale = view.pxPerMetre / drawn.pxPerMetre
  const x = view.width / 2 + (drawn.center[0] - view.center[0]) * view.pxPerMetre - (drawn.width / 2) * scale
  const y =
    view.height / 2 - (drawn.center[1] - view.center[1]) * view.pxPerMetre - (drawn.height / 2) * scale
  const isSame = scale === 1 && x === 0 && y === 0
  canvas.style.transform = isSame ? '' : `translate(${x}px, ${y}px) scale(${scale})`
}

/** The frame that OpenLayers is about to show, in our words. */
export function viewOf(frame: FrameState): ViewFrame {
  const [width = 0, height = 0] = frame.size
  const [east = 0, north = 0] = frame.viewState.center
  return { center: [east, north], pxPerMetre: 1 / frame.viewState.resolution, width, height }
}
