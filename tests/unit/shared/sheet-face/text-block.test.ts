import { expect, it } from 'vitest'
import { textWidth, wrapText, type TextStyle } from '@shared/sheet-face/text-block'

const style: TextStyle = { size: 3, weight: 400, ink: 'black', leading: 1.25 }
const sentence = 'Dark, fissile shale with thin limestone beds; well-bedded and fossiliferous near its base.'

it.each([12, 20, 35, 60, 200])(
  'breaks lines so that none is wider than %i mm, and loses no word',
  (width) => {
    const lines = wrapText(sentence, width, style)
    for (const line of lines) expect(textWidth(line, style)).toBeLessThanOrEqual(width)
    expect(lines.join('').replaceAll(' ', '')).toBe(sentence.replaceAll(' ', ''))
  },
)

it('breaks a word that is wider than the line rather than let it run out', () => {
  const lines = wrapText('a Llanfairpwllgwyngyllgogerychwyrndrobwll formation', 20, style)
  for (const line of lines) expect(textWidth(line, style)).toBeLessThanOrEqual(20)
  expect(lines.join('').replaceAll(' ', '')).toBe('aLlanfairpwllgwyngyllgogerychwyrndrobwllformation')
})

it('keeps line ends that the text has', () => {
  expect(wrapText('Geologic map of\nGannet Head', 200, style)).toEqual(['Geologic map of', 'Gannet Head'])
})
