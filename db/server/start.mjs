import { mkdirSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureBuild } from './build.mjs'
import { takeDataFolder } from './lock.mjs'
import { ensurePackages } from './packages.mjs'
import { startCluster } from './postgres.mjs'
import { Refusal, stopEverything } from './processes.mjs'
import { ensurePort, serve } from './serve.mjs'
import { work, workAsWritten } from './work.mjs'

const usage = `npm start                      everything: packages, database, build, web server
npm run dev                    the same with hot reload instead of a build
npm start -- --database-only   the database alone, with its address
npm start -- --worker-only     workers alone, beside web servers started elsewhere on the same database

PORT                    3000    where the web server listens, on 127.0.0.1; several, as 3000,3001, are several servers
WORKERS                 1       how many workers do what is done in the background
COUNTERTHROW_DATA       .data   database, uploads and outgoing mail
DATABASE_URL                    a PostgreSQL server to use instead of starting one
MIGRATION_DATABASE_URL          the same as the role that owns the database, so that the program need not be
`
const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..')
const options = new Set(process.argv.slice(2))
const ports = (process.env.PORT || '3000').split(',').map(Number)
const workers = Number(process.env.WORKERS || 1)
// what is read from the settings in this process, as the demonstration does, names the first of several
process.env.PORT = String(ports[0])

const stopping = new Promise((resolve) => {
  for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, () => resolve(name))
})

/** What the database needs before anything reads it; its packages are only now surely there. */
async function prepareDatabase(url, ownerUrl) {
  const { migrate } = await import('../migrate.mjs')
  const { seed } = await import('../seed.mjs')
  const { guarded } = await migrate(url, ownerUrl)
  if (!guarded) {
    console.log(
      'The program owns its tables: only triggers keep the audit log as it is. See MIGRATION_DATABASE_URL.',
    )
  }
  return seed(url)
}

async function start(data) {
  const databaseOnly = options.has('--database-only')
  const workerOnly = options.has('--worker-only')
  const dev = options.has('--dev')
  const served = databaseOnly || workerOnly ? [] : ports
  for (const port of served) await ensurePort(port)
  await ensurePackages(root)

  const outside = process.env.DATABASE_URL || null
  if (workerOnly && !outside)
    throw new Refusal('Workers alone need the database of the others: give DATABASE_URL.')
  const cluster = outside ? null : await startCluster({ dataFolder: data.folder })
  const url = outside ?? cluster.url
  const signIns = await prepareDatabase(url, cluster?.ownerUrl ?? (process.env.MIGRATION_DATABASE_URL || url))
  // what serves people never learns how to sign in as the owner
  delete process.env.MIGRATION_DATABASE_URL
  if (databaseOnly) {
    console.log(`\nThe database is ready: ${url}\nCtrl-C stops it.`)
    return [cluster]
  }

  const distDir = process.env.NEXT_DIST_DIR || '.next'
  if (!dev) await ensureBuild(root, distDir)
  for (const name of ['uploads', 'mail']) mkdirSync(join(data.folder, name), { recursive: true, mode: 0o700 })
  const environment = {
    DATABASE_URL: url,
    COUNTERTHROW_DATA: data.folder,
    PORT: String(ports[0]),
    COUNTERTHROW_ORIGIN: process.env.COUNTERTHROW_ORIGIN || `http://127.0.0.1:${ports[0]}`,
  }
  const running = await Promise.all([
    ...served.map((port) => serve({ root, port, distDir, dev, environment })),
    ...Array.from({ length: workers }, () => (dev ? workAsWritten : work)({ root, distDir, environment })),
  ])
  const addresses = running.map(({ address }) => address).filter(Boolean)
  if (workerOnly) {
    console.log(`\n${workers === 1 ? 'One worker works' : `${workers} workers work`}. Ctrl-C stops it.`)
    return [cluster, ...running]
  }
  data.announce(addresses.join(' and '))
  console.log(`\nCounterthrow runs at ${addresses.join(' and ')}`)
  for (const { role, email, password } of signIns) console.log(`  ${role.padEnd(10)} ${email}  ${password}`)
  console.log('Ctrl-C stops it.')
  return [cluster, ...running]
}

async function main() {
  if (options.has('--help')) return console.log(usage)
  for (const option of options) {
    if (!['--dev', '--database-only', '--worker-only'].includes(option))
      throw new Refusal(`Unknown option ${option}\n\n${usage}`)
  }
  if (!ports.every((port) => port > 0 && port < 65536)) {
    throw new Refusal(`PORT=${ports} is not a port number, nor several with commas between.`)
  }
  if (!(workers >= 0 && workers <= 64))
    throw new Refusal(`WORKERS=${process.env.WORKERS} is not a number up to 64.`)
  const data = await takeDataFolder(resolve(root, process.env.COUNTERTHROW_DATA || '.data'))
  try {
    const started = start(data).then((servers) =>
      Promise.race(servers.filter(Boolean).map(({ ended }) => ended)),
    )
    const outcome = await Promise.race([started, stopping])
    if (typeof outcome !== 'string') throw new Refusal('A server ended by itself; see above.')
    console.log(`\n${outcome}: stopping`)
  } finally {
    await stopEverything()
    await data.release()
  }
}

main().then(
  () => process.exit(0),
  (error) => {
    console.error(error instanceof Refusal ? error.message : error)
    process.exit(1)
  },
)
