import type { CronItem } from 'graphile-worker'
import type { TaskName } from '@/lib/queue/payloads'

const nightly = (task: TaskName, minute: number): CronItem => ({ task, match: `${minute} 2 * * *` })

/** What is done every night without being asked, in UTC, once however many workers there are. */
export const schedule: CronItem[] = [nightly('expired.clean', 10), nightly('openings.erase', 20)]
