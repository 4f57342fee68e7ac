import { readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import postgres from 'postgres'

const root = fileURLToPath(new URL('..', import.meta.url))
const lock = 0x53656564 // any number but that of the migrations

/** The product's own services, which are TypeScript: read as the tests read them. */
async function load(file) {
  const { runnerImport } = await import('vite')
  const alias = [
    { find: /^@\//, replacement: root },
    // outside a server bundle its only content is an error
    { find: /^server-only$/, replacement: `${root}node_modules/server-only/empty.js` },
  ]
  const { module } = await runnerImport(`${root}${file}`, {
    root,
    configFile: false,
    logLevel: 'error',
    resolve: { alias },
  })
  return module
}

/** Its password is known to everybody: no demonstration where other machines get in. */
function wanted() {
  const { COUNTERTHROW_SEED, COUNTERTHROW_ORIGIN } = process.env
  if (COUNTERTHROW_SEED === 'off') return false
  return (
    !COUNTERTHROW_ORIGIN ||
    ['127.0.0.1', 'localhost', '[::1]'].includes(new URL(COUNTERTHROW_ORIGIN).hostname)
  )
}

/** Puts the demonstration into the database, once, and gives its sign-ins. */
export async function seed(databaseUrl) {
  if (!wanted()) return []
  const client = postgres(databaseUrl, { max: 1, onnotice() {} })
  try {
    await client`select pg_advisory_lock(${lock})`
    const [done] = await client`select 1 from seeds where name = 'demo'`
    if (!done) await plant(databaseUrl)
  } finally {
    await client.end()
  }
  const { people, password } = JSON.parse(readFileSync(`${root}lib/services/demo/people.json`, 'utf8'))
  return people.map(({ email, roles }) => ({ role: Object.values(roles)[0], email, password }))
}

async function plant(databaseUrl) {
  const before = process.env.DATABASE_URL
  process.env.DATABASE_URL = databaseUrl
  try {
    const { seedDemo } = await load('lib/services/seed-demo.ts')
    const { closeDatabase } = await load('db/client.ts')
    await seedDemo()
    await closeDatabase()
  } finally {
    if (before === undefined) delete process.env.DATABASE_URL
    else process.env.DATABASE_URL = before
  }
}
