/** A canvas context that lists what it is asked to draw, each with the settings that count for it. */
export function recordingContext(): { context: CanvasRenderingContext2D; calls: string[] } {
  const calls: string[] = []
  const note = (name: string, ...values: (string | number)[]) => void calls.push([name, ...values].join(' '))
  const settings = {
    strokeStyle: '',
    fillStyle: '',
    lineWidth: 1,
    lineCap: 'butt',
    lineJoin: 'miter',
    globalAlpha: 1,
    font: '',
    letterSpacing: '',
    textBaseline: '',
    textAlign: '',
  }
  const context = Object.assign(settings, {
    beginPath: () => note('beginPath'),
    moveTo: (x: number, y: number) => note('moveTo', x, y),
    lineTo: (x: number, y: number) => note('lineTo', x, y),
    bezierCurveTo: (...values: number[]) => note('bezierCurveTo', ...values),
    closePath: () => note('closePath'),
    stroke: () =>
      note('stroke', settings.strokeStyle, 'width', settings.lineWidth, settings.lineCap, settings.lineJoin),
    fill: (rule: string) => note('fill', settings.fillStyle, 'alpha', settings.globalAlpha, rule),
    clip: (rule: string) => note('clip', rule),
    save: () => note('save'),
    restore: () => note('restore'),
    translate: (x: number, y: number) => note('translate', x, y),
    rotate: (angle: number) => note('rotate', angle),
    strokeText: (text: string, x: number, y: number) =>
      note('strokeText', text, x, y, settings.font, settings.strokeStyle),
    fillText: (text: string, x: number, y: number) =>
      note('fillText', text, x, y, settings.font, settings.fillStyle),
  })
  // Only what the surface uses is there: anything else would fail the test loudly.
  return { context: context as unknown as CanvasRenderingContext2D, calls }
}
