import { createRequire } from 'node:module'
import { readdirSync } from 'node:fs'
import { dirname, join } from 'node:path'

const queueMigrations = join(dirname(createRequire(import.meta.url).resolve('graphile-worker')), '../sql')

/** Installs the tables of the job queue; the package is read only when there is something to do, to start quickly. */
export async function ensureQueue(sql, ownerUrl) {
  const [there] = await sql`select to_regclass('graphile_worker.migrations') as name`
  const [{ last }] =
    there.name === null ? [{ last: 0 }] : await sql`select max(id) as last from graphile_worker.migrations`
  if (last >= readdirSync(queueMigrations).length) return
  const { Logger, runMigrations } = await import('graphile-worker')
  await runMigrations({ connectionString: ownerUrl, logger: new Logger(() => () => {}) })
}
