import { randomUUID } from 'node:crypto'
import { existsSync, readdirSync } from 'node:fs'
import { join } from 'node:path'
import { Logger, runOnce, type TaskList } from 'graphile-worker'
import type postgres from 'postgres'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { write } from '@/db/client'
import { localMailer } from '@/lib/adapters/mail/local'
import { MailRefused, MailUnsure, type Mail, type Mailer } from '@/lib/adapters/mail/port'
import { smtpMailer } from '@/lib/adapters/mail/smtp'
import type { OutboxMail } from '@/lib/contracts/mail'
import { payloads } from '@/lib/queue/payloads'
import { forgetMails } from '@/lib/services/mail/forget-mails'
import { postMail } from '@/lib/services/mail/post-mail'
import { mostAttempts, queueMail } from '@/lib/services/mail/queue-mail'
import { requeueLeft } from '@/lib/services/mail/requeue-left'
import { sendMail } from '@/lib/services/mail/send-mail'
import { startMailServer, type MailServer } from '../support/smtp'
import { call } from './support/call'
import { mailAgain, mailsTo, postQuestion, runMails, type Posting } from './support/mails'
import { newOwner, type Someone } from './support/people'
import { newEmail, useServer } from './support/server'

const server = useServer()
let owner: Someone
beforeAll(async () => {
  owner = await newOwner('Odo Larkspur')
})

/** The row as it is now. */
const again = (row: postgres.Row) => mailAgain(server.sql, row)
const post = (posting: Posting = {}) => postQuestion(server.sql, owner, posting)
const jobsOf = (id: string) => server.sql`select * from graphile_worker.jobs where key = ${`mail:${id}`}`

/** Runs what the queue has for now, as a worker does. */
const runQueue = (taskList: TaskList) =>
  runOnce({
    ...{ connectionString: server.url, noHandleSignals: true, taskList },
    logger: new Logger(() => () => {}),
  })

/** A way out that fails as told. */
const failing = (error: Error): Mailer => ({ repeatable: false, send: () => Promise.reject(error) })

/** A way out that takes a mail and has said nothing yet, as when the worker is killed here. */
function silent(repeatable: boolean) {
  let answer: () => void = () => {}
  let reached: (mail: Mail) => void = () => {}
  const reaching = new Promise<Mail>((resolve) => (reached = resolve))
  const answered = new Promise<void>((resolve) => (answer = resolve))
  const send = async (mail: Mail) => {
    reached(mail)
    await answered
  }
  return { mailer: { repeatable, send }, reaching, answer: () => answer() }
}

describe('the outbox', () => {
  it('a letter whose transaction is rolled back is never there, and neither is its job', async () => {
    const key = randomUUID()
    const jobs = await server.sql`select count(*) from graphile_worker.jobs`
    const failed = write(async (tx) => {
      await postMail(tx, {
        template: 'question-copy',
        to: { email: newEmail(), name: 'D', userId: null },
        data: { workshop: 'L', question: 'Q' },
        ...{ key, workshopId: null },
      })
      throw new Error('What caused it did not happen.')
    })
    await expect(failed).rejects.toThrow('did not happen')
    expect(await server.sql`select 1 from mails where key = ${key}`).toHaveLength(0)
    expect(await server.sql`select count(*) from graphile_worker.jobs`).toEqual(jobs)
  })

  it('the same cause twice, and by five at once, is one mail and one job', async () => {
    const key = randomUUID()
    const email = newEmail()
    await Promise.all([1, 2, 3, 4, 5].map(() => post({ key, email })))
    const row = await post({ key, email })
    expect(await jobsOf(row.id)).toHaveLength(1)
    expect(await mailsTo(server.sql, email)).toHaveLength(1)
  })

  it('refuses what its letter cannot be made of, before anything is written', async () => {
    await expect(post({ question: 'x'.repeat(4001) })).rejects.toThrow()
  })

  it('the queue sends it, and what it said is gone from the database', async () => {
    const email = newEmail()
    const row = await post({ email, question: 'Would a flat plane be better?' })
    await runQueue({ 'mail.send': (payload) => sendMail(payloads['mail.send'].parse(payload).mailId) })
    expect(await jobsOf(row.id)).toHaveLength(0)
    const [mail] = await mailsTo(server.sql, email)
    expect(mail.text).toContain('> Would a flat plane be better?')
    expect(mail.html).toContain('Would a flat plane be better?')
    expect(await again(row)).toMatchObject({
      ...{ state: 'sent', attempts: 1, data: null, unsubscribe_token: null, last_error: null },
      sent_at: expect.any(Date) as Date,
    })
  })

  it('no token that was in a mail stays in the database once it is sent', async () => {
    const row = await post({ to: owner })
    const { unsubscribe_token: token } = row
    await runMails(server.sql)
    const kept = JSON.stringify([
      await server.sql`select * from mails`,
      await server.sql`select * from unsubscribe_tokens`,
      await server.sql`select * from graphile_worker._private_jobs`,
    ])
    expect(kept).not.toContain('secret-of-the-link')
    expect(token).toMatch(/^[\w-]{32}$/)
    expect(kept).not.toContain(token)
  })
})

describe('sendMail()', () => {
  it('what stood in the way is kept and thrown, for the queue to try again after a wait', async () => {
    const row = await post()
    await server.sql`delete from graphile_worker._private_jobs`
    await write((tx) => queueMail(tx, row.id))
    await runQueue({ 'mail.send': () => sendMail(row.id, failing(new Error('451 Come back later'))) })
    expect(await again(row)).toMatchObject({
      state: 'waiting',
      attempts: 1,
      last_error: '451 Come back later',
    })
    const [job] = await jobsOf(row.id)
    expect(job.attempts).toBe(1)
    expect(job.run_at.getTime()).toBeGreaterThan(Date.now())
    await sendMail(row.id)
    expect(await again(row)).toMatchObject({ state: 'sent', attempts: 2, last_error: null })
  })

  it(`gives up after ${mostAttempts} attempts and says why`, async () => {
    const row = await post()
    const down = failing(new Error('No route to the mail server'))
    for (let attempt = 1; attempt < mostAttempts; attempt++) {
      await expect(sendMail(row.id, down)).rejects.toThrow('No route')
    }
    await sendMail(row.id, down)
    expect(await again(row)).toMatchObject({
      ...{ state: 'failed', attempts: mostAttempts, last_error: 'No route to the mail server' },
    })
    await sendMail(row.id)
    expect((await again(row)).state).toBe('failed')
  })

  it('one that still waits after a day is given to the queue again', async () => {
    const row = await post()
    await server.sql`delete from graphile_worker._private_jobs`
    await requeueLeft()
    expect(await jobsOf(row.id)).toHaveLength(0)
    await requeueLeft(new Date(Date.now() + 86_400_000 + 1000))
    expect(await jobsOf(row.id)).toHaveLength(1)
    await sendMail(row.id)
  })

  it('a refusal is not tried again', async () => {
    const row = await post()
    await sendMail(row.id, failing(new MailRefused('550 No such mailbox')))
    expect(await again(row)).toMatchObject({
      state: 'failed',
      attempts: 1,
      last_error: '550 No such mailbox',
    })
  })

  it('one that may have gone is not tried again either', async () => {
    const row = await post()
    await sendMail(row.id, failing(new MailUnsure('No answer')))
    expect(await again(row)).toMatchObject({ state: 'unsure', last_error: 'No answer' })
    await sendMail(row.id)
    expect((await again(row)).state).toBe('unsure')
  })

  it('what leads nowhere any more is not sent', async () => {
    const row = await post()
    await server.sql`update mails set ends_at = now() where id = ${row.id}`
    await sendMail(row.id)
    expect(await again(row)).toMatchObject({ state: 'failed', data: null })
  })

  it('killed between handing over and writing down, the mail server’s mail is sent at most once', async () => {
    const row = await post()
    const killed = silent(false)
    const first = sendMail(row.id, killed.mailer)
    await killed.reaching
    expect((await again(row)).state).toBe('sending')
    await sendMail(row.id, failing(new Error('must not be asked')))
    expect(await again(row)).toMatchObject({
      ...{ state: 'unsure', attempts: 1, last_error: expect.stringContaining('may have arrived') as string },
    })
    // it was not dead after all: then what it knows counts
    killed.answer()
    await first
    expect(await again(row)).toMatchObject({ state: 'sent', data: null })
  })

  it('killed there, a mail of which the other side knows the key is handed over again: once in effect', async () => {
    const email = newEmail()
    const row = await post({ email })
    const killed = silent(true)
    const first = sendMail(row.id, killed.mailer)
    const mail = await killed.reaching
    await localMailer.send(mail)
    await sendMail(row.id)
    expect(await again(row)).toMatchObject({ state: 'sent', attempts: 2 })
    expect(await mailsTo(server.sql, email)).toHaveLength(1)
    killed.answer()
    await first
    expect(await again(row)).toMatchObject({ state: 'sent', attempts: 2 })
  })

  it('the local post keeps a mail once, whole, by however many it is handed over', async () => {
    const row = await post()
    const { mailer, reaching, answer } = silent(true)
    const sending = sendMail(row.id, mailer)
    const mail = await reaching
    await Promise.all([1, 2, 3].map(() => localMailer.send(mail)))
    await localMailer.send({ ...mail, text: 'Written over' })
    const folder = join(server.dataFolder, 'mail')
    expect(existsSync(join(folder, `${row.id}.json`))).toBe(true)
    expect(readdirSync(folder).filter((name) => name.includes(row.id))).toHaveLength(1)
    answer()
    await sending
  })
})

describe('through a mail server', () => {
  let post25: MailServer
  let mailer: Mailer
  beforeAll(async () => {
    post25 = await startMailServer()
    mailer = smtpMailer({
      ...{ by: 'smtp', from: { name: 'Larkspur', email: 'post@larkspur.example' }, tls: false },
      ...{ host: '127.0.0.1', port: Number(new URL(post25.url).port), user: '', password: '' },
    })
  })
  afterAll(() => post25.close())

  it('arrives once with its Message-ID, and a worker that finds it held leaves it at that', async () => {
    const row = await post()
    const held = post25.hold()
    const sending = sendMail(row.id, mailer)
    expect((await held.reached).messageId).toBe(row.message_id)
    await sendMail(row.id, mailer)
    expect((await again(row)).state).toBe('unsure')
    held.release()
    await sending
    expect((await again(row)).state).toBe('sent')
    expect(post25.received.filter(({ messageId }) => messageId === row.message_id)).toHaveLength(1)
  })

  it('is refused, put off or cut off: shown, tried again, unsure', async () => {
    const [refused, later, cut] = [await post(), await post(), await post()]
    post25.refuse(550, 'No such mailbox')
    await sendMail(refused.id, mailer)
    expect(await again(refused)).toMatchObject({
      ...{ state: 'failed', last_error: expect.stringContaining('No such mailbox') as string },
    })
    post25.refuse(451, 'Come back later')
    await expect(sendMail(later.id, mailer)).rejects.toThrow('Come back later')
    await sendMail(later.id, mailer)
    expect(await again(later)).toMatchObject({ state: 'sent', attempts: 2 })
    post25.drop()
    await sendMail(cut.id, mailer)
    expect((await again(cut)).state).toBe('unsure')
  })
})

describe('the owner’s outbox', () => {
  const list = async (query = '', cookie = owner.cookie) => {
    const { body } = await call('GET', `/api/v1/mails?${query}`, { cookie })
    return body as { mails: OutboxMail[]; next: string | null }
  }
  const resend = (id: string, cookie = owner.cookie) => call('POST', `/api/v1/mails/${id}/resend`, { cookie })

  it('GET /mails shows whom a mail is for and how it went, not what it says', async () => {
    const row = await post({ question: 'Nobody else’s business' })
    await sendMail(row.id, failing(new MailRefused('550 No such mailbox')))
    const answer = await list('limit=100')
    expect(answer.mails.find(({ id }) => id === row.id)).toEqual({
      ...{
        id: row.id,
        letter: 'question-copy',
        to: `Delphine (${row.to_email})`,
        state: 'failed',
        attempts: 1,
      },
      ...{
        lastError: '550 No such mailbox',
        createdAt: row.created_at.toISOString(),
        sentAt: null,
        again: true,
      },
    })
    expect(JSON.stringify(answer)).not.toContain('business')
  })

  it('GET /mails leaves out what is sent unless asked, and goes on where a page ended', async () => {
    const someone = await newOwner()
    await server.sql`update mails set workshop_id = ${someone.workshopId} where state = 'sent'`
    expect((await list('', someone.cookie)).mails).toEqual([])
    const all = await list('show=all&limit=100', someone.cookie)
    expect(all.mails.length).toBeGreaterThan(3)
    const pages: OutboxMail[] = []
    let after: string | null = ''
    while (after !== null) {
      const page = await list(`show=all&limit=2${after && `&after=${after}`}`, someone.cookie)
      pages.push(...page.mails)
      after = page.next
    }
    expect(pages).toEqual(all.mails)
    expect((await call('GET', '/api/v1/mails?after=x', { cookie: owner.cookie })).status).toBe(400)
  })

  it('POST /mails/{id}/resend sends again what failed, once for two who ask at once, and is written down', async () => {
    const email = newEmail()
    const row = await post({ email })
    expect((await resend(row.id)).status).toBe(409)
    await sendMail(row.id, failing(new MailUnsure('No answer')))
    const answers = await Promise.all([resend(row.id), resend(row.id)])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
    expect(await mailsTo(server.sql, email)).toHaveLength(1)
    expect((await resend(row.id)).status).toBe(409)
    const [audited] = await server.sql`select * from audit_log where subject = ${`mail:${row.id}`}`
    expect(audited).toMatchObject({ operation: 'mail.resend', before: { state: 'unsure' } })
  })

  it('what a failed mail said is forgotten after a while, and then it cannot go again', async () => {
    const [row, ended] = [await post(), await post()]
    for (const { id } of [row, ended]) await sendMail(id, failing(new MailRefused('550')))
    await server.sql`update mails set ends_at = now() + interval '1 day' where id = ${ended.id}`
    const day = 86_400_000
    await forgetMails(new Date(Date.now() + 13 * day))
    expect((await again(row)).data).not.toBeNull()
    expect((await again(ended)).data).toBeNull()
    await forgetMails(new Date(Date.now() + 15 * day))
    expect((await again(row)).data).toBeNull()
    expect((await resend(row.id)).status).toBe(409)
  })
})
