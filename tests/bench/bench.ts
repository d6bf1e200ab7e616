import { mkdirSync, writeFileSync } from 'node:fs'
import { cpus } from 'node:os'
import { startThrowAwayCluster } from '../../server/scripts/lib/throw-away.mjs'
import type { BenchRow } from './measure'
import { ledgerRows } from './rows/ledger'
import { mapRows } from './rows/map'

/** `npm run bench`: measures each row against its reference in one run, prints one table and writes it as JSON. It judges
 *  nothing: the ratio stands beside its target. */
const rooms: readonly (() => Promise<BenchRow[]>)[] = [ledgerRows, mapRows]

const FOLDER = 'coverage'

async function main(): Promise<void> {
  const cluster = await startThrowAwayCluster()
  process.env['SHEETWRIGHT_TEST_DATABASE_URL'] = cluster.superuserUrl
  try {
    const rows: BenchRow[] = []
    for (const room of rooms) rows.push(...(await room()))
    console.table(rows.map(toLine))
    mkdirSync(FOLDER, { recursive: true })
    const machine = { processors: cpus().length, model: cpus()[0]?.model, node: process.version }
    writeFileSync(`${FOLDER}/bench.json`, `${JSON.stringify({ machine, rows }, null, 2)}\n`)
    console.log(`Written to ${FOLDER}/bench.json; medians in milliseconds, least and most beside them.`)
  } finally {
    await cluster.stop()
  }
}

const round = (value: number): number => Math.round(value * 100) / 100
const told = ({ least, median, most }: BenchRow['oursMs']): string =>
  `${round(median)} (${round(least)}–${round(most)})`

const toLine = ({ what, reference, oursMs, referenceMs, ratio, target }: BenchRow) => ({
  what,
  reference,
  'ours, ms': told(oursMs),
  'reference, ms': told(referenceMs),
  ratio: round(ratio),
  target: `≤ ${target}`,
})

main().catch((fault: unknown) => {
  console.error(fault)
  process.exitCode = 1
})
