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

/** Rakes of lines on planes, as printed. Source: Cardozo, Computational Geosciences, ch. 4, cited in orientation.md
 *  section 6; tolerance half a unit of the last printed digit. */
export const printedRakes: { plane: string; trend: number; plunge: number; rake: number }[] = [
  { plane: '120/40', trend: 265.8, plunge: 25.3, rake: 138.4 },
  { plane: '250/60', trend: 265.8, plunge: 25.3, rake: 29.5 },
  { plane: '300/50', trend: 74, plunge: 40.6, rake: 121.8 },
]

/** The same and others to more digits. Source: orientation.md section 6, computed there with numpy. */
export const computedRakes: { plane: string; trend: number; plunge: number; rake: number }[] = [
  { plane: '120/40', trend: 265.80098866, plunge: 25.250063787, rake: 138.42309611 },
  { plane: '250/60', trend: 265.80098866, plunge: 25.250063787, rake: 29.509003103 },
  { plane: '300/50', trend: 74, plunge: 40.605685085, rake: 121.829230204 },
  { plane: '000/60', trend: 16.102113752, plunge: 25.658906273, rake: 30 },
  { plane: '000/60', trend: 163.897886248, plunge: 25.658906273, rake: 150 },
  { plane: '245/35', trend: 335, plunge: 35, rake: 90 },
]

/** Angle between a line and a plane. Source: orientation.md section 8: line 030/20 to plane 120/40 is 60 exactly. */
export const lineToPlane = { trend: 30, plunge: 20, plane: '120/40', angle: 60 }

/** Lines and upward poles of planes as unit vectors east, north, up. Source: orientation.md section 2, computed there. */
export const lineVectors: { trend: number; plunge: number; vector: [number, number, number] }[] = [
  { trend: 30, plunge: 20, vector: [0.469846310393, 0.813797681349, -0.342020143326] },
  { trend: 135, plunge: 45, vector: [0.5, -0.5, -0.707106781187] },
  { trend: 312.5, plunge: 67.25, vector: [-0.285113227911, 0.261258138859, -0.92220097167] },
]
export const poleVectors: { strike: number; dip: number; vector: [number, number, number] }[] = [
  { strike: 45, dip: 30, vector: [0.353553390593, -0.353553390593, 0.866025403784] },
  { strike: 330, dip: 60, vector: [0.75, 0.433012701892, 0.5] },
  { strike: 200, dip: 5, vector: [-0.081899608319, 0.029809019626, 0.996194698092] },
]
