import { and, count, eq } from 'drizzle-orm'
import { write } from '@/db/client'
import { hearerOfLink } from '@/db/queries/link-maker'
import { judgedVersion } from '@/db/queries/reviews'
import { lockScene } from '@/db/queries/scenes'
import { verdicts } from '@/db/schema'
import { newId } from '@/db/schema/columns'
import type { AnswerOf, BodyOf } from '@/lib/contracts/operation'
import { mostOfReviews, type giveGuestVerdict as contract } from '@/lib/contracts/verdicts'
import { linkUnavailable, Problem } from '@/lib/errors/problem'
import { heldBy } from '@/lib/review/held'
import { givenWords } from '@/lib/review/version-states'
import { audit } from '../audit'
import { linkBehind, type LinkKey } from '../link-behind'
import { postMail } from '../mail/post-mail'
import { refuseSilence } from './give-verdict'
import { reviewUrl } from './review-scene'
import { hashOf, verdictText } from './verdict-text'

/**
 * What whoever holds a link to decide says of the version it shows: kept beside the workshop's own verdicts, marked as a
 * guest's, and told to whoever made the link. It moves no version: approval is the workshop's.
 */
export async function giveGuestVerdict(
  key: LinkKey,
  { name, word, sentence }: BodyOf<typeof contract>,
): Promise<AnswerOf<typeof contract>> {
  return write(async (tx) => {
    const { guest, workshopId, version: number } = await linkBehind(tx, key, 'verdict.give')
    refuseSilence(word, sentence)
    const scene = await lockScene(tx, guest.sceneId)
    const version = await judgedVersion(tx, guest.sceneId, number)
    if (!scene || !version) throw linkUnavailable()
    const held = heldBy('comment', {
      ...{ state: version.state, own: false, needsTwoPeople: false },
      ...{ openErrors: [], unanswered: 0, items: 0 },
    })
    if (held)
      throw new Problem(
        'held',
        `No word is taken on version ${number}: ${held.words}.`,
        'Ask the person who sent the link.',
      )
    const ofLink = and(eq(verdicts.linkId, guest.linkId), eq(verdicts.version, number))
    const [{ given }] = await tx.select({ given: count() }).from(verdicts).where(ofLink)
    if (given >= mostOfReviews.guestVerdicts) {
      throw new Problem(
        'held',
        `${given} words on version ${number} have been given through this link, which is as many as it takes.`,
        'Write to the person who sent the link.',
      )
    }
    const hash = hashOf(verdictText(scene.id, number, version.document))
    const row = {
      ...{ id: newId(), sceneId: scene.id, version: number, linkId: guest.linkId, guestName: name },
      ...{ word, sentence, hash },
    }
    const [{ createdAt }] = await tx.insert(verdicts).values(row).returning({ createdAt: verdicts.createdAt })
    await audit(tx, {
      actorId: null,
      workshopId,
      operation: 'verdict.give',
      subject: `scene:${scene.id}`,
      after: { version: number, verdict: row.id, link: guest.linkId, guest: name, word, sentence, hash },
    })
    const hearer = await hearerOfLink(tx, guest.linkId)
    if (hearer) {
      await postMail(tx, {
        template: 'review-answered',
        to: hearer,
        data: {
          ...{ scene: scene.title, version: number, word: givenWords[word], sentence },
          person: `${name} (guest)`,
          url: reviewUrl(scene.id, number),
        },
        key: `review-answered:${row.id}:${hearer.userId}`,
        workshopId,
      })
    }
    return { verdict: { version: number, name, word, sentence, at: createdAt.toISOString(), hash } }
  })
}
