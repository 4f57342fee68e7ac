import { and, eq } from 'drizzle-orm'
import { read, write } from '@/db/client'
import { exportById } from '@/db/queries/exports'
import { userById } from '@/db/queries/users'
import { exportFiles } from '@/db/schema'
import { personOfUser } from '@/lib/auth/person'
import { wantedSchema } from '@/lib/contracts/exports'
import { Problem } from '@/lib/errors/problem'
import { makeFile, type MadeFile } from './kinds'

type Outcome = (MadeFile & { state: 'made' }) | { state: 'failed'; reason: string }

/** Makes what an export waits for. Done twice, the second finds it made and does nothing. */
export async function makeExport(id: string): Promise<void> {
  const found = await read(async (tx) => {
    const row = await exportById(tx, id)
    const user = row?.state === 'waiting' ? await userById(tx, row.userId) : undefined
    return row && user && { wanted: wantedSchema.parse(row.wanted), person: await personOfUser(tx, user) }
  })
  if (!found) return
  const outcome = await makeFile(found.person, found.wanted).then(
    (made): Outcome => ({ state: 'made', ...made }),
    (error: unknown): Outcome => {
      // what a person can be told is settled; anything else the queue tries again
      if (error instanceof Problem && error.status < 500) return { state: 'failed', reason: error.message }
      throw error
    },
  )
  await write((tx) =>
    tx
      .update(exportFiles)
      .set(outcome)
      .where(and(eq(exportFiles.id, id), eq(exportFiles.state, 'waiting'))),
  )
}
