import { and, asc, desc, eq, inArray, isNull } from 'drizzle-orm'
import { z } from 'zod'
import { write, type Transaction } from '@/db/client'
import { mails, memberships, mentions, notePosts, notes, scenes, users } from '@/db/schema'
import { holds } from '@/lib/auth/access'
import { config } from '@/lib/config'
import { gatherMs, queueDigest } from './post-mention'
import { postMail } from './post-mail'
import { wantsMail } from './wants-mail'

const mostInOne = 100
const template = 'mention-digest'

/**
 * Tells somebody in one mail where they were named since the last one. Left out is what has been deleted or no longer
 * names them, and what they may not read any more.
 */
export const sendDigest = (userId: string, now = new Date()): Promise<void> =>
  write(async (tx) => {
    const [reader] = await tx.select().from(users).where(eq(users.id, userId)).for('update')
    if (!reader) return
    const early = await tooEarly(tx, userId, now)
    if (early) return queueDigest(tx, userId, early)
    const waiting = await waitingMentions(tx, userId)
    if (waiting.length === 0) return
    const ids = waiting.map(({ id }) => id)
    await tx.update(mentions).set({ toldAt: now }).where(inArray(mentions.id, ids))
    if (waiting.length === mostInOne) await queueDigest(tx, userId, new Date(now.getTime() + gatherMs))

    const telling = waiting.filter((row) => stillTold(row, userId))
    if (telling.length === 0 || !(await wantsMail(tx, { template, userId, workshopId: null }))) return
    const [workshopId, ...others] = new Set(telling.map((row) => row.workshopId))
    await postMail(tx, {
      template,
      to: { email: reader.email, name: reader.name, userId },
      data: {
        mentions: telling.map(({ sceneId, scene, number, version, words, by, guest }) => ({
          ...{ scene, number, words, by: by ?? `${guest ?? ''} (guest)` },
          url: `${config().origin}/scenes/${sceneId}/review?version=${version}&note=${number}`,
        })),
      },
      key: `digest:${ids[0]}`,
      workshopId: others.length > 0 ? null : workshopId,
    })
  })

/** When the next one may go, if the last is less than ten minutes ago. */
async function tooEarly(tx: Transaction, userId: string, now: Date): Promise<Date | null> {
  const [last] = await tx
    .select({ at: mails.createdAt })
    .from(mails)
    .where(and(eq(mails.userId, userId), eq(mails.template, template)))
    .orderBy(desc(mails.createdAt))
    .limit(1)
  const next = new Date((last?.at.getTime() ?? 0) + gatherMs)
  return next > now ? next : null
}

const waitingMentions = (tx: Transaction, userId: string) =>
  tx
    .select({
      id: mentions.id,
      sceneId: mentions.sceneId,
      scene: scenes.title,
      workshopId: scenes.workshopId,
      role: memberships.role,
      number: notes.number,
      version: notes.version,
      words: notePosts.words,
      named: notePosts.mentions,
      deletedAt: notePosts.deletedAt,
      by: users.name,
      guest: notePosts.guestName,
    })
    .from(mentions)
    .innerJoin(scenes, eq(scenes.id, mentions.sceneId))
    .innerJoin(notes, eq(notes.id, mentions.noteId))
    .innerJoin(notePosts, eq(notePosts.id, mentions.postId))
    .leftJoin(memberships, and(eq(memberships.workshopId, scenes.workshopId), eq(memberships.userId, userId)))
    .leftJoin(users, eq(users.id, notePosts.authorId))
    .where(and(eq(mentions.userId, userId), isNull(mentions.toldAt)))
    .orderBy(asc(mentions.id))
    .limit(mostInOne)

const namedSchema = z.array(z.object({ userId: z.string() }))

function stillTold(
  { role, deletedAt, named }: Awaited<ReturnType<typeof waitingMentions>>[number],
  userId: string,
) {
  const names = namedSchema.parse(named).some((one) => one.userId === userId)
  return names && deletedAt === null && role !== null && holds(role, 'note.read')
}
