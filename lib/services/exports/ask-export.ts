import { write } from '@/db/client'
import { versionOf } from '@/db/queries/scene-versions'
import { sceneById } from '@/db/queries/scenes'
import { exportFiles } from '@/db/schema'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { ExportAnswer, Wanted } from '@/lib/contracts/exports'
import { notFound } from '@/lib/errors/problem'
import { addJob } from '@/lib/queue/add-job'
import { audit } from '../audit'
import { exportAnswer } from './export-answer'
import { exportRight } from './kinds'

const keptMs = 7 * 86_400_000

/** Puts a wish for a file down; a worker makes it. */
export async function askExport(person: Person, wanted: Wanted): Promise<ExportAnswer> {
  return write(async (tx) => {
    const scene = await sceneById(tx, wanted.sceneId)
    authorise(person, exportRight[wanted.kind], scene)
    if (!scene || !(await versionOf(tx, wanted.sceneId, wanted.version))) throw notFound('version')
    const { workshopId } = scene
    const [row] = await tx
      .insert(exportFiles)
      .values({ workshopId, userId: person.id, wanted, endsAt: new Date(Date.now() + keptMs) })
      .returning()
    await addJob(tx, 'export.make', { exportId: row.id }, { key: `export:${row.id}` })
    await audit(tx, {
      actorId: person.id,
      workshopId,
      operation: 'export.ask',
      subject: `scene:${wanted.sceneId}`,
      after: { kind: wanted.kind, version: wanted.version },
    })
    return exportAnswer(row)
  })
}
