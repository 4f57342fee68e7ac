import { read } from '@/db/client'
import { authorsOfNotes, countNotes, pageOfNotes } from '@/db/queries/notes'
import { sceneById } from '@/db/queries/scenes'
import type { Person } from '@/lib/auth/access'
import { authorise } from '@/lib/auth/authorise'
import type { listNotes as contract, NoteCounts } from '@/lib/contracts/notes'
import type { AnswerOf, QueryOf } from '@/lib/contracts/operation'
import { notFound } from '@/lib/errors/problem'
import { noteSummary } from './note-answers'
import { seenIn } from './opened-notes'
import { readerOf } from './reader'

export async function listNotes(
  person: Person | null,
  sceneId: string,
  { after, limit, ...filter }: QueryOf<typeof contract>,
): Promise<AnswerOf<typeof contract>> {
  return read(async (tx) => {
    const scene = await sceneById(tx, sceneId)
    authorise(person, 'note.read', scene)
    const version = versionToSee(scene?.headVersion, filter.version)
    const rows = await pageOfNotes(tx, sceneId, version, filter, { after, limit })
    const shown = rows.slice(0, limit)
    const seen = await seenIn(tx, sceneId, version, shown)
    const reader = readerOf(person, scene?.workshopId ?? '')
    return {
      version,
      notes: shown.map((row) => noteSummary(row, reader, seen)),
      counts: countsOf(await countNotes(tx, sceneId, version, filter)),
      authors: authors(await authorsOfNotes(tx, sceneId)),
      next: rows.length > limit ? (shown.at(-1)?.note.number ?? null) : null,
    }
  })
}

/** The one asked for, or the head. */
export function versionToSee(head: number | undefined, asked: number | undefined): number {
  const version = asked ?? head
  if (head === undefined || version === undefined || version > head) throw notFound('version')
  return version
}

function countsOf(counts: Awaited<ReturnType<typeof countNotes>>): NoteCounts {
  const { all, open, settled, openErrors, ...kinds } = counts
  return { all, open, settled, openErrors, kinds }
}

const authors = (rows: Awaited<ReturnType<typeof authorsOfNotes>>) =>
  rows.map(({ id, name }) =>
    id === null ? { id: 'guest' as const, name: 'Guests' } : { id, name: name ?? '' },
  )
