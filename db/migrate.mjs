import { fileURLToPath } from 'node:url'
import { drizzle } from 'drizzle-orm/postgres-js'
import { migrate as applyMigrations } from 'drizzle-orm/postgres-js/migrator'
import postgres from 'postgres'

const migrationsFolder = fileURLToPath(new URL('../drizzle', import.meta.url))
const lock = 0x436f756e // any number, as long as it is this one everywhere

/** Brings the database up to date. Several at once wait for one another: the migrator has no lock of its own. */
export async function migrate(databaseUrl) {
  const client = postgres(databaseUrl, { max: 1, onnotice: () => {} })
  try {
    await client`select pg_advisory_lock(${lock})`
    await applyMigrations(drizzle(client), { migrationsFolder })
  } finally {
    await client.end()
  }
}

if (process.argv[1] === fileURLToPath(import.meta.url)) {
  await migrate(process.env.DATABASE_URL)
}
