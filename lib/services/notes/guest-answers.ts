import type { Transaction } from '@/db/client'
import { postsOf, type PostRow } from '@/db/queries/notes'
import type { GuestNote } from '@/lib/contracts/guest-notes'
import type { LockedNote } from './note-at-hand'
import { storedAnchor, storedDrawing, storedMentions } from './stored'

/** Notes of one link as its holder sees them; `first` is the place of the first among those of the link. */
export async function guestNotes(
  tx: Transaction,
  notes: readonly LockedNote[],
  first: number,
): Promise<GuestNote[]> {
  if (notes.length === 0) return []
  const posts = await postsOf(
    tx,
    notes.map(({ id }) => id),
  )
  return notes.map((note, index) => ({
    id: note.id,
    number: first + index,
    version: note.version,
    kind: note.kind,
    state: note.state,
    heading: note.heading,
    anchor: storedAnchor(note.anchor),
    part: note.part,
    posts: posts.filter(({ post }) => post.noteId === note.id).map(guestPost),
  }))
}

const guestPost = ({ post, author }: PostRow): GuestNote['posts'][number] => ({
  post: post.number,
  by: post.guestName ?? author ?? '',
  guest: post.guestName !== null,
  at: post.createdAt.toISOString(),
  edited: post.editedAt !== null,
  deleted: post.deletedAt !== null,
  words: withoutNames(
    post.words,
    storedMentions(post.mentions).map(({ name }) => name),
  ),
  drawing: storedDrawing(post.drawing),
})

/** Who was named in a reply is the workshop's own business. */
export const withoutNames = (words: string, names: readonly string[]) =>
  [...names]
    .sort((one, other) => other.length - one.length)
    .reduce((text, name) => text.replaceAll(`@${name}`, '@colleague'), words)
