import { EventEmitter, once } from 'node:events'
import { beforeEach, describe, expect, it } from 'vitest'
import { write } from '@/db/client'
import { addJob } from '@/lib/queue/add-job'
import { createReaper, laneName, missingLanes, workerName } from '@/lib/queue/dead-workers'
import { payloads } from '@/lib/queue/payloads'
import { runWorker } from '@/lib/queue/run-worker'
import { tasks } from '@/lib/tasks'
import { taskList } from '@/lib/tasks/task-list'
import { runJobs } from '../support/jobs'
import { useServer } from './support/server'

const server = useServer()
const mailId = '0190b3f0-0000-7000-8000-00000000000a'
const otherId = '0190b3f0-0000-7000-8000-00000000000b'

const jobs =
  () => server.sql`select key, payload, run_at, attempts, max_attempts, locked_by from graphile_worker._private_jobs as jobs
  join graphile_worker._private_tasks as tasks on tasks.id = jobs.task_id order by jobs.id`

beforeEach(() => server.sql`delete from graphile_worker._private_jobs`)

describe('addJob()', () => {
  it('addJob() is part of its transaction: there when that commits, never there when it does not', async () => {
    const given = write(async (tx) => {
      await addJob(tx, 'mail.send', { mailId })
      throw new Error('changed my mind')
    })
    await expect(given).rejects.toThrow('changed my mind')
    expect(await jobs()).toEqual([])
    await write((tx) => addJob(tx, 'mail.send', { mailId }))
    expect(await jobs()).toMatchObject([{ payload: { mailId }, max_attempts: 10 }])
  })

  it('addJob() of a key that waits replaces what waits, with its time', async () => {
    const [first, second] = [new Date('2999-01-01'), new Date('2998-01-01')]
    await write((tx) => addJob(tx, 'mail.send', { mailId }, { key: 'one', runAt: first }))
    await write((tx) =>
      addJob(tx, 'mail.send', { mailId: otherId }, { key: 'one', runAt: second, maxAttempts: 3 }),
    )
    expect(await jobs()).toMatchObject([
      { key: 'one', payload: { mailId: otherId }, run_at: second, max_attempts: 3 },
    ])
  })

  it('addJob() of a key that is being run puts a second behind it', async () => {
    await write((tx) => addJob(tx, 'mail.send', { mailId }, { key: 'one' }))
    const ran: string[] = []
    const send = async ({ mailId: id }: { mailId: string }) => {
      ran.push(id)
      if (ran.length === 1) await write((tx) => addJob(tx, 'mail.send', { mailId: otherId }, { key: 'one' }))
    }
    await runJobs(server.url, { 'mail.send': send })
    expect(ran).toEqual([mailId, otherId])
    expect(await jobs()).toEqual([])
  })

  it('addJob() refuses a payload that is not the task’s', async () => {
    await expect(write((tx) => addJob(tx, 'mail.send', { mailId: 'none' }))).rejects.toThrow('UUID')
  })
})

describe('the tasks', () => {
  it('every name of the queue has a task, and no task is without one', () => {
    expect(Object.keys(tasks).sort()).toEqual(Object.keys(payloads).sort())
  })

  it('a job whose payload cannot be read fails, is kept with the reason and is tried again later', async () => {
    await server.sql`select graphile_worker.add_job('mail.send', '{"mailId": 7}'::json)`
    await runJobs(server.url, { 'mail.send': () => Promise.reject(new Error('never asked')) })
    const [row] =
      await server.sql`select attempts, last_error, run_at > now() as later from graphile_worker._private_jobs`
    expect(row).toMatchObject({ attempts: 1, later: true })
    expect(row.last_error).toContain('mailId')
  })
})

describe('a worker that has died', () => {
  const locked = async (lane: string) => {
    await write((tx) => addJob(tx, 'mail.send', { mailId }))
    await server.sql`update graphile_worker._private_jobs set locked_by = ${lane}, locked_at = now(), attempts = 1`
  }
  const holders = async () => (await jobs()).map(({ locked_by }) => locked_by as string | null)

  it('loses its jobs when it is missing twice, and not while it only connects anew', async () => {
    const lane = laneName(workerName('gone'), 1)
    await locked(lane)
    const reap = createReaper()
    await reap()
    expect(await missingLanes()).toEqual([lane])
    expect(await holders()).toEqual([lane])
    await reap()
    expect(await holders()).toEqual([null])
  })

  it('keeps its jobs as long as a connection of its name is there', async () => {
    const [entered, leave] = [new EventEmitter(), new EventEmitter()]
    const [hasEntered, mayLeave] = [once(entered, 'now'), once(leave, 'now')]
    const ran: string[] = []
    const list = taskList({
      ...tasks,
      'mail.send': async ({ mailId: id }) => {
        ran.push(id)
        entered.emit('now')
        await mayLeave
      },
    })
    const worker = await runWorker({ databaseUrl: server.url, tasks: list, schedule: [], lanes: 1 })
    await write((tx) => addJob(tx, 'mail.send', { mailId }))
    await hasEntered
    const reap = createReaper()
    await reap()
    await reap()
    expect(await holders()).toEqual([laneName(worker.name, 1)])
    leave.emit('now')
    await expect.poll(jobs).toEqual([])
    await worker.stop()
    expect(ran).toEqual([mailId])
  })
})
