import { sql } from 'drizzle-orm'
import { read, write } from '@/db/client'

/** A worker's connections carry its name; its lanes, which hold the jobs, are called after it. */
export const workerName = (id: string) => `counterthrow worker ${id}`
export const laneName = (worker: string, lane: number) => `${worker}.${lane}`

/** Lanes that hold jobs although no connection of their worker is there. */
export async function missingLanes(): Promise<string[]> {
  const rows = await read((tx) =>
    tx.execute<{ lane: string }>(sql`
      select distinct locked_by as lane from graphile_worker.jobs
      where locked_by is not null and split_part(locked_by, '.', 1) not in (
        select application_name from pg_stat_activity where datname = current_database())`),
  )
  return rows.map(({ lane }) => lane)
}

/** Lets other workers have the jobs that these lanes hold. */
export const freeLanes = (lanes: readonly string[]) =>
  write((tx) =>
    tx.execute(sql`
      select graphile_worker.force_unlock_workers(array(
        select jsonb_array_elements_text(${JSON.stringify(lanes)}::jsonb)))`),
  )

/**
 * To be called every so often: frees what is held by workers that were missing now and the time before, so that one which
 * is only connecting anew keeps its jobs.
 */
export function createReaper() {
  let before: string[] = []
  return async () => {
    const missing = await missingLanes()
    const dead = missing.filter((lane) => before.includes(lane))
    if (dead.length > 0) await freeLanes(dead)
    before = missing
  }
}
