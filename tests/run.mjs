import { existsSync, mkdtempSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { ensureClient } from '../server/scripts/lib/client-build.mjs'
import { installPackages } from '../server/scripts/lib/debian.mjs'
import { ensurePackages } from '../server/scripts/lib/npm-packages.mjs'
import { projectFolder } from '../server/scripts/lib/project.mjs'
import { canRun, run } from '../server/scripts/lib/run.mjs'
import { fail, say, Stop } from '../server/scripts/lib/say.mjs'
import { startThrowAwayCluster } from '../server/scripts/lib/throw-away.mjs'

/** Programs that the tests call, and Debian's packages that hold them. */
const PROGRAMS = {
  chromium: 'chromium',
  pdfinfo: 'poppler-utils',
  pdffonts: 'poppler-utils',
  pdftoppm: 'poppler-utils',
  gdalinfo: 'gdal-bin',
  gdallocationinfo: 'gdal-bin',
  ogrinfo: 'gdal-bin',
  pdftocairo: 'poppler-utils',
}

/** Asked to stop, we end the program that runs, and clean up. */
const interrupted = new AbortController()
for (const signal of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(signal, () => interrupted.abort())
const { signal } = interrupted

/** `npm test`: sets up what is missing, checks, builds, runs every test, and ends with one line that counts them. */
async function main() {
  await ensurePackages()
  await ensurePrograms()
  const checks = [
    await check('lint', ['run', 'lint']),
    await check('format', ['run', 'format:check']),
    await check('types', ['run', 'typecheck']),
    await check('build', undefined),
  ]
  const tests = await runTests(process.argv.slice(2))
  const failedChecks = checks.filter(({ passed }) => !passed)
  for (const { name } of failedChecks) say(`The check of ${name} failed: see above.`)
  for (const name of tests.names) say(`Failed: ${name}`)
  const passed = tests.passed + checks.length - failedChecks.length
  const failed = tests.failed + failedChecks.length
  if (failed > 0) process.exitCode = 1
  say(`${passed} passed, ${failed} failed`)
}

async function ensurePrograms() {
  const missing = new Set()
  for (const [program, name] of Object.entries(PROGRAMS)) if (!(await canRun(program))) missing.add(name)
  if (missing.size > 0) await installPackages([...missing], 'Programs that the tests need are missing.')
}

/** Runs one check with its output shown; without a script it builds the client. */
async function check(name, script) {
  say(`Checking ${name} …`)
  if (!script) return { name, passed: await built() }
  const npm = process.env.npm_execpath ? [process.execPath, process.env.npm_execpath] : ['npm']
  const { code } = await run(npm[0], [...npm.slice(1), '--silent', ...script], {
    show: true,
    cwd: projectFolder,
  })
  return { name, passed: code === 0 }
}

async function built() {
  try {
    await ensureClient()
    return true
  } catch (fault) {
    console.error(fault.message)
    return false
  }
}

async function runTests(filters) {
  const folder = mkdtempSync(join(tmpdir(), 'sheetwright-report-'))
  const cluster = await startThrowAwayCluster()
  try {
    say('Running the tests …')
    const report = join(folder, 'report.json')
    const vitest = join(projectFolder, 'node_modules/vitest/vitest.mjs')
    const reporters = ['--reporter=default', '--reporter=json', `--outputFile.json=${report}`]
    const { code } = await run(process.execPath, [vitest, 'run', ...reporters, ...filters], {
      show: true,
      cwd: projectFolder,
      signal,
      env: { ...process.env, SHEETWRIGHT_TEST_DATABASE_URL: cluster.superuserUrl },
    })
    return count(report, code)
  } finally {
    await cluster.stop()
    rmSync(folder, { recursive: true, force: true })
  }
}

/** A test that was skipped counts as failed, and so does a file that broke before its tests began. */
function count(report, code) {
  if (!existsSync(report)) return { passed: 0, failed: 1, names: ['the test run itself'] }
  const { testResults } = JSON.parse(readFileSync(report, 'utf8'))
  const tests = testResults.flatMap((file) => file.assertionResults)
  const notPassed = tests
    .filter((test) => test.status !== 'passed')
    .map((test) => `${test.fullName} (${test.status})`)
  const broken = testResults
    .filter(
      (file) => file.status === 'failed' && file.assertionResults.every((test) => test.status === 'passed'),
    )
    .map((file) => file.name.replace(`${projectFolder}/`, ''))
  const names = [...notPassed, ...broken]
  // An error outside any test, such as a rejection that nobody awaits, makes Vitest fail as a whole.
  if (code !== 0 && names.length === 0) names.push('something outside the tests')
  return { passed: tests.length - notPassed.length, failed: names.length, names }
}

main().catch((fault) =>
  interrupted.signal.aborted ? fail(new Stop('Stopped before the end.')) : fail(fault),
)
