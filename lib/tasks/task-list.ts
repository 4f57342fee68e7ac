import type { TaskList } from 'graphile-worker'
import { readPayload, type TaskName } from '@/lib/queue/payloads'
import type { Tasks } from '.'

const reading =
  <Name extends TaskName>(name: Name, tasks: Pick<Tasks, Name>) =>
  (payload: unknown) =>
    tasks[name](readPayload(name, payload))

/** The tasks as the queue calls them. */
export const taskList = (tasks: Tasks): TaskList =>
  Object.fromEntries((Object.keys(tasks) as TaskName[]).map((name) => [name, reading(name, tasks)]))
