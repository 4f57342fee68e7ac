import { type ChildProcess, spawn } from 'node:child_process'
import { once } from 'node:events'
import { chmodSync, existsSync, mkdtempSync, readFileSync, readdirSync, rmSync } from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import { join } from 'node:path'
import { fileURLToPath } from 'node:url'
import postgres from 'postgres'
import { afterEach, describe, expect, it, vi } from 'vitest'

// whole servers come and go here, several a test
vi.setConfig({ testTimeout: 120_000 })

const root = fileURLToPath(new URL('../../..', import.meta.url))
const isRoot = process.getuid?.() === 0
const folders: string[] = []
const children: ChildProcess[] = []

function dataFolder(mode = 0o755) {
  const outer = mkdtempSync(join(tmpdir(), 'counterthrow-start-'))
  chmodSync(outer, mode)
  folders.push(outer)
  return join(outer, 'data')
}

/** Runs `npm start -- --database-only` on this data; comes back when it has ended, or with its address when ready. */
async function launch(folder: string) {
  const child = spawn(process.execPath, ['db/server/start.mjs', '--database-only'], {
    cwd: root,
    env: { ...process.env, COUNTERTHROW_DATA: folder, DATABASE_URL: '', COUNTERTHROW_SEED: 'off' },
  })
  children.push(child)
  const ended = once(child, 'exit').then(([code]) => code as number | null)
  let said = ''
  const url = await new Promise<string | null>((resolve) => {
    const listen = (data: Buffer) => {
      said += data
      const ready = /The database is ready: (\S+)/.exec(said)
      if (ready) resolve(ready[1])
    }
    child.stdout.on('data', listen)
    child.stderr.on('data', listen)
    void ended.then(() => resolve(null))
  })
  const stop = (signal: NodeJS.Signals) => {
    child.kill(signal)
    return ended
  }
  return { url, ended, stop, pid: child.pid, said: () => said }
}

async function start(folder: string) {
  const { url, ...process } = await launch(folder)
  if (url === null) throw new Error(process.said())
  return { url, ...process }
}

/** Server processes whose files are this data folder's, wherever they lie. */
function servers(folder: string) {
  const pointer = join(folder, 'database.elsewhere')
  const place = existsSync(pointer) ? readFileSync(pointer, 'utf8').trim() : join(folder, 'database')
  const commands = readdirSync('/proc').flatMap((name) => {
    if (!/^\d+$/.test(name)) return []
    try {
      return [{ pid: Number(name), words: readFileSync(`/proc/${name}/cmdline`, 'utf8').split('\0') }]
    } catch {
      return []
    }
  })
  return commands.filter(({ words }) => words.includes(join(place, 'cluster'))).map(({ pid }) => pid)
}

async function run(url: string, statement: string) {
  const sql = postgres(url, { max: 1, onnotice() {} })
  try {
    return await sql.unsafe(statement)
  } finally {
    await sql.end({ timeout: 5 })
  }
}

const portOf = (url: string) => Number(new URL(url).port)

afterEach(async () => {
  for (const child of children.splice(0)) {
    if (child.exitCode === null && child.signalCode === null) {
      child.kill('SIGTERM')
      await once(child, 'exit')
    }
  }
  for (const folder of folders.splice(0)) {
    const pointer = join(folder, 'data/database.elsewhere')
    if (existsSync(pointer)) rmSync(readFileSync(pointer, 'utf8').trim(), { recursive: true })
    rmSync(folder, { recursive: true })
  }
})

describe('npm start -- --database-only', () => {
  it('a second start on the same data says who has it and ends with 1; SIGINT leaves no server behind', async () => {
    const folder = dataFolder()
    const first = await start(folder)
    expect(servers(folder)).toHaveLength(1)

    const second = await launch(folder)
    expect(await second.ended).toBe(1)
    expect(second.said()).toContain(`Already running on ${folder}: process ${first.pid}`)
    expect(servers(folder)).toHaveLength(1)

    expect(await first.stop('SIGINT')).toBe(0)
    expect(servers(folder)).toEqual([])
  })

  it('killed hard, the next start stops what was left and finds what was written', async () => {
    const folder = dataFolder()
    const first = await start(folder)
    await run(first.url, `insert into seeds (name) values ('kept')`)
    const [before] = servers(folder)
    await first.stop('SIGKILL')
    expect(servers(folder)).toEqual([before])

    const second = await start(folder)
    expect(await run(second.url, 'select name from seeds')).toMatchObject([{ name: 'kept' }])
    expect(servers(folder)).toHaveLength(1)
    expect(servers(folder)).not.toContain(before)
    expect(portOf(second.url)).toBe(portOf(first.url))
  })

  it('with both killed in the middle of their work, the next start recovers what was committed', async () => {
    const folder = dataFolder()
    const first = await start(folder)
    await run(first.url, `insert into seeds (name) values ('kept')`)
    // a backend that is still at work when its server goes delays the next server
    const busy = run(first.url, 'select count(*) from generate_series(1, 1e9)').catch(() => 'cut off')
    const atWork = `select 1 from pg_stat_activity where query like 'select count%' and state = 'active'`
    await expect.poll(() => run(first.url, atWork), { timeout: 60_000 }).toHaveLength(1)
    const [before] = servers(folder)
    await first.stop('SIGKILL')
    process.kill(before, 'SIGKILL')

    const second = await start(folder)
    expect(await busy).toBe('cut off')
    expect(await run(second.url, 'select name from seeds')).toMatchObject([{ name: 'kept' }])
  })

  it('a server that ends by itself ends the start with 1', async () => {
    const folder = dataFolder()
    const first = await start(folder)
    process.kill(servers(folder)[0], 'SIGINT')
    expect(await first.ended).toBe(1)
  })

  it('takes another port when its own is taken', async () => {
    const folder = dataFolder()
    const first = await start(folder)
    await first.stop('SIGTERM')
    const squatter = createServer().listen(portOf(first.url), '127.0.0.1')
    await once(squatter, 'listening')
    const second = await start(folder)
    squatter.close()
    expect(portOf(second.url)).not.toBe(portOf(first.url))
    expect(await run(second.url, 'select current_user')).toMatchObject([{ current_user: 'app' }])
  })

  it('lets nobody of this machine in without its secret', async () => {
    const { url } = await start(dataFolder())
    const intruders = [url, url, url].map((address) => new URL(address))
    intruders[0].password = ''
    intruders[1].password = 'app'
    intruders[2].username = 'keeper'
    for (const { href } of intruders)
      await expect(run(href, 'select 1')).rejects.toMatchObject({ code: '28P01' })
    const [role] = await run(
      url,
      'select rolsuper, rolcreatedb, rolcreaterole from pg_roles where rolname = current_user',
    )
    expect(role).toEqual({ rolsuper: false, rolcreatedb: false, rolcreaterole: false })
  })

  it('works where the server’s own user cannot enter the folder above', async () => {
    const folder = dataFolder(0o700)
    const first = await start(folder)
    expect(existsSync(join(folder, 'database.elsewhere'))).toBe(isRoot)
    await run(first.url, `insert into seeds (name) values ('kept')`)
    await first.stop('SIGINT')
    expect(servers(folder)).toEqual([])
    const second = await start(folder)
    expect(await run(second.url, 'select name from seeds')).toMatchObject([{ name: 'kept' }])
  })
})
