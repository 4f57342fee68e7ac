import { mkdirSync } from 'node:fs'
import { dirname, join, resolve } from 'node:path'
import { fileURLToPath } from 'node:url'
import { ensureBuild } from './build.mjs'
import { takeDataFolder } from './lock.mjs'
import { ensurePackages } from './packages.mjs'
import { startCluster } from './postgres.mjs'
import { Refusal, stopEverything } from './processes.mjs'
import { ensurePort, serve } from './serve.mjs'

const usage = `npm start                      everything: packages, database, build, web server
npm run dev                    the same with hot reload instead of a build
npm start -- --database-only   the database alone, with its address

PORT                3000        where the web server listens, on 127.0.0.1
COUNTERTHROW_DATA   .data       database, uploads and outgoing mail
DATABASE_URL                    a PostgreSQL server to use instead of starting one
`
const root = resolve(dirname(fileURLToPath(import.meta.url)), '../..')
const options = new Set(process.argv.slice(2))
const port = Number(process.env.PORT || 3000)

const stopping = new Promise((resolve) => {
  for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) process.on(name, () => resolve(name))
})

/** What the database needs before anything reads it; its packages are only now surely there. */
async function prepareDatabase(url) {
  const { migrate } = await import('../migrate.mjs')
  const { seed } = await import('../seed.mjs')
  await migrate(url)
  return seed(url)
}

async function start(data) {
  const databaseOnly = options.has('--database-only')
  const dev = options.has('--dev')
  if (!databaseOnly) await ensurePort(port)
  await ensurePackages(root)

  const outside = process.env.DATABASE_URL || null
  const cluster = outside ? null : await startCluster({ dataFolder: data.folder })
  const url = outside ?? cluster.url
  const signIns = await prepareDatabase(url)
  if (databaseOnly) {
    console.log(`\nThe database is ready: ${url}\nCtrl-C stops it.`)
    return [cluster]
  }

  const distDir = process.env.NEXT_DIST_DIR || '.next'
  if (!dev) await ensureBuild(root, distDir)
  for (const name of ['uploads', 'mail']) mkdirSync(join(data.folder, name), { recursive: true, mode: 0o700 })
  const environment = { DATABASE_URL: url, COUNTERTHROW_DATA: data.folder, PORT: String(port) }
  const web = await serve({ root, port, distDir, dev, environment })
  data.announce(web.address)
  console.log(`\nCounterthrow runs at ${web.address}`)
  for (const { role, email, password } of signIns) console.log(`  ${role.padEnd(10)} ${email}  ${password}`)
  console.log('Ctrl-C stops it.')
  return [cluster, web]
}

async function main() {
  if (options.has('--help')) return console.log(usage)
  for (const option of options) {
    if (!['--dev', '--database-only'].includes(option))
      throw new Refusal(`Unknown option ${option}\n\n${usage}`)
  }
  if (!(port > 0 && port < 65536)) throw new Refusal(`PORT=${process.env.PORT} is not a port number.`)
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
