/** A division of geologic time that a unit's age can name. */
export interface TimeDivision {
  name: string
  /** Age of its base, millions of years. Its top is the base of the next younger one. */
  baseMa: number
  /** Colour on the international chart, a hex triplet. */
  colour: `#${string}`
}

/** Periods, youngest first, and what stands for them below the Cambrian. Free text may be used beside them.
 *  Source: ICS International Chronostratigraphic Chart 2024-12 (Cohen, Harper, Gibbard, Car 2025; CC BY 4.0). */
export const timeDivisions: readonly TimeDivision[] = [
  { name: 'Quaternary', baseMa: 2.58, colour: '#f9f97f' },
  { name: 'Neogene', baseMa: 23.04, colour: '#ffe619' },
  { name: 'Paleogene', baseMa: 66, colour: '#fd9a52' },
  { name: 'Cretaceous', baseMa: 143.1, colour: '#7fc64e' },
  { name: 'Jurassic', baseMa: 201.4, colour: '#34b2c9' },
  { name: 'Triassic', baseMa: 251.902, colour: '#812b92' },
  { name: 'Permian', baseMa: 298.9, colour: '#f04028' },
  { name: 'Pennsylvanian', baseMa: 323.4, colour: '#7ebcc6' },
  { name: 'Carboniferous', baseMa: 358.86, colour: '#67a599' },
  { name: 'Mississippian', baseMa: 358.86, colour: '#678f66' },
  { name: 'Devonian', baseMa: 419.62, colour: '#cb8c37' },
  { name: 'Silurian', baseMa: 443.1, colour: '#b3e1b6' },
  { name: 'Ordovician', baseMa: 486.85, colour: '#009270' },
  { name: 'Cambrian', baseMa: 538.8, colour: '#7fa056' },
  { name: 'Ediacaran', baseMa: 635, colour: '#fed96a' },
  { name: 'Cryogenian', baseMa: 720, colour: '#fecc5c' },
  { name: 'Tonian', baseMa: 1000, colour: '#febf4e' },
  { name: 'Proterozoic', baseMa: 2500, colour: '#f73563' },
  { name: 'Archean', baseMa: 4031, colour: '#f0047f' },
  { name: 'Precambrian', baseMa: 4567, colour: '#f74370' },
]

/** The division that an age in words names: "Upper Devonian" and "Devonian and Silurian" give Devonian.
 *  Undefined where it names none. */
export function findTimeDivision(age: string): TimeDivision | undefined {
  const words = age.toLowerCase().split(/[^a-z]+/)
  const named = timeDivisions.filter((division) => words.includes(division.name.toLowerCase()))
  return named.sort((a, b) => words.indexOf(a.name.toLowerCase()) - words.indexOf(b.name.toLowerCase()))[0]
}
