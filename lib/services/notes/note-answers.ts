import type { EventRow, NoteRow, PostRow } from '@/db/queries/notes'
import type { Note, NoteEvent, NotePost, NoteStanding, NoteSummary, Writer } from '@/lib/contracts/notes'
import { findAnchor } from '@/scene/frame/find-anchor'
import type { Scene } from '@/scene/model/scene'
import { editableUntil, isOwn, mayDelete, maySettle, type Reader } from './reader'
import { storedAnchor, storedDrawing, storedEvent, storedMentions, storedSettled } from './stored'

/** The versions of a scene that its notes are pinned in, and the one they are looked at in. */
export interface Seen {
  version: number
  scenes: ReadonlyMap<number, Scene>
}

function standingIn({ version, scenes }: Seen, anchor: ReturnType<typeof storedAnchor>): NoteStanding {
  const [older, newer] = [scenes.get(anchor.version), scenes.get(version)]
  if (!older || !newer) throw new Error(`A version of the scene is missing: ${anchor.version} or ${version}.`)
  return findAnchor(anchor, older.train, newer.train)
}

function writer(by: { authorId: string | null; guestName: string | null }, name: string | null): Writer {
  return by.guestName === null
    ? { id: by.authorId, name: name ?? '', guest: false }
    : { id: null, name: by.guestName, guest: true }
}

export function noteSummary(
  { note, author, words, drawn }: NoteRow,
  reader: Reader,
  seen: Seen,
): NoteSummary {
  const anchor = storedAnchor(note.anchor)
  const settles = maySettle(reader, note)
  return {
    id: note.id,
    sceneId: note.sceneId,
    number: note.number,
    version: note.version,
    kind: note.kind,
    state: note.state,
    heading: note.heading,
    by: writer(note, author),
    at: note.createdAt.toISOString(),
    anchor,
    part: note.part,
    words,
    drawn,
    replies: note.posts - 1,
    lastPostAt: note.lastPostAt.toISOString(),
    settled: storedSettled(note.settled),
    revision: note.revision,
    own: isOwn(reader, note),
    maySettle: settles,
    mayChangeKind: settles,
    ...standingIn(seen, anchor),
  }
}

function postAnswer({ post, author }: PostRow, reader: Reader): NotePost {
  const gone = post.deletedAt !== null
  return {
    post: post.number,
    by: writer(post, author),
    at: post.createdAt.toISOString(),
    editedAt: post.editedAt?.toISOString() ?? null,
    deletedAt: post.deletedAt?.toISOString() ?? null,
    words: post.words,
    mentions: storedMentions(post.mentions).map(({ userId, name }) => ({ id: userId, name })),
    drawing: storedDrawing(post.drawing),
    revision: post.revision,
    own: isOwn(reader, post),
    editableUntil: gone ? null : (editableUntil(reader, post)?.toISOString() ?? null),
    mayDelete: !gone && mayDelete(reader, post),
  }
}

const eventAnswer = ({ event, by }: EventRow): NoteEvent => ({
  at: event.createdAt.toISOString(),
  by,
  what: storedEvent(event.what),
})

export const noteAnswer = (
  row: NoteRow,
  posts: readonly PostRow[],
  events: readonly EventRow[],
  reader: Reader,
  seen: Seen,
): Note => ({
  ...noteSummary(row, reader, seen),
  posts: posts.map((post) => postAnswer(post, reader)),
  events: events.map(eventAnswer),
})
