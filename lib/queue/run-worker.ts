import { randomBytes } from 'node:crypto'
import { Logger, parseCronItems, run, type CronItem, type TaskList } from 'graphile-worker'
import { createReaper, laneName, workerName } from './dead-workers'

interface WorkerOptions {
  databaseUrl: string
  tasks: TaskList
  schedule: CronItem[]
  lanes: number
}

export interface Worker {
  name: string
  /** Settles when the worker has ended, by itself or stopped. */
  ended: Promise<void>
  stop(): Promise<void>
}

const reapEvery = 30_000
const told = new Set(['error', 'warning'])

const logger = new Logger(() => (level, message) => {
  if (told.has(level)) console.error(`worker: ${message}`)
})

/** A peer that is gone without a word is noticed by the server within a minute. */
const keepAlive = '-c tcp_keepalives_idle=30 -c tcp_keepalives_interval=10 -c tcp_keepalives_count=3'

/** Runs jobs, as many at a time as it has lanes, and frees those of workers that have died. */
export async function runWorker({ databaseUrl, tasks, schedule, lanes }: WorkerOptions): Promise<Worker> {
  const name = workerName(randomBytes(6).toString('hex'))
  const address = new URL(databaseUrl)
  address.searchParams.set('application_name', name)
  address.searchParams.set('options', keepAlive)
  const runLane = (lane: number) => {
    const options = {
      connectionString: address.href,
      workerId: laneName(name, lane),
      concurrency: 1,
      maxPoolSize: 3,
      noHandleSignals: true,
      taskList: tasks,
      parsedCronItems: parseCronItems(lane === 1 ? schedule : []),
      logger,
    }
    return run(options)
  }
  const runners = await Promise.all(Array.from({ length: lanes }, (_, index) => runLane(index + 1)))
  const reap = createReaper()
  const reaping = () => reap().catch((error: unknown) => console.error('worker:', error))
  void reaping()
  const timer = setInterval(reaping, reapEvery)
  const ended = Promise.all(runners.map(({ promise }) => promise)).then(() => clearInterval(timer))
  return {
    name,
    ended,
    stop: async () => {
      clearInterval(timer)
      await Promise.all(runners.map((runner) => runner.stop()))
    },
  }
}
