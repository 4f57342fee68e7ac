import { createHash } from 'node:crypto'
import { existsSync, readFileSync, readdirSync, writeFileSync } from 'node:fs'
import { join } from 'node:path'
import { bundleWorker } from './bundle.mjs'
import { alone } from './lock.mjs'
import { run } from './processes.mjs'

const sources = [
  'app',
  'components',
  'scene',
  'lib',
  'db',
  'public',
  'package-lock.json',
  'next.config.mjs',
  'proxy.ts',
  'postcss.config.mjs',
  'tailwind.config.ts',
  'tsconfig.json',
]

function* filesUnder(path, relative) {
  if (!existsSync(path)) return
  const entries = readdirSync(path, { withFileTypes: true }).sort((a, b) => (a.name < b.name ? -1 : 1))
  for (const entry of entries) {
    const inside = `${relative}/${entry.name}`
    if (entry.isDirectory()) yield* filesUnder(join(path, entry.name), inside)
    else yield inside
  }
}

/** One number for all that goes into a build: names and contents, so that neither clocks nor checkouts matter. */
function fingerprint(root) {
  const hash = createHash('sha256').update(process.version)
  for (const source of sources) {
    const files = source.includes('.') ? [source] : filesUnder(join(root, source), source)
    for (const file of files) {
      if (existsSync(join(root, file))) hash.update(`\0${file}\0`).update(readFileSync(join(root, file)))
    }
  }
  return hash.digest('hex')
}

export const nextProgram = (root) => join(root, 'node_modules/next/dist/bin/next')

/** The environment that every run of the framework gets. */
export const nextEnvironment = (distDir, more = {}) => ({
  ...process.env,
  NEXT_TELEMETRY_DISABLED: '1',
  NEXT_DIST_DIR: distDir,
  ...more,
})

/** Builds the program into `distDir` when its sources are not those of the build there. */
export async function ensureBuild(root, distDir) {
  const stamp = join(root, distDir, 'sources.sha256')
  const current = () => existsSync(stamp) && readFileSync(stamp, 'utf8') === fingerprint(root)
  if (current()) return
  await alone(`building into ${join(root, distDir)}`, async () => {
    if (current()) return
    console.log('Building …')
    const before = fingerprint(root)
    // builds of the same sources are one build, on whichever machine they were made
    const env = nextEnvironment(distDir, { NODE_ENV: 'production', COUNTERTHROW_BUILD: before.slice(0, 20) })
    await run(process.execPath, [nextProgram(root), 'build'], { cwd: root, env })
    await bundleWorker(root, distDir)
    writeFileSync(stamp, before)
  })
}
