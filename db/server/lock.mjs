import { createHash } from 'node:crypto'
import { existsSync, mkdirSync, readFileSync, realpathSync, rmSync, writeFileSync } from 'node:fs'
import { connect, createServer } from 'node:net'
import { join } from 'node:path'
import { Refusal, observeGroups, stopGroup, until } from './processes.mjs'

/**
 * A name that one process of this machine can hold at a time. The kernel keeps it (an abstract socket) and gives it
 * back however its holder ends, so it is never stale. Whoever asks the holder is told `describe()`.
 */
function hold(name, describe) {
  const path = `\0counterthrow-${createHash('sha256').update(name).digest('hex')}`
  return new Promise((resolve, reject) => {
    const server = createServer((caller) => caller.on('error', () => {}).end(describe()))
    server.once('error', (error) => (error.code === 'EADDRINUSE' ? resolve({ path }) : reject(error)))
    server.listen(path, () => {
      server.unref()
      resolve({ path, release: () => new Promise((done) => server.close(done)) })
    })
  })
}

function holder(path) {
  return new Promise((resolve) => {
    let said = ''
    const caller = connect(path)
    caller.on('data', (data) => (said += data))
    caller.on('error', () => resolve(''))
    caller.on('close', () => resolve(said))
  })
}

/** Runs the work while no other process of this machine runs work of the same name; waits for its turn. */
export async function alone(name, work) {
  let told = false
  const held = await until(
    async () => {
      const lock = await hold(name, () => String(process.pid))
      if (lock.release) return lock
      if (!told) console.log(`Waiting for process ${await holder(lock.path)}: ${name}`)
      told = true
      return null
    },
    15 * 60_000,
    500,
  )
  if (!held) throw new Refusal(`Another process has not finished in 15 minutes: ${name}`)
  try {
    return await work()
  } finally {
    await held.release()
  }
}

/**
 * Takes a data folder for this process, or refuses with who has it. What this process starts is written down there,
 * so that the next start can stop it if this one is killed.
 */
export async function takeDataFolder(dataFolder) {
  mkdirSync(dataFolder, { recursive: true })
  const folder = realpathSync(dataFolder)
  let address = ''
  const lock = await hold(`data ${folder}`, () => `process ${process.pid}${address && ` at ${address}`}`)
  if (!lock.release) {
    throw new Refusal(`Already running on ${folder}: ${(await holder(lock.path)) || 'another process'}.`)
  }

  const file = join(folder, 'running.json')
  const left = existsSync(file) ? JSON.parse(readFileSync(file, 'utf8')) : []
  for (const group of left.reverse()) await stopGroup(group)
  const groups = []
  observeGroups((group) => {
    groups.push(group)
    writeFileSync(file, JSON.stringify(groups) + '\n', { mode: 0o600 })
  })
  return {
    folder,
    announce: (where) => (address = where),
    async release() {
      rmSync(file, { force: true })
      await lock.release()
    },
  }
}
