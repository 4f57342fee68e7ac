import { randomUUID } from 'node:crypto'
import { sql } from 'drizzle-orm'
import type { PostgresJsDatabase } from 'drizzle-orm/postgres-js'
import { describe, expect, it, vi } from 'vitest'
import postgres from 'postgres'
import { read, write, type Transaction } from '@/db/client'
import { workshops } from '@/db/schema'
import { migrate } from '@/db/migrate.mjs'
import journal from '@/drizzle/meta/_journal.json'
import { errorCode } from '@/lib/errors/as-problem'
import { call } from './support/call'
import { sceneOf } from './support/documents'
import { newOwner } from './support/people'
import { useServer } from './support/server'

const server = useServer()
const readOnly = '25006'

const kill = (pid: number) => server.sql`select pg_terminate_backend(${pid}::int, 5000)`
const named = async (name: string) => server.sql`select id from workshops where name = ${name}`
const sleeping = async (pid: number) =>
  (await server.sql`select 1 from pg_stat_activity where pid = ${pid} and wait_event = 'PgSleep'`).length ===
  1
const codeOf = (work: Promise<unknown>) => work.then(() => 'none', errorCode)

async function backend(tx: Transaction): Promise<number> {
  const [{ pid }] = await tx.execute<{ pid: number }>(sql`select pg_backend_pid() as pid`)
  return pid
}

describe('write()', () => {
  it('write() commits nothing when the backend is killed in the middle and the callback goes on', async () => {
    const [before, after] = [randomUUID(), randomUUID()]
    const seen: unknown[] = []
    const transaction = write(async (tx) => {
      const pid = await backend(tx)
      await tx.insert(workshops).values({ name: before })
      await kill(pid)
      for (const name of [after, after, after]) {
        await tx
          .insert(workshops)
          .values({ name })
          .catch((error: unknown) => seen.push(error))
      }
    })
    await expect(transaction).rejects.toThrow()
    await expect.poll(() => seen.length).toBe(3)
    expect(await named(before)).toHaveLength(0)
    expect(await named(after)).toHaveLength(0)
  })

  it('write() commits nothing when the backend is killed while a query runs and the callback goes on', async () => {
    const [before, after] = [randomUUID(), randomUUID()]
    const seen: unknown[] = []
    const transaction = write(async (tx) => {
      const pid = await backend(tx)
      await tx.insert(workshops).values({ name: before })
      const running = tx.execute(sql`select pg_sleep(30)`).then(
        () => {},
        (error: unknown) => seen.push(error),
      )
      await expect.poll(() => sleeping(pid)).toBe(true)
      await kill(pid)
      await running
      await tx
        .insert(workshops)
        .values({ name: after })
        .catch((error: unknown) => seen.push(error))
    })
    await expect(transaction).rejects.toThrow()
    await expect.poll(() => seen.length).toBe(2)
    expect(await named(before)).toHaveLength(0)
    expect(await named(after)).toHaveLength(0)
  })

  it('the pool answers as before after twenty killed transactions', async () => {
    const kills = Array.from({ length: 20 }, () =>
      write(async (tx) => {
        await kill(await backend(tx))
        await tx.insert(workshops).values({ name: 'never' })
      }),
    )
    const results = await Promise.allSettled(kills)
    expect(results.map(({ status }) => status)).toEqual(Array(20).fill('rejected'))
    const name = randomUUID()
    await Promise.all(Array.from({ length: 20 }, () => write((tx) => tx.insert(workshops).values({ name }))))
    expect(await named(name)).toHaveLength(20)
    expect(await named('never')).toHaveLength(0)
  })

  it('write() fails when the backend is killed after the last statement and before the commit', async () => {
    const name = randomUUID()
    const transaction = write(async (tx) => {
      await tx.insert(workshops).values({ name })
      await kill(await backend(tx))
      return 'done'
    })
    await expect(transaction).rejects.toThrow()
    expect(await named(name)).toHaveLength(0)
  })

  it('write() undoes everything when its callback throws', async () => {
    const name = randomUUID()
    await expect(
      write(async (tx) => {
        await tx.insert(workshops).values({ name })
        throw new Error('changed my mind')
      }),
    ).rejects.toThrow('changed my mind')
    expect(await named(name)).toHaveLength(0)
  })

  it('a save whose backend is killed in the middle leaves scene, versions and audit log as they were', async () => {
    const owner = await newOwner()
    const created = await call('POST', '/api/v1/scenes', {
      cookie: owner.cookie,
      body: { document: sceneOf('i3-1000') },
    })
    const { id } = (created.body as { scene: { id: string } }).scene
    const state = () => server.sql`
      select head_version, (select count(*) from scene_versions where scene_id = ${id}) as versions,
        (select count(*) from audit_log where subject = ${`scene:${id}`}) as rows from scenes where id = ${id}`
    const before = await state()

    // the save waits for this lock in its middle, where its backend is killed
    const holder = postgres(server.ownerUrl, { max: 1 })
    await holder`begin`
    await holder`lock table audit_log in share row exclusive mode`
    const save = call('POST', `/api/v1/scenes/${id}/versions`, {
      cookie: owner.cookie,
      body: { base: 1, document: sceneOf('i3-1000') },
    })
    const waiting = () => server.sql<{ pid: number }[]>`
      select pid from pg_stat_activity
      where datname = current_database() and wait_event_type = 'Lock' and query like 'insert into "audit_log"%'`
    await expect.poll(async () => (await waiting()).length).toBe(1)
    await kill((await waiting())[0].pid)
    const answer = await save
    await holder`rollback`
    await holder.end()

    expect(answer.status).toBe(503)
    expect(await state()).toEqual(before)
    const again = await call('POST', `/api/v1/scenes/${id}/versions`, {
      cookie: owner.cookie,
      body: { base: 1, document: sceneOf('i3-1000') },
    })
    expect(again.status).toBe(201)
  })
})

describe('outside write()', () => {
  it('the module loaded a second time, as the framework does for pages and for routes, shares the pool and works', async () => {
    vi.resetModules()
    const second = await import('@/db/client')
    expect(second.write).not.toBe(write)
    const name = randomUUID()
    await write((tx) => tx.insert(workshops).values({ name }))
    await second.write((tx) => tx.insert(workshops).values({ name }))
    const connections = await server.sql`
      select 1 from pg_stat_activity where datname = current_database() and application_name = 'counterthrow'`
    expect(connections.length).toBeLessThanOrEqual(10)
    expect(await named(name)).toHaveLength(2)
  })

  it('read() refuses to write', async () => {
    expect(await codeOf(read((tx) => tx.insert(workshops).values({ name: 'no' })))).toBe(readOnly)
  })

  it('a bare write on the pool is refused by the server, and a bare query on the database before it is sent', async () => {
    const { database } = (
      globalThis as unknown as { counterthrow: { database: PostgresJsDatabase & { $client: postgres.Sql } } }
    ).counterthrow
    const row = { id: randomUUID(), name: 'no' }
    expect(await codeOf(database.$client`insert into workshops ${database.$client(row)}`)).toBe(readOnly)
    await expect(database.insert(workshops).values(row)).rejects.toThrow('No transaction is open')
  })
})

describe('what the database itself refuses', () => {
  const refused = async (statement: string, sql = server.sql) => codeOf(sql.unsafe(statement))
  const notAllowed = '42501'

  it('the program’s role can neither change what is never changed nor lift the guard on it', async () => {
    const owner = await newOwner()
    await call('POST', '/api/v1/scenes', { cookie: owner.cookie, body: { document: sceneOf('i3-1000') } })
    for (const table of ['audit_log', 'scene_versions', 'note_events', 'verdicts']) {
      for (const statement of [
        `update ${table} set created_at = now()`,
        `delete from ${table}`,
        `truncate ${table} cascade`,
        `alter table ${table} add column more text`,
        `alter table ${table} disable trigger all`,
        `alter table ${table} owner to current_user`,
        `drop table ${table} cascade`,
        `create trigger mine before insert on ${table} for each row execute function refuse_change()`,
        `create rule mine as on insert to ${table} do instead nothing`,
        `create index mine on ${table} (created_at)`,
      ]) {
        expect(await refused(statement), statement).toBe(notAllowed)
      }
    }
    for (const statement of [
      'drop schema public cascade',
      'create schema mine',
      'create table public.mine (n int)',
      'create or replace function refuse_change() returns trigger language sql as $$ select 1 $$',
      'drop function refuse_change cascade',
      'set session_replication_role = replica',
      'set role keeper',
      'delete from drizzle.__drizzle_migrations',
    ]) {
      expect(await refused(statement), statement).toBe(notAllowed)
    }
  })

  it('the owner of the tables is stopped by their triggers', async () => {
    const keeper = postgres(server.ownerUrl, { max: 1, onnotice() {} })
    for (const table of ['scene_versions', 'audit_log']) {
      expect(await refused(`update ${table} set created_at = now()`, keeper), table).toBe('23001')
      expect(await refused(`delete from ${table}`, keeper), table).toBe('23001')
      expect(await refused(`truncate ${table} cascade`, keeper), table).toBe('23001')
    }
    await keeper.end()
  })

  it('a scene whose head is no version of it cannot be committed', async () => {
    expect(await refused('update scenes set head_version = 99')).toBe('23503')
  })
})

describe('migrate()', () => {
  async function empty() {
    const keeper = postgres(server.ownerUrl, { max: 1, onnotice() {} })
    await keeper.unsafe(`
      drop schema if exists public, drizzle, graphile_worker cascade;
      create schema public authorization pg_database_owner; grant usage on schema public to public`)
    await keeper.end()
  }

  it('migrate() six at once on an empty database ends well six times', async () => {
    await empty()
    const six = Array.from({ length: 6 }, () => migrate(server.url, server.ownerUrl))
    expect(await Promise.all(six)).toEqual(Array(6).fill({ guarded: true }))
    const applied = await server.sql`select hash from drizzle.__drizzle_migrations`
    expect(applied).toHaveLength(journal.entries.length)
    expect(await server.sql`select * from graphile_worker.jobs`).toEqual([])
  })

  it('migrate() of the program’s role alone is content with what is current and refuses what is not', async () => {
    expect(await migrate(server.url)).toEqual({ guarded: true })
    await empty()
    await expect(migrate(server.url)).rejects.toThrow('The role app may not migrate the database.')
  })

  it('migrate() with one role for everything says that the program is not kept from its tables', async () => {
    await empty()
    expect(await migrate(server.ownerUrl)).toEqual({ guarded: false })
  })

  it('migrate() takes a database over that belonged to the program', async () => {
    await empty()
    const keeper = postgres(server.ownerUrl, { max: 1, onnotice() {} })
    const [{ name }] = await keeper`select current_database() as name`
    await keeper`alter database ${keeper(name)} owner to app`
    await migrate(server.url)
    await keeper.end()
    expect(await codeOf(server.sql`alter table audit_log add column mine text`)).toBe('none')
    expect(await migrate(server.url, server.ownerUrl)).toEqual({ guarded: true })
    expect(await codeOf(server.sql`alter table audit_log drop column mine`)).toBe('42501')
    expect(await codeOf(server.sql`select * from scenes`)).toBe('none')
  })
})
