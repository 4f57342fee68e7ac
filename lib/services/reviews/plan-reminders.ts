import type { Transaction } from '@/db/client'
import { addJob } from '@/lib/queue/add-job'

export const reminders = ['before', 'due'] as const
export type Reminder = (typeof reminders)[number]

/** Early on the day before and on the day itself, in universal time: morning or night is everybody's own. */
const hour = 'T06:00:00Z'
const dayMs = 86_400_000

export function reminderTimes(due: string): Record<Reminder, Date> {
  const day = new Date(due + hour)
  return { before: new Date(day.getTime() - dayMs), due: day }
}

/** Reminders that still lie ahead. What has been answered by then is not reminded of: the task looks again. */
export async function planReminders(tx: Transaction, requestId: string, due: string, now: Date) {
  const times = reminderTimes(due)
  for (const reminder of reminders) {
    if (times[reminder] <= now) continue
    const key = `review:${requestId}:${reminder}`
    await addJob(tx, 'review.remind', { requestId, reminder }, { key, runAt: times[reminder] })
  }
}
