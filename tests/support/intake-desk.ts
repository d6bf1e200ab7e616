import { afterAll, beforeAll, beforeEach } from 'vitest'
import type { Intake, IntakePreview } from '@shared/api/intake'
import type { Mapping } from '@shared/intake/mapping'
import type { Agent } from './server'
import { LedgerDesk } from './ledger-desk'

/** Places on the desk's sheet, longitude and latitude: about (287 000, 5 282 000) and to the north-east of it. */
export const onSheet = [
  [-29.8391, 47.6516],
  [-29.8302, 47.6571],
  [-29.8217, 47.6649],
] as const

/** A GeoJSON feature; a point on the sheet unless given another geometry. */
export const feature = (
  properties: object | null,
  geometry: unknown = { type: 'Point', coordinates: onSheet[0] },
) => ({ type: 'Feature', properties, geometry })

/** A bedding attitude, strike and dip in two columns. */
export const bedding = (properties: object = {}, geometry?: unknown) =>
  feature({ type: 'bedding', strike: 310, dip: 40, station: 'K 7', ...properties }, geometry)

export const line = (coordinates: readonly unknown[] = onSheet) => ({ type: 'LineString', coordinates })

export const collection = (features: readonly object[], more: object = {}): string =>
  JSON.stringify({ type: 'FeatureCollection', ...more, features })

/** A KML document around placemarks. */
export const kml = (placemarks: string, before = ''): string =>
  `<?xml version="1.0" encoding="UTF-8"?>${before}<kml xmlns="http://www.opengis.net/kml/2.2"><Document>${placemarks}</Document></kml>`

/** A placemark with a point on the sheet. */
export const placemark = (data: Record<string, string>, coordinates: string = onSheet[0].join()): string =>
  `<Placemark><ExtendedData>${Object.entries(data)
    .map(([name, value]) => `<Data name="${name}"><value>${value}</value></Data>`)
    .join('')}</ExtendedData><Point><coordinates>${coordinates}</coordinates></Point></Placemark>`

/** The ledger desk with the intake counter beside it. */
export class IntakeDesk extends LedgerDesk {
  private get path(): string {
    return `/api/sheets/${this.sheet}/intakes`
  }

  /** Sends a file as the intake page does. */
  bring(content: string | Buffer, name = 'field.geojson', agent: Agent = this.compiler) {
    return agent.post(this.path).attach('file', Buffer.from(content), name)
  }

  /** Brings a file that has to be readable. */
  async brought(content: string | Buffer, name?: string): Promise<Intake> {
    const { status, body } = await this.bring(content, name)
    if (status !== 201) throw new Error(JSON.stringify(body))
    return body
  }

  async preview(intake: Intake, mapping: Mapping = intake.proposal): Promise<IntakePreview> {
    const { status, body } = await this.askPreview(intake, mapping)
    if (status !== 200) throw new Error(JSON.stringify(body))
    return body
  }

  askPreview(intake: Pick<Intake, 'id'>, mapping: unknown, agent: Agent = this.compiler) {
    return agent.post(`${this.path}/${intake.id}/preview`).send({ mapping })
  }

  takeIn(
    intake: Pick<Intake, 'id' | 'proposal'>,
    { mapping = intake.proposal, message = '', agent = this.compiler }: TakingIn = {},
  ) {
    return agent.post(`${this.path}/${intake.id}/items`).send({ mapping, message })
  }

  discard(intake: Pick<Intake, 'id'>, agent: Agent = this.compiler) {
    return agent.delete(`${this.path}/${intake.id}`)
  }

  async intakes(): Promise<Intake[]> {
    return (await this.compiler.get(this.path)).body
  }

  /** The original as it is downloaded. */
  async original(intake: Pick<Intake, 'id'>): Promise<Buffer> {
    const { body } = await this.compiler.get(`${this.path}/${intake.id}/file`).responseType('blob')
    return body
  }
}

interface TakingIn {
  mapping?: Mapping
  message?: string
  agent?: Agent
}

/** A desk that opens before the first test of a file and closes after the last. */
export function useIntakeDesk(): IntakeDesk {
  const desk = new IntakeDesk()
  beforeAll(() => desk.open())
  beforeEach(() => desk.takeNewSheet())
  afterAll(() => desk.server.close())
  return desk
}
