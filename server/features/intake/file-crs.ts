import type { EntityManager } from 'typeorm'
import { sheetProjection } from '@shared/geometry/projection'
import { findProj4 } from './intake.queries'
import type { FileCrs } from './readers/read-outcome'

/** Datum shifts that need a grid file: reading such coordinates without it would move them by up to 200 m unseen. */
const needsGrid = /\+nadgrids=(?!@null)|\+datum=NAD27/i

/** The definition of a system that a file names, or why it cannot be used. */
export async function resolveFileCrs(
  em: EntityManager,
  srid: number,
): Promise<{ outcome: 'crs'; crs: FileCrs } | { outcome: 'refused'; reason: string }> {
  const ask = 'Save the file in longitude and latitude (WGS 84).'
  const proj4 = await findProj4(em, srid)
  if (proj4 === undefined || proj4 === '') {
    return {
      outcome: 'refused',
      reason: `The file names the coordinate system EPSG:${srid}, which is not known here. ${ask}`,
    }
  }
  if (needsGrid.test(proj4)) {
    return {
      outcome: 'refused',
      reason: `EPSG:${srid}, which the file names, needs a datum shift grid that is not kept here. ${ask}`,
    }
  }
  if (/\+axis=/.test(proj4) || !isSupported(proj4)) {
    return {
      outcome: 'refused',
      reason: `EPSG:${srid}, which the file names, cannot be converted here. ${ask}`,
    }
  }
  return { outcome: 'crs', crs: { srid, proj4 } }
}

/** proj4 throws at projection methods that it does not know. */
function isSupported(proj4: string): boolean {
  try {
    sheetProjection(proj4).toLonLat([0, 0])
    return true
  } catch {
    return false
  }
}
