import { closeDatabase } from '@/db/client'
import { config } from '@/lib/config'
import { runWorker } from '@/lib/queue/run-worker'
import { tasks } from '.'
import { schedule } from './schedule'
import { taskList } from './task-list'

/** The worker as a process of its own, beside the web server: says when it works, and ends when it is told to. */
async function main() {
  const worker = await runWorker({
    databaseUrl: config().databaseUrl,
    tasks: taskList(tasks),
    schedule,
    lanes: 2,
  })
  for (const name of ['SIGINT', 'SIGTERM'] as const) process.once(name, () => void worker.stop())
  // a start that is gone would leave it working for nobody
  process.once('disconnect', () => void worker.stop())
  process.send?.('working')
  await worker.ended
  await closeDatabase()
}

main().then(
  () => process.exit(0),
  (error: unknown) => {
    console.error(error)
    process.exit(1)
  },
)
