import { readConfig } from './config'
import { HistoryService } from './features/ledger/history.service'
import { LedgerService } from './features/ledger/ledger.service'
import { SheetsService } from './features/sheets/sheets.service'
import { VerificationService, type Finding } from './features/verification/verification.service'
import { createDataSource } from './platform/database'
import { openStorage } from './services'

/** Most faults of one part that are printed one by one. */
const PRINTED = 200

/** `npm run verify`: prints what is whole and what is wrong, and ends with 1 where anything is. */
async function main(): Promise<void> {
  const config = readConfig()
  const dataSource = await createDataSource(config.databaseUrl).initialize()
  try {
    const sheets = new SheetsService(dataSource, new LedgerService(dataSource))
    const history = new HistoryService(dataSource)
    const findings = await new VerificationService(dataSource, openStorage(config), sheets, history).verify()
    process.stdout.write(findings.map(toWords).join(''))
    if (findings.some(({ faults }) => faults.length > 0)) process.exitCode = 1
  } finally {
    await dataSource.destroy()
  }
}

function toWords({ part, seen, faults, notes }: Finding): string {
  const more = faults.length - PRINTED
  const lines = [
    `${part}: ${faults.length === 0 ? 'whole' : `${faults.length} wrong`} (${seen})`,
    ...faults.slice(0, PRINTED).map((fault) => `  wrong: ${fault}`),
    ...(more > 0 ? [`  … and ${more} more`] : []),
    ...notes.map((note) => `  note: ${note}`),
  ]
  return `${lines.join('\n')}\n`
}

main().catch((fault: unknown) => {
  process.stderr.write(
    `Nothing could be verified: ${fault instanceof Error ? fault.message : String(fault)}\n`,
  )
  process.exit(1)
})
