import { read } from '@/db/client'
import { pageOfNotes } from '@/db/queries/notes'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { Note, NoteFilter } from '@/lib/contracts/notes'
import { Problem } from '@/lib/errors/problem'
import { versionToSee } from './list-notes'
import { openedNotes } from './opened-notes'
import { readerOf } from './reader'

export interface ExportedNotes {
  scene: string
  workshop: string
  /** The version that they are looked at in. */
  version: number
  notes: Note[]
}

/** What one file can hold. */
const mostExported = 2_000

/** All notes that match, with their threads, always in the order of their numbers. */
export const exportedNotes = (
  person: Person | null,
  sceneId: string,
  filter: NoteFilter,
): Promise<ExportedNotes> =>
  read(async (tx) => {
    const scene = await sceneById(tx, sceneId)
    authorise(person, 'note.read', scene)
    const version = versionToSee(scene?.headVersion, filter.version)
    const rows = await pageOfNotes(tx, sceneId, version, filter, { limit: mostExported })
    if (rows.length > mostExported) {
      throw new Problem(
        'refused',
        `More than ${mostExported.toLocaleString('en')} notes match, and a file holds no more.`,
        'Narrow them down by state, kind, author or part.',
      )
    }
    const reader = readerOf(person, scene?.workshopId ?? '')
    return {
      scene: scene?.title ?? '',
      workshop: person.memberships.find((each) => each.workshopId === scene?.workshopId)?.workshopName ?? '',
      version,
      notes: await openedNotes(tx, sceneId, version, rows, reader),
    }
  })
