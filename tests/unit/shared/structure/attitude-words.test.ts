import { describe, expect, it } from 'vitest'
import { describeAttitude, formatAttitude } from '@shared/structure/attitude-words'
import type { Plane } from '@shared/structure/plane'

const plane = (strike: number | null, dip: number, overturned = false): Plane => ({ strike, dip, overturned })

describe('an attitude as the team writes it', () => {
  it('writes three figures for the azimuth and two for the dip', () => {
    expect(formatAttitude(plane(45, 40), 'strike-dip')).toBe('045/40')
    expect(formatAttitude(plane(45, 40), 'dip-direction-dip')).toBe('135/40')
    expect(formatAttitude(plane(270, 5), 'dip-direction-dip')).toBe('000/05')
    expect(formatAttitude(plane(5.25, 7.06), 'strike-dip')).toBe('005.3/07.1')
  })

  it('never writes 360 for north', () =>
    expect(formatAttitude(plane(359.97, 30), 'strike-dip')).toBe('000/30'))

  it('says overturned and horizontal in words', () => {
    expect(formatAttitude(plane(45, 40, true), 'strike-dip')).toBe('045/40 overturned')
    expect(formatAttitude(plane(null, 0), 'strike-dip')).toBe('horizontal')
  })
})

describe('an attitude in words', () => {
  it('says where it dips', () =>
    expect(describeAttitude(plane(45, 40))).toBe('Strikes 045°, dips 40° toward 135° (south-east)'))

  it('says what is special', () => {
    expect(describeAttitude(plane(200, 70, true))).toBe(
      'Strikes 200°, dips 70° toward 290° (west), overturned',
    )
    expect(describeAttitude(plane(200, 90))).toBe('Strikes 200°, vertical')
    expect(describeAttitude(plane(null, 0))).toBe('Horizontal')
  })

  it('names the nearest of eight compass points for every dip direction', () => {
    const names = ['north', 'north-east', 'east', 'south-east', 'south', 'south-west', 'west', 'north-west']
    for (let dipDirection = 0; dipDirection < 360; dipDirection++) {
      const nearest = names[Math.round(dipDirection / 45) % 8]
      expect(describeAttitude(plane((dipDirection + 270) % 360, 30))).toContain(`(${nearest})`)
    }
  })
})
