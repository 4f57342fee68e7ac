import { read } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import { versionOf } from '@/db/queries/scene-versions'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { OpenedScene } from '@/lib/contracts/scenes'
import { notFound } from '@/lib/errors/problem'
import { saveVersion } from './save-version'

/** A new version on top of the head whose document is that of an older one. A draft is something else, and stays. */
export async function restoreVersion(
  person: Person | null,
  id: string,
  number: number,
  { base, message }: { base: number; message: string },
  key?: string,
): Promise<OpenedScene> {
  const older = await read(async (tx) => {
    authorise(person, 'scene.save', await sceneById(tx, id))
    return versionOf(tx, id, number)
  })
  if (!older) throw notFound('version')
  const why = message ? `: ${message}` : ''
  const save = { base, message: `Restored from version ${number}${why}`, document: older.document }
  return saveVersion(person, id, save, key, 'left')
}
