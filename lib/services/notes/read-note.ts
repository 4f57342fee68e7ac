import { read } from '@/db/client'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { Note } from '@/lib/contracts/notes'
import { versionToSee } from './list-notes'
import { openedNote } from './opened-notes'
import { readerOf } from './reader'

/** A note with its thread, as it stands in the version asked for, or in the head. */
export const readNote = (
  person: Person | null,
  sceneId: string,
  number: number,
  version?: number,
): Promise<Note> =>
  read(async (tx) => {
    const scene = await sceneById(tx, sceneId)
    authorise(person, 'note.read', scene)
    const seen = versionToSee(scene?.headVersion, version)
    return openedNote(tx, readerOf(person, scene?.workshopId ?? ''), sceneId, number, seen)
  })
