import type { DataSource, EntityManager } from 'typeorm'
import type { Comparison, NamedState } from '@shared/api/comparisons'
import { editedId } from '@shared/changes/change-set'
import {
  differenceFeatures,
  differenceHead,
  differenceRows,
  toDifference,
  type Difference,
} from '@shared/changes/differences'
import { sheetProjection } from '@shared/geometry/projection'
import { CSV_MARK, csvLine } from '@shared/tables/csv'
import type { LonLat, XY } from '@shared/units'
import type { EditionsService } from '../editions/editions.service'
import { countEdits, selectEdits, selectEditsOf, selectTouchedIds, type Span } from './comparison.queries'
import { invalidField, requireReached } from './ledger-rules'
import { getLedgerSheet, latestRevision } from './ledger.queries'

/** States as a call names them: a revision's number, `edition-2` or `latest`. */
export interface States {
  from: string
  to: string
}

/** Items read at a time for an export. */
const BATCH = 500
/** Eight decimals of a degree are about a millimetre, as fine as the sheet's own grid. */
const DECIMALS = 1e8

/** Lays two states of a sheet over each other. Versions never change once written, so every page and every export of the
 *  same two revisions agree, however long they take. */
export class ComparisonService {
  constructor(
    private readonly dataSource: DataSource,
    private readonly editions: EditionsService,
  ) {}

  /** A page of what differs, by item id; the first page counts the whole. */
  async compare(
    sheetId: string,
    states: States,
    { after, limit }: { after?: string | undefined; limit: number },
  ): Promise<Comparison> {
    const em = this.dataSource.manager
    const { from, to, span } = await this.resolve(em, sheetId, states)
    const edits = await selectEdits(em, span, { after, limit })
    const last = edits.length === limit ? edits.at(-1) : undefined
    return {
      from,
      to,
      counts: after === undefined ? await countEdits(em, span) : null,
      differences: edits.map(toDifference),
      next: last ? editedId(last) : null,
    }
  }

  /** The comparison as CSV, in parts. */
  async table(sheetId: string, states: States): Promise<AsyncIterable<string>> {
    const { span } = await this.resolve(this.dataSource.manager, sheetId, states)
    return this.toTable(span)
  }

  /** The comparison as GeoJSON, in parts. */
  async map(sheetId: string, states: States): Promise<AsyncIterable<string>> {
    const em = this.dataSource.manager
    const { from, to, span } = await this.resolve(em, sheetId, states)
    const { number, proj4 } = await getLedgerSheet(em, sheetId)
    const { toLonLat } = sheetProjection(proj4)
    const place = (xy: XY): LonLat => {
      const [lon, lat] = toLonLat(xy)
      return [Math.round(lon * DECIMALS) / DECIMALS, Math.round(lat * DECIMALS) / DECIMALS]
    }
    const head = JSON.stringify({ type: 'FeatureCollection', sheet: number, from, to }).slice(0, -1)
    return this.toMap(span, head, place)
  }

  private async *toTable(span: Span): AsyncGenerator<string> {
    yield CSV_MARK + csvLine(differenceHead)
    for await (const differences of this.batches(span)) {
      yield differences.flatMap(differenceRows).map(csvLine).join('')
    }
  }

  private async *toMap(span: Span, head: string, place: (xy: XY) => LonLat): AsyncGenerator<string> {
    yield `${head},"features":[`
    let before = '\n'
    for await (const differences of this.batches(span)) {
      const features = differences.flatMap((difference) => differenceFeatures(difference, place))
      if (features.length === 0) continue
      yield before + features.map((feature) => JSON.stringify(feature)).join(',\n')
      before = ',\n'
    }
    yield '\n]}\n'
  }

  private async *batches(span: Span): AsyncGenerator<Difference[]> {
    const em = this.dataSource.manager
    const ids = await selectTouchedIds(em, span)
    for (let start = 0; start < ids.length; start += BATCH) {
      yield (await selectEditsOf(em, span, ids.slice(start, start + BATCH))).map(toDifference)
    }
  }

  private async resolve(
    em: EntityManager,
    sheetId: string,
    states: States,
  ): Promise<{ from: NamedState; to: NamedState; span: Span }> {
    const from = await this.findState(em, sheetId, 'from', states.from)
    const to = await this.findState(em, sheetId, 'to', states.to)
    return { from, to, span: { sheetId, from: from.revision, to: to.revision } }
  }

  private async findState(
    em: EntityManager,
    sheetId: string,
    field: string,
    state: string,
  ): Promise<NamedState> {
    const latest = await latestRevision(em, sheetId)
    if (state === 'latest') return { revision: latest, edition: null }
    if (state.startsWith('edition-')) {
      const edition = Number(state.slice('edition-'.length))
      const revision = await this.editions.findRevision(em, sheetId, edition)
      if (revision === undefined) throw invalidField(field, `This sheet has no released edition ${edition}.`)
      return { revision, edition }
    }
    requireReached(Number(state), latest, field)
    return { revision: Number(state), edition: null }
  }
}
