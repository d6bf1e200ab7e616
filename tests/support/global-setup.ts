import { startThrowAwayCluster } from '../../server/scripts/lib/throw-away.mjs'

/** Address of the test cluster's superuser: where test databases are created. `npm test` gives it. */
const VARIABLE = 'SHEETWRIGHT_TEST_DATABASE_URL'

/** Where tests are run by themselves, starts a throw-away cluster for as long as they run. */
export default async function setup(): Promise<(() => Promise<void>) | undefined> {
  if (process.env[VARIABLE]) return undefined
  const cluster = await startThrowAwayCluster()
  process.env[VARIABLE] = cluster.superuserUrl
  return async () => {
    delete process.env[VARIABLE]
    await cluster.stop()
  }
}
