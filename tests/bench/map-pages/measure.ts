/** What both pages can do: move their view as a person would, by animated steps. */
export interface Movable {
  panBy(rightPx: number, downPx: number): void
  zoomBy(factor: number): void
}

export interface Frames {
  /** Milliseconds from one frame to the next while the view moved. */
  moving: number[]
}

const STEP_MS = 170

/** Moves the view in steps and notes every frame's length.
 *  @param steps what to do, one after the other */
export async function measureFrames(steps: readonly (() => void)[]): Promise<Frames> {
  const moving: number[] = []
  let last = performance.now()
  let running = true
  const tick = (now: number): void => {
    moving.push(now - last)
    last = now
    if (running) requestAnimationFrame(tick)
  }
  requestAnimationFrame(tick)
  for (const step of steps) {
    step()
    await wait(STEP_MS)
  }
  running = false
  return { moving: moving.slice(1) }
}

export const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms))

/** A pan to and fro, and a zoom in and out, eight steps each. */
export const journeys = (map: Movable) => ({
  pan: [1, 1, 1, 1, -1, -1, -1, -1].map((way) => () => map.panBy(way * 90, way * 40)),
  zoom: [1.4, 1.4, 1.4, 1.4, 1 / 1.4, 1 / 1.4, 1 / 1.4, 1 / 1.4].map((factor) => () => map.zoomBy(factor)),
})

declare global {
  interface Window {
    /** What the bench asks the page to do. */
    bench: {
      /** Milliseconds until the first whole picture. */
      firstPicture: number
      run(journey: 'pan' | 'zoom'): Promise<Frames>
      /** Jumps to a scale; milliseconds until the picture is whole, every symbol drawn for it. */
      show(percent: number): Promise<number>
    }
  }
}
