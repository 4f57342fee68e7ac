import { sql } from 'drizzle-orm'
import type { Transaction } from '@/db/client'
import { readPayload, type PayloadOf, type TaskName } from './payloads'

/** Waiting grows with each attempt, e, e², e³ … seconds: the tenth comes some three and a half hours after the first. */
const mostAttempts = 10

interface JobOptions {
  /**
   * At most one job of a key waits. A second takes its place, with its own payload and time; one that is being run
   * already stays, and the second runs after it.
   */
  key?: string
  runAt?: Date
  maxAttempts?: number
}

/**
 * Has a worker carry out a task once the caller's transaction has committed, and never if it does not. A task may be run
 * more than once (its worker can die before it has said that it was done): what it does must be the same done twice.
 */
export async function addJob<Name extends TaskName>(
  tx: Transaction,
  task: Name,
  payload: PayloadOf<Name>,
  { key, runAt, maxAttempts = mostAttempts }: JobOptions = {},
): Promise<void> {
  const checked = JSON.stringify(readPayload(task, payload))
  await tx.execute(sql`
    select graphile_worker.add_job(
      identifier => ${task}::text, payload => ${checked}::json, run_at => ${runAt?.toISOString() ?? null}::timestamptz,
      max_attempts => ${maxAttempts}::integer, job_key => ${key ?? null}::text, job_key_mode => 'replace')`)
}
