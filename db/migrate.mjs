import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { drizzle } from 'drizzle-orm/postgres-js'
import { migrate as applyMigrations } from 'drizzle-orm/postgres-js/migrator'
import postgres from 'postgres'
import { ensureQueue } from './queue.mjs'
import { grantToProgram, takeOver } from './roles.mjs'

const migrationsFolder = fileURLToPath(new URL('../drizzle', import.meta.url))
const lock = 0x436f756e // any number, as long as it is this one everywhere

const connect = (url) => postgres(url, { max: 1, onnotice() {} })

async function roleOf(url) {
  const sql = connect(url)
  try {
    const [{ name }] = await sql`select current_user::text as name`
    return name
  } finally {
    await sql.end()
  }
}

/** One server of several is given the program's role alone: another has brought the database up to date before. */
async function isCurrent(sql) {
  const { entries } = JSON.parse(readFileSync(`${migrationsFolder}/meta/_journal.json`, 'utf8'))
  const [there] = await sql`select to_regclass('drizzle.__drizzle_migrations') as name`
  if (there.name === null) return false
  const [{ last }] = await sql`select max(created_at) as last from drizzle.__drizzle_migrations`
  return Number(last) === entries.at(-1).when
}

/**
 * Brings the database up to date as the role that owns it and gives the role of the program what it may do. Several at
 * once wait for one another: the migrator has no lock of its own. Answers whether the program's role is another than the
 * owner, which alone keeps it from lifting the guards on what is never changed.
 */
export async function migrate(programUrl, ownerUrl = programUrl) {
  const program = await roleOf(programUrl)
  const owner = connect(ownerUrl)
  try {
    await owner`select pg_advisory_lock(${lock})`
    const [{ owns, name }] = await owner`
      select has_database_privilege(current_database(), 'CREATE') as owns, current_user::text as name`
    if (!owns) {
      if (await isCurrent(owner)) return { guarded: true }
      throw new Error(
        `The role ${name} may not migrate the database. Give MIGRATION_DATABASE_URL its owner’s address.`,
      )
    }
    if (name !== program) await takeOver(owner, program)
    await applyMigrations(drizzle(owner), { migrationsFolder })
    await ensureQueue(owner, ownerUrl)
    if (name !== program) await grantToProgram(owner, program)
    return { guarded: name !== program }
  } finally {
    await owner.end()
  }
}
