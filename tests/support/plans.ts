import type { DataSource, EntityManager } from 'typeorm'

/** One look of a statement at a table. */
export interface Scan {
  table: string
  /** The index that it went through; undefined where it read the whole table. */
  index: string | undefined
  /** Rows that it gave and rows that it threw away, over all its rounds. */
  rows: number
}

/** How PostgreSQL ran one statement. */
export interface Plan {
  sql: string
  scans(table: string): Scan[]
}

interface Node {
  'Node Type': string
  'Relation Name'?: string
  'Index Name'?: string
  'Actual Rows': number
  'Actual Loops': number
  'Rows Removed by Filter'?: number
  'Rows Removed by Index Recheck'?: number
  Plans?: Node[]
}

/** Runs something and gives the plan of every SELECT that it sent through the manager it was handed, in order. */
export async function plansOf(
  dataSource: DataSource,
  work: (em: EntityManager) => Promise<void>,
): Promise<Plan[]> {
  const sent: { sql: string; values: unknown[] }[] = []
  const query = async (sql: string, values: unknown[] = []): Promise<unknown> => {
    sent.push({ sql, values })
    return dataSource.query(sql, values)
  }
  await work({ query } as EntityManager) // Only raw queries are followed: there is nothing else in these modules.
  const plans: Plan[] = []
  for (const { sql, values } of sent.filter((each) => /^\s*(SELECT|WITH)/.test(each.sql))) {
    const [row] = await dataSource.query(`EXPLAIN (ANALYZE, FORMAT JSON) ${sql}`, values)
    const top: Node = row['QUERY PLAN'][0].Plan
    plans.push({ sql, scans: (table) => scansOf(top).filter((scan) => scan.table === table) })
  }
  return plans
}

function scansOf(node: Node): Scan[] {
  const inner = (node.Plans ?? []).flatMap(scansOf)
  const table = node['Relation Name']
  if (table === undefined) return inner
  const perLoop =
    node['Actual Rows'] + (node['Rows Removed by Filter'] ?? 0) + (node['Rows Removed by Index Recheck'] ?? 0)
  // A bitmap scan names its index below itself.
  const index = node['Index Name'] ?? node.Plans?.find((plan) => plan['Index Name'])?.['Index Name']
  return [{ table, index, rows: perLoop * node['Actual Loops'] }, ...inner]
}
