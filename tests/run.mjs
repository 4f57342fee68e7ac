import { closeSync, mkdtempSync, openSync, readFileSync, rmSync } from 'node:fs'
import { tmpdir } from 'node:os'
import { dirname, join } from 'node:path'
import { fileURLToPath } from 'node:url'
import { alone } from '../db/server/lock.mjs'
import { ensurePackages } from '../db/server/packages.mjs'
import { Refusal, stopEverything } from '../db/server/processes.mjs'

const root = join(dirname(fileURLToPath(import.meta.url)), '..')

async function main() {
  await ensurePackages(root)
  const { bench, installPrograms, stages, turns } = await import('./stages.mjs')
  const all = { ...stages, bench }
  const words = process.argv.slice(2)
  const chosen = words.filter((word) => all[word])
  const filters = words.filter((word) => !all[word])
  if (filters.length && !chosen.length) {
    throw new Refusal(`npm test [-- stage … [part of a file name …]]\nStages: ${Object.keys(all).join(', ')}`)
  }

  const folder = mkdtempSync(join(tmpdir(), 'counterthrow-run-'))
  const results = []
  const run = async (name, stdio) => {
    const began = Date.now()
    let counts
    try {
      counts = await all[name]({ root, folder, filters, stdio })
    } catch (error) {
      console.error(error instanceof Refusal ? error.message : error)
      counts = { passed: 0, failed: 1 }
    }
    results.push({ name, ...counts, seconds: (Date.now() - began) / 1000 })
  }
  /** Keeps what a stage says until it has ended, so that two lanes do not speak at once. */
  const runQuietly = async (name) => {
    const log = join(folder, `${name}.log`)
    const output = openSync(log, 'w')
    await run(name, ['ignore', output, output])
    closeSync(output)
    console.log(`\n━━ ${name}\n${readFileSync(log, 'utf8')}`)
  }
  try {
    if (chosen.length)
      for (const name of chosen) {
        console.log(`\n━━ ${name}`)
        await run(name)
      }
    else {
      await installPrograms()
      for (const lanes of turns)
        await Promise.all(
          lanes.map(async (lane) => {
            for (const name of lane) await runQuietly(name)
          }),
        )
    }
  } finally {
    await stopEverything()
    rmSync(folder, { recursive: true, force: true })
  }

  console.log('')
  for (const { name, passed, failed, seconds } of results) {
    const figures = [passed, failed, seconds.toFixed(1)].map((figure) => String(figure).padStart(7)).join('')
    console.log(`${failed ? '✗' : '✓'} ${name.padEnd(14)}${figures} s`)
  }
  const sum = (key) => results.reduce((total, result) => total + result[key], 0)
  console.log(`${sum('passed')} passed, ${sum('failed')} failed`)
  return sum('failed') ? 1 : 0
}

for (const name of ['SIGINT', 'SIGTERM', 'SIGHUP']) {
  process.on(name, () => void stopEverything().then(() => process.exit(130)))
}

alone(`testing in ${root}`, main).then(
  (code) => process.exit(code),
  (error) => {
    console.error(error instanceof Refusal ? error.message : error)
    console.log('0 passed, 1 failed')
    process.exit(1)
  },
)
