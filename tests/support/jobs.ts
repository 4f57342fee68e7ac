import { Logger, runOnce } from 'graphile-worker'
import { taskList } from '@/lib/tasks/task-list'
import { tasks, type Tasks } from '@/lib/tasks'

/** Carries out what waits in the queue and is due, until nothing is; as a worker would, in this process. */
export const runJobs = (databaseUrl: string, some: Partial<Tasks> = {}) =>
  runOnce({
    connectionString: databaseUrl,
    taskList: taskList({ ...tasks, ...some }),
    noHandleSignals: true,
    concurrency: 1,
    maxPoolSize: 2,
    logger: new Logger(() => () => {}),
  })
