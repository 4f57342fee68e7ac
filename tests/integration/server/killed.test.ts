import postgres from 'postgres'
import { afterAll, beforeAll, describe, expect, it, vi } from 'vitest'
import { write } from '@/db/client'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { freeLanes, missingLanes } from '@/lib/queue/dead-workers'
import { postMail } from '@/lib/services/mail/post-mail'
import { buildProgram, startServer, startWorker, stopEverything } from '../../support/program.mjs'
import { startMailServer, type MailServer } from '../../support/smtp'
import { call } from '../support/call'
import { sceneOf } from '../support/documents'
import { newOwner, type Someone } from '../support/people'
import { useServer } from '../support/server'

// whole servers come and go here, and may have to be built
vi.setConfig({ testTimeout: 120_000, hookTimeout: 600_000 })

const server = useServer()
let post: MailServer
let owner: Someone
let sceneId: string
const environment = () => ({
  DATABASE_URL: server.url,
  COUNTERTHROW_DATA: server.dataFolder,
  RATE_LIMIT: 'off',
  MAIL: 'smtp',
  SMTP_URL: post.url,
  MAIL_FROM: 'Counterthrow <post@example.com>',
})

beforeAll(async () => {
  await buildProgram()
  post = await startMailServer()
  owner = await newOwner()
  const body = { document: sceneOf('single-450') }
  sceneId = ((await call('POST', '/api/v1/scenes', { ...owner, body })).body as OpenedScene).scene.id
})
afterAll(async () => {
  await stopEverything()
  await post.close()
})

const sayTo = (address: string) => (path: string, key: string, body: object) =>
  fetch(`${address}/api/v1/${path}`, {
    method: 'POST',
    headers: {
      cookie: owner.cookie,
      'content-type': 'application/json',
      'sec-fetch-site': 'same-origin',
      'idempotency-key': key,
    },
    body: JSON.stringify(body),
  })

const backends = (how: string) => server.sql<{ pid: number }[]>`
  select pid from pg_stat_activity
  where datname = current_database() and application_name = 'counterthrow' and ${server.sql.unsafe(how)}`

/**
 * A server is killed while the request stands before this table, which it would write to next: in the middle of its
 * transaction. Then what it asked for is asked for again, of another server.
 */
async function killedBefore(table: string, path: string, body: object) {
  const key = crypto.randomUUID()
  const holder = postgres(server.ownerUrl, { max: 1 })
  await holder`begin`
  await holder`lock table ${holder(table)} in share row exclusive mode`
  const first = await startServer(environment())
  const request = sayTo(first.address)(path, key, body).then(
    ({ status }) => status,
    () => 'cut off',
  )
  await expect.poll(() => backends(`wait_event_type = 'Lock'`), { timeout: 30_000 }).toHaveLength(1)
  const [{ pid }] = await backends(`wait_event_type = 'Lock'`)
  await first.kill()
  expect(await request).toBe('cut off')
  await holder`rollback`
  await holder.end()
  await expect.poll(() => backends(`pid = ${pid}`), { timeout: 30_000 }).toEqual([])
  const second = await startServer(environment())
  return { again: () => sayTo(second.address)(path, key, body), kill: second.kill }
}

describe('a web server killed in the middle', () => {
  const state = async () => {
    const [row] = await server.sql`
      select head_version as head, (select count(*)::int from scene_versions where scene_id = scenes.id) as versions,
        (select count(*)::int from audit_log where subject = 'scene:' || scenes.id and operation = 'scene.save') as audited,
        (select count(*)::int from graphile_worker.jobs where key like 'picture:' || scenes.id || ':%') as jobs
      from scenes where id = ${sceneId}`
    return row
  }

  it('of a save leaves nothing of it; saved again, it is there once', async () => {
    const before = await state()
    const body = { base: 1, document: sceneOf('single-450', { angleDeg: 90 }) }
    const { again, kill } = await killedBefore('audit_log', `scenes/${sceneId}/versions`, body)
    expect(await state()).toEqual(before)
    expect((await again()).status).toBe(201)
    expect((await again()).status).toBe(201)
    expect(await state()).toMatchObject({ head: 2, versions: 2, audited: 1, jobs: 2 })
    await kill()
  })

  it('of an invitation leaves neither invitation nor mail; invited again, one mail waits', async () => {
    const counts = async () => {
      const [row] = await server.sql`
        select (select count(*)::int from invitations) as invitations, (select count(*)::int from mails) as mails,
          (select count(*)::int from graphile_worker.jobs where key like 'mail:%') as jobs`
      return row
    }
    const body = { email: 'pip@example.com', role: 'service' }
    const { again, kill } = await killedBefore('mails', `workshops/${owner.workshopId}/invitations`, body)
    expect(await counts()).toEqual({ invitations: 0, mails: 0, jobs: 0 })
    expect((await again()).status).toBe(201)
    expect(await counts()).toEqual({ invitations: 1, mails: 1, jobs: 1 })
    await kill()
  })
})

describe('a worker killed in the middle of its mails', () => {
  it('what was handed over is not sent twice, what was not is sent by another, once each', async () => {
    await server.sql`delete from graphile_worker._private_jobs`
    const send = (name: string) =>
      write((tx) =>
        postMail(tx, {
          template: 'question-copy',
          to: { email: `${name}@example.com`, name, userId: null },
          data: { workshop: 'Larkspur', question: `Asked by ${name}` },
          key: `killed:${name}`,
          workshopId: owner.workshopId,
        }),
      )
    const held = post.hold()
    await send('first')
    const worker = await startWorker(environment())
    const { to } = await held.reached
    await worker.kill()
    held.release()
    await send('second')
    await send('third')

    // its lanes are missing as soon as the database has seen that it is gone
    await expect.poll(missingLanes, { timeout: 30_000 }).toHaveLength(1)
    await freeLanes(await missingLanes())
    const other = await startWorker(environment())
    const states = () =>
      server.sql`select to_name as name, state from mails where key like 'killed:%' order by to_name`
    await expect.poll(states, { timeout: 60_000 }).toEqual([
      { name: 'first', state: 'unsure' },
      { name: 'second', state: 'sent' },
      { name: 'third', state: 'sent' },
    ])
    await other.kill()
    expect(to).toEqual(['first@example.com'])
    expect(post.received.map((mail) => mail.to[0]).sort()).toEqual(
      ['first', 'second', 'third'].map((name) => `${name}@example.com`),
    )
    expect(await server.sql`select 1 from graphile_worker.jobs`).toEqual([])
  })
})
