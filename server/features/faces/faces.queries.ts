import type { EntityManager } from 'typeorm'
import type { Face } from '@shared/api/faces'
import type { XY } from '@shared/units'

/** How a sheet's stored faces stand to its linework. */
export interface BuildState {
  revision: number
  /** Latest revision that changed linework or unit labels. */
  lineworkRevision: number
  /** Revision that the stored faces were built from; null if they never were. */
  builtFrom: number | null
}

export async function getBuildState(em: EntityManager, sheetId: string): Promise<BuildState> {
  const [row] = await em.query<BuildState[]>(
    `SELECT sheet.revision, sheet.linework_revision AS "lineworkRevision", face_build.revision AS "builtFrom"
     FROM sheet LEFT JOIN face_build ON face_build.sheet_id = sheet.id WHERE sheet.id = $1`,
    [sheetId],
  )
  if (!row) throw new RangeError(`There is no sheet ${sheetId}.`)
  return row
}

/** Waits until nobody else builds this sheet's faces, and keeps others out until the transaction ends. */
export async function lockBuilding(em: EntityManager, sheetId: string): Promise<void> {
  await em.query(`SELECT pg_advisory_xact_lock(hashtextextended('faces ' || $1, 0))`, [sheetId])
}

/** Builds the faces of a sheet at a revision into the temporary table built_face (unit_id, outline), which lasts until the
 *  transaction ends. The neatline and every contact and fault that is not concealed are noded on the 1 mm grid, so that
 *  a line whose snapped end lies on another meets it; what polygons they close inside the neatline are the faces. Lines
 *  that end in the open bound nothing and disturb nothing. */
export async function buildFaces(em: EntityManager, sheetId: string, revision: number): Promise<void> {
  await em.query(
    `CREATE TEMPORARY TABLE built_face ON COMMIT DROP AS
     WITH linework AS (
       SELECT geometry FROM item_version
       WHERE sheet_id = $1 AND since <= $2 AND (until IS NULL OR until > $2)
         AND kind IN ('contact', 'fault') AND properties->>'locationConfidence' <> 'concealed'
       UNION ALL
       SELECT ST_Boundary(neatline) FROM sheet WHERE id = $1
     ),
     closed AS (
       SELECT (ST_Dump(ST_Polygonize(ARRAY[ST_UnaryUnion(ST_Collect(geometry), 0.001)]))).geom AS outline FROM linework
     )
     SELECT row_number() OVER ()::integer AS number, NULL::uuid AS unit_id, outline
     FROM closed JOIN sheet ON sheet.id = $1
     WHERE ST_Contains(sheet.neatline, ST_PointOnSurface(outline))`,
    [sheetId, revision],
  )
  await em.query('CREATE INDEX ON built_face USING gist (outline)')
  await em.query('ANALYZE built_face')
  await assignUnits(em, sheetId, revision)
}

/** A face is the unit that the labels in it name, if they agree. */
async function assignUnits(em: EntityManager, sheetId: string, revision: number): Promise<void> {
  await em.query(
    `UPDATE built_face SET unit_id = labelled.unit_id
     FROM (
       SELECT built_face.number, min(label.properties->>'unit')::uuid AS unit_id
       FROM item_version AS label JOIN built_face ON ST_Contains(built_face.outline, label.geometry)
       WHERE label.sheet_id = $1 AND label.kind = 'unit-label'
         AND label.since <= $2 AND (label.until IS NULL OR label.until > $2)
       GROUP BY built_face.number
       HAVING count(DISTINCT label.properties->>'unit') = 1
     ) AS labelled
     WHERE labelled.number = built_face.number`,
    [sheetId, revision],
  )
}

/** Puts the built faces in the place of the stored ones. */
export async function storeBuiltFaces(em: EntityManager, sheetId: string, revision: number): Promise<void> {
  await em.query('DELETE FROM face WHERE sheet_id = $1', [sheetId])
  await em.query(
    'INSERT INTO face (sheet_id, unit_id, outline) SELECT $1, unit_id, outline FROM built_face ORDER BY number',
    [sheetId],
  )
  await em.query(
    `INSERT INTO face_build (sheet_id, revision) VALUES ($1, $2)
     ON CONFLICT (sheet_id) DO UPDATE SET revision = excluded.revision`,
    [sheetId, revision],
  )
}

interface FaceRecord {
  unit: string | null
  outline: string
}

/** Largest first, so that whoever draws them in order covers none with another. */
const inOrder = 'ORDER BY ST_Area(outline) DESC, ST_AsBinary(outline)'

export async function selectStoredFaces(em: EntityManager, sheetId: string): Promise<Face[]> {
  const rows = await em.query<FaceRecord[]>(
    `SELECT unit_id AS unit, ST_AsGeoJSON(outline, 3, 0) AS outline FROM face WHERE sheet_id = $1 ${inOrder}`,
    [sheetId],
  )
  return rows.map(toFace)
}

export async function selectBuiltFaces(em: EntityManager): Promise<Face[]> {
  const rows = await em.query<FaceRecord[]>(
    `SELECT unit_id AS unit, ST_AsGeoJSON(outline, 3, 0) AS outline FROM built_face ${inOrder}`,
  )
  return rows.map(toFace)
}

function toFace({ unit, outline }: FaceRecord): Face {
  const polygon: { coordinates: XY[][] } = JSON.parse(outline)
  return { unit, rings: polygon.coordinates }
}
