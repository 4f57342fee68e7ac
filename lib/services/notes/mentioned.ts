import type { Transaction } from '@/db/client'
import { membersAmong } from '@/db/queries/notes'
import { holds } from '@/lib/auth/access'
import { refused } from '@/lib/errors/problem'
import { postMention } from '../mail/post-mention'
import type { Mention } from './stored'

/** The people named, by their names of now; refused where one cannot read the note. */
export async function mentioned(
  tx: Transaction,
  workshopId: string,
  userIds: readonly string[],
): Promise<Mention[]> {
  const wanted = [...new Set(userIds)]
  if (wanted.length === 0) return []
  const members = await membersAmong(tx, workshopId, wanted)
  const readers = members.filter(({ role }) => holds(role, 'note.read'))
  const issues = userIds.flatMap((userId, index) => {
    if (readers.some(({ id }) => id === userId)) return []
    const message = 'This person does not belong to the workshop.'
    return [
      {
        path: `mentions.${index}`,
        code: 'unknown-person',
        message,
        fix: 'Name one of its people, or nobody.',
      },
    ]
  })
  if (issues.length > 0) throw refused(issues)
  return wanted.map((userId) => ({ userId, name: readers.find(({ id }) => id === userId)!.name }))
}

interface Post {
  sceneId: string
  noteId: string
  postId: string
  /** Nobody is told of what they wrote themselves. */
  authorId: string
}

/** Lets those named know, in the same transaction. */
export async function tellMentioned(
  tx: Transaction,
  mentions: readonly Mention[],
  post: Post,
): Promise<void> {
  const { authorId, ...place } = post
  for (const { userId } of mentions) if (userId !== authorId) await postMention(tx, { ...place, userId })
}
