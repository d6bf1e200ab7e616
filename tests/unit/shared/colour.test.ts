import { describe, expect, it } from 'vitest'
import { greyOf, luminance, mixColours } from '@shared/colour'

describe('colours', () => {
  it('have the luminance that WCAG 2.2 weighs their channels with', () => {
    expect(luminance('#ffffff')).toBeCloseTo(1, 10)
    expect(luminance('#00ff00')).toBeCloseTo(0.7152, 10)
    expect(luminance('#000000')).toBe(0)
  })

  it('become greys of their lightness', () => {
    // 1.055 · 0.7152^(1/2.4) − 0.055 = 0.8625 of 255. Source: WCAG 2.2, worked out by hand.
    expect(greyOf('#00ff00')).toBe('#dcdcdc')
    expect(greyOf('#d2d2d2')).toBe('#d2d2d2')
    expect(greyOf('#000000')).toBe('#000000')
  })

  it('mix channel by channel', () => {
    expect(mixColours('#000000', '#ff8000', 0.25)).toBe('#bf6000')
  })
})
