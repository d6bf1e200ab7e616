import type { Crs } from '@shared/api/sheets'
import type { CrsRow } from './sheets.queries'

/** A system that sheets can be drawn in, or why it is none. */
export type UsableCrs = { outcome: 'crs'; crs: Crs } | { outcome: 'refused'; reason: string }

/** Reads a row of spatial_ref_sys: sheets are drawn in projected systems, in metres, with east and north axes. */
export function readCrs({ srid, srtext, proj4text }: CrsRow): UsableCrs {
  const name = /^PROJCS\["([^"]+)"/.exec(srtext)?.[1]
  const code = `EPSG:${srid}`
  if (!name) {
    return refuse(`${code} is not a projected system: a sheet is drawn in metres, for example in a UTM zone.`)
  }
  if (!/\+units=m(\s|$)/.test(proj4text)) {
    return refuse(`${name} (${code}) is not in metres: choose a projected system in metres.`)
  }
  if (/\+axis=/.test(proj4text)) {
    return refuse(`${name} (${code}) counts its axes otherwise than east and north: choose another system.`)
  }
  return { outcome: 'crs', crs: { srid, name, proj4: proj4text.trim() } }
}

const refuse = (reason: string): UsableCrs => ({ outcome: 'refused', reason })
