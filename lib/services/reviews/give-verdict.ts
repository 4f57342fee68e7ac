import { write, type Transaction } from '@/db/client'
import { verdicts } from '@/db/schema'
import { newId } from '@/db/schema/columns'
import type { Person } from '@/lib/auth/access'
import type { BodyOf } from '@/lib/contracts/operation'
import type { giveVerdict as contract, Review } from '@/lib/contracts/verdicts'
import { refused } from '@/lib/errors/problem'
import { statesBefore } from '@/lib/review/transitions'
import { givenWords, isApproval, isDecisive, type VerdictWord } from '@/lib/review/version-states'
import { once, requestHash, versionPlace } from '../idempotency'
import { postMail } from '../mail/post-mail'
import { endRequest, moveVersion, overtakeOlder, refuseHeld } from './move-version'
import { reviewAnswer } from './review-answer'
import { reviewGround, type ReviewGround } from './review-ground'
import { holdVersion, reviewUrl, withVersion, type HeldScene } from './review-scene'
import { hashOf, verdictText } from './verdict-text'

type Given = BodyOf<typeof contract>

/**
 * A person's word on a version. The first that decides answers the review; of two at once the second finds what the
 * first has made of it, and is told.
 */
export async function giveVerdict(
  person: Person | null,
  id: string,
  number: number,
  given: Given,
  key?: string,
): Promise<{ review: Review }> {
  return write(async (tx) => {
    const scene = await holdVersion(tx, person, 'verdict.give', id, number)
    const judge = person as Person
    await once(tx, judge.id, key, requestHash('verdict', id, number, given), versionPlace, async () => {
      await give(tx, judge, scene, given)
      return { sceneId: id, version: number }
    })
    return { review: await reviewAnswer(tx, judge, await withVersion(tx, scene, number)) }
  })
}

async function give(tx: Transaction, judge: Person, scene: HeldScene, { word, sentence }: Given) {
  refuseSilence(word, sentence)
  const { number, document } = scene.version
  const ground = await reviewGround(tx, scene, judge.id)
  refuseHeld(word, number, ground)
  const open = ground.latest?.request.endedAt === null ? ground.latest.request : null
  const verdict = {
    ...{ id: newId(), sceneId: scene.id, version: number, requestId: open?.id, userId: judge.id },
    ...{ word, sentence, hash: hashOf(verdictText(scene.id, number, document)) },
  }
  await tx.insert(verdicts).values(verdict)
  await moveVersion(tx, scene, {
    act: word,
    actorId: judge.id,
    details: { verdict: verdict.id, word, sentence, hash: verdict.hash },
  })
  if (isDecisive(word)) await endRequest(tx, scene.id, number, 'answered')
  if (isApproval(word)) await overtakeOlder(tx, scene, judge.id, statesBefore('overtake'))
  for (const reader of readers(scene, ground, judge)) {
    await postMail(tx, {
      template: 'review-answered',
      to: reader,
      data: {
        ...{ scene: scene.title, version: number, person: judge.name, word: givenWords[word], sentence },
        url: reviewUrl(scene.id, number),
      },
      key: `review-answered:${verdict.id}:${reader.userId}`,
      workshopId: scene.workshopId,
    })
  }
}

/** Whatever is no plain approval has something to say. */
export function refuseSilence(word: VerdictWord, sentence: string) {
  if (word === 'approve' || sentence !== '') return
  const message = `“${givenWords[word]}” says nothing without a sentence.`
  throw refused([{ path: 'sentence', code: 'wanted', message, fix: 'Say in a sentence what it is about.' }])
}

/** Who drew it and who asked about it, each once, but not whoever has just spoken. */
function readers({ version }: HeldScene, { latest }: ReviewGround, judge: Person) {
  const author = { userId: version.authorId, name: version.author, email: version.authorEmail }
  const asker = latest && {
    userId: latest.request.askedBy,
    name: latest.asker,
    email: latest.askerEmail,
  }
  const all = asker && asker.userId !== author.userId ? [author, asker] : [author]
  return all.filter(({ userId }) => userId !== judge.id)
}
