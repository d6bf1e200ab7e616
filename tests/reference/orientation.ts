/** Conversions of quadrant notation to the right-hand rule.
 *  Source: reference/orientation.md section 1, computed there from the rule dip direction = strike + 90. */
export const quadrantConversions: [text: string, strike: number, dip: number, dipDirection: number][] = [
  ['N45E, 30SE', 45, 30, 135],
  ['N45E, 30NW', 225, 30, 315],
  ['N30W, 60SW', 150, 60, 240],
  ['N30W, 60NE', 330, 60, 60],
  ['N80E, 25N', 260, 25, 350],
  ['S20W, 40NW', 200, 40, 290],
  ['due E–W, 20S', 90, 20, 180],
  ['due N–S, 50W', 180, 50, 270],
]

/** The same, from field practice. Source: reference/needs.md A.2. */
export const fieldConversions: [text: string, strike: number, dip: number, dipDirection: number][] = [
  ['N30E,40SE', 30, 40, 120],
  ['N30E,40NW', 210, 40, 300],
  ['N30W,40SW', 150, 40, 240],
  ['N30W,40NE', 330, 40, 60],
  ['E–W,20N', 270, 20, 0],
]

/** Readings whose dip letter lies along the strike. Source: orientation.md section 1; needs.md A.2. */
export const alongStrike = ['N45E, 30NE', 'N30E,40NE']

/** Dips above 90 by the right-hand rule, and the same plane written as overturned.
 *  Source: orientation.md section 1; `facing` is its facing vector east, north, up. */
export const overturnedByDip: {
  text: string
  strike: number
  dip: number
  same: string
  facing?: [number, number, number]
}[] = [
  {
    text: '030/110',
    strike: 30,
    dip: 110,
    same: '210/70 overturned',
    facing: [0.813797681, -0.46984631, -0.342020143],
  },
  { text: '200/150', strike: 200, dip: 150, same: '020/30 overturned' },
]
