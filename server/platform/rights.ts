import type { EntityManager } from 'typeorm'

const ADD_ONLY = 'SELECT, INSERT'
const ALL = 'SELECT, INSERT, UPDATE, DELETE'

/** What the application's role may do with tables that are not simply its own: what is once written there stays. */
const rights: Record<string, string> = {
  audit_entry: ADD_ONLY,
  audit_head: 'SELECT, UPDATE',
  revision: ADD_ONLY,
  // Versions are never changed but for their end.
  item_version: 'SELECT, INSERT, UPDATE (until)',
  edition: 'SELECT, INSERT, UPDATE (state)',
  artefact: ADD_ONLY,
  migrations: 'SELECT',
}

/** Gives the application's role its rights on the tables that the current role owns, and takes every other away. Run by
 *  the owner after each migration, under the same lock. */
export async function grantRights(em: EntityManager, role: string): Promise<void> {
  const to = quoted(role)
  const tables = await em.query<{ name: string }[]>(
    `SELECT tablename AS name FROM pg_tables WHERE schemaname = 'public' AND tableowner = current_user`,
  )
  const [database] = await em.query<{ name: string; mayCreate: boolean }[]>(
    `SELECT current_database() AS name, has_database_privilege($1, current_database(), 'CREATE') AS "mayCreate"`,
    [role],
  )
  await em.query(`GRANT USAGE ON SCHEMA public TO ${to}`)
  // The queue keeps its tables in a schema of its own, which it makes itself.
  if (database && !database.mayCreate)
    await em.query(`GRANT CREATE ON DATABASE ${quoted(database.name)} TO ${to}`)
  for (const { name } of tables) {
    const table = quoted(name)
    await em.query(`REVOKE ALL ON ${table} FROM ${to}; GRANT ${rights[name] ?? ALL} ON ${table} TO ${to}`)
  }
}

const quoted = (name: string): string => `"${name.replaceAll('"', '""')}"`
