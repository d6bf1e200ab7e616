// npm test: set-up, checks, build, and every test against a throw-away PostgreSQL cluster and Debian's Chromium.
import { mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { startCluster } from '../server/scripts/lib/cluster.mjs'
import { ensurePostgres, ensurePrograms } from '../server/scripts/lib/debian.mjs'
import { main, run, say, show } from '../server/scripts/lib/say.mjs'
import { ensureClient, ensurePackages, projectFolder } from '../server/scripts/lib/stamps.mjs'

const vitestArguments = process.argv.slice(2)

await main(async () => {
  ensurePackages()
  const programs = ensurePostgres()
  ensurePrograms({ chromium: 'chromium', pdfinfo: 'poppler-utils' })
  const folder = mkdtempSync(join(tmpdir(), 'sheetwright-test-'))
  // PostgreSQL's own user has to get in.
  run('chmod', ['755', folder])
  say('Starting a throw-away database')
  const cluster = await startCluster({ programs, dataFolder: folder, durable: false })
  for (const signal of ['SIGINT', 'SIGTERM']) process.on(signal, () => {})
  try {
    const checks = await runChecks()
    const tests = await runTests(cluster, join(folder, 'report.json'))
    const failed = checks.failed + tests.failed
    for (const name of checks.names) console.log(`${name} failed: see above`)
    console.log(`${checks.passed + tests.passed} passed, ${failed} failed`)
    return failed === 0 ? 0 : 1
  } finally {
    cluster.stop('immediate')
    rmSync(folder, { recursive: true, force: true })
  }
})

/** Lint, format, types and build, all of them even if one fails. */
async function runChecks() {
  const steps = [
    ['lint', () => show('npm', ['run', '--silent', 'lint'], { cwd: projectFolder })],
    ['format', () => show('npm', ['run', '--silent', 'format:check'], { cwd: projectFolder })],
    ['types', () => show('npm', ['run', '--silent', 'typecheck'], { cwd: projectFolder })],
    ['build', async () => buildClient()],
  ]
  const names = []
  for (const [name, step] of steps) {
    say(`Checking ${name}`)
    if ((await step()) !== 0) names.push(name)
  }
  return { passed: steps.length - names.length, failed: names.length, names }
}

function buildClient() {
  try {
    ensureClient()
    return 0
  } catch (error) {
    console.error(error.message)
    return 1
  }
}

async function runTests(cluster, report) {
  say('Running the tests')
  const args = [
    join(projectFolder, 'node_modules/vitest/vitest.mjs'),
    'run',
    '--reporter=default',
    '--reporter=json',
  ]
  const code = await show(process.execPath, [...args, `--outputFile.json=${report}`, ...vitestArguments], {
    cwd: projectFolder,
    env: { ...process.env, SHEETWRIGHT_TEST_DATABASE_URL: cluster.url('postgres') },
  })
  try {
    const { numPassedTests, numFailedTests, numPendingTests, numTodoTests } = JSON.parse(
      readFileSync(report, 'utf8'),
    )
    // A test that did not run is not a test that passed; nor is a file that broke before its tests began.
    const failed = numFailedTests + numPendingTests + numTodoTests
    return { passed: numPassedTests, failed: failed === 0 && code !== 0 ? 1 : failed }
  } catch {
    return { passed: 0, failed: 1 }
  }
}
