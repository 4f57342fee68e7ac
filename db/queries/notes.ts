import { and, asc, count, eq, gt, inArray, isNotNull, lte, sql, type SQL } from 'drizzle-orm'
import type { NoteFilter } from '@/lib/contracts/notes'
import type { Transaction } from '../client'
import { memberships, noteEvents, notePosts, notes, users } from '../schema'

const row = {
  note: notes,
  author: users.name,
  words: notePosts.words,
  drawn: sql<boolean>`${notePosts.drawing} is not null`,
}

/** Notes with their authors and their first posts. */
const withFirst = (tx: Transaction) =>
  tx
    .select(row)
    .from(notes)
    .innerJoin(notePosts, and(eq(notePosts.noteId, notes.id), eq(notePosts.number, 1)))
    .leftJoin(users, eq(users.id, notes.authorId))
    .$dynamic()

export type NoteRow = Awaited<ReturnType<typeof withFirst>>[number]

/** Made on versions up to `version`, and as asked for. */
function matching(sceneId: string, version: number, filter: NoteFilter): SQL | undefined {
  const { madeOn, state, kind, author, part } = filter
  return and(
    eq(notes.sceneId, sceneId),
    lte(notes.version, version),
    madeOn === undefined ? undefined : eq(notes.version, madeOn),
    state && eq(notes.state, state),
    kind && eq(notes.kind, kind),
    part === undefined ? undefined : eq(notes.partId, part),
    author === undefined
      ? undefined
      : author === 'guest'
        ? isNotNull(notes.guestName)
        : eq(notes.authorId, author),
  )
}

/** By number; `after` is the number where the last page ended. */
export const pageOfNotes = (
  tx: Transaction,
  sceneId: string,
  version: number,
  filter: NoteFilter,
  { after = 0, limit }: { after?: number; limit: number },
) =>
  withFirst(tx)
    .where(and(matching(sceneId, version, filter), gt(notes.number, after)))
    .orderBy(asc(notes.number))
    .limit(limit + 1)

export async function countNotes(tx: Transaction, sceneId: string, version: number, filter: NoteFilter) {
  const where = (condition: SQL) => sql<number>`count(*) filter (where ${condition})`.mapWith(Number)
  const ofKind = (kind: (typeof notes.kind.enumValues)[number]) => where(eq(notes.kind, kind))
  const [counts] = await tx
    .select({
      all: count(),
      open: where(eq(notes.state, 'open')),
      settled: where(eq(notes.state, 'settled')),
      error: ofKind('error'),
      question: ofKind('question'),
      suggestion: ofKind('suggestion'),
      remark: ofKind('remark'),
      openErrors: where(sql`${notes.kind} = 'error' and ${notes.state} = 'open'`),
    })
    .from(notes)
    .where(matching(sceneId, version, filter))
  return counts
}

/** Everybody who has made a note in the scene, and whether a guest has. */
export const authorsOfNotes = (tx: Transaction, sceneId: string) =>
  tx
    .selectDistinct({ id: notes.authorId, name: users.name })
    .from(notes)
    .leftJoin(users, eq(users.id, notes.authorId))
    .where(eq(notes.sceneId, sceneId))
    .orderBy(asc(users.name))

export async function noteByNumber(tx: Transaction, sceneId: string, number: number) {
  const [found] = await withFirst(tx).where(and(eq(notes.sceneId, sceneId), eq(notes.number, number)))
  return found
}

/** Held until the transaction ends: of two that change it at once the second waits, and then sees what the first did. */
export async function lockNote(tx: Transaction, sceneId: string, number: number) {
  const [note] = await tx
    .select()
    .from(notes)
    .where(and(eq(notes.sceneId, sceneId), eq(notes.number, number)))
    .for('update')
  return note
}

/** Notes made through one link, in the order they were made in. */
export const notesOfLink = (tx: Transaction, linkId: string, after: number, limit: number) =>
  tx
    .select()
    .from(notes)
    .where(eq(notes.linkId, linkId))
    .orderBy(asc(notes.number))
    .offset(after)
    .limit(limit)

export async function countOfLink(tx: Transaction, linkId: string) {
  const [{ made }] = await tx.select({ made: count() }).from(notes).where(eq(notes.linkId, linkId))
  return made
}

/** The next number of the scene, which must be held. */
export async function nextNumber(tx: Transaction, sceneId: string) {
  const [{ next }] = await tx
    .select({ next: sql<number>`coalesce(max(${notes.number}), 0) + 1`.mapWith(Number) })
    .from(notes)
    .where(eq(notes.sceneId, sceneId))
  return next
}

export const postsOf = (tx: Transaction, noteIds: string[]) =>
  tx
    .select({ post: notePosts, author: users.name })
    .from(notePosts)
    .leftJoin(users, eq(users.id, notePosts.authorId))
    .where(inArray(notePosts.noteId, noteIds))
    .orderBy(asc(notePosts.noteId), asc(notePosts.number))
export type PostRow = Awaited<ReturnType<typeof postsOf>>[number]

export async function postByNumber(tx: Transaction, noteId: string, number: number) {
  const [post] = await tx
    .select()
    .from(notePosts)
    .where(and(eq(notePosts.noteId, noteId), eq(notePosts.number, number)))
  return post
}

export const eventsOf = (tx: Transaction, noteIds: string[]) =>
  tx
    .select({ event: noteEvents, by: users.name })
    .from(noteEvents)
    .innerJoin(users, eq(users.id, noteEvents.actorId))
    .where(inArray(noteEvents.noteId, noteIds))
    .orderBy(asc(noteEvents.noteId), asc(noteEvents.id))
export type EventRow = Awaited<ReturnType<typeof eventsOf>>[number]

/** Numbers of open errors made on versions up to this one. */
export async function openErrorNumbers(tx: Transaction, sceneId: string, version: number): Promise<number[]> {
  const rows = await tx
    .select({ number: notes.number })
    .from(notes)
    .where(
      and(
        eq(notes.sceneId, sceneId),
        lte(notes.version, version),
        sql`${notes.kind} = 'error' and ${notes.state} = 'open'`,
      ),
    )
    .orderBy(asc(notes.number))
  return rows.map(({ number }) => number)
}

/** Those of these people who belong to the workshop. */
export const membersAmong = (tx: Transaction, workshopId: string, userIds: string[]) =>
  tx
    .select({ id: users.id, name: users.name, role: memberships.role })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.workshopId, workshopId), inArray(memberships.userId, userIds)))
