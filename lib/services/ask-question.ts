import { write } from '@/db/client'
import { questionsFrom } from '@/db/queries/link-log'
import { hearerOfLink } from '@/db/queries/link-maker'
import { linkQuestions } from '@/db/schema'
import { takeToken } from '@/lib/auth/rate-limit'
import { hashToken } from '@/lib/auth/tokens'
import { config } from '@/lib/config'
import type { BodyOf } from '@/lib/contracts/operation'
import type { askQuestion as contract } from '@/lib/contracts/shared'
import { refused } from '@/lib/errors/problem'
import { linkBehind, type LinkKey } from './link-behind'
import { postMail } from './mail/post-mail'

/** Nobody writes a question faster; a program does. */
const leastMs = 2_000
/** Anybody may write anybody's address here: no more copies than these go to one in a day. */
const copiesADay = 3

const stepOf = (angleDeg: number | null, view: string | null) =>
  [angleDeg === null ? null : `at ${angleDeg.toFixed(1)}°`, view].filter(Boolean).join(', ') || null

/** Keeps what a visitor asks, tells whoever made the link and sends the visitor a copy. */
export async function askQuestion(
  key: LinkKey,
  { website, writtenForMs, ...asked }: BodyOf<typeof contract>,
  address: string,
): Promise<void> {
  if (writtenForMs < leastMs) {
    const message = 'This was sent sooner than a question can be written.'
    throw refused([
      { path: 'writtenForMs', code: 'too-soon', message, fix: 'Read it once more, then send it.' },
    ])
  }
  await takeToken('question', `${hashToken(key.token)} ${address}`)
  const since = new Date(Date.now() - 86_400_000)
  await write(async (tx) => {
    const { guest, workshopId, version, link } = await linkBehind(tx, key, 'question.ask')
    // what fills in the field that nobody sees is thanked like everybody
    if (website !== '') return
    const before = await questionsFrom(tx, asked.email, since)
    const [{ id }] = await tx
      .insert(linkQuestions)
      .values({ ...asked, linkId: guest.linkId, version })
      .returning({ id: linkQuestions.id })
    const hearer = await hearerOfLink(tx, guest.linkId)
    if (hearer) {
      await postMail(tx, {
        template: 'question',
        to: hearer,
        data: {
          ...{ scene: link.title, visitor: asked.name, email: asked.email, question: asked.question },
          step: stepOf(asked.angleDeg, asked.view),
          url: `${config().origin}/scenes/${guest.sceneId}/links?link=${guest.linkId}`,
        },
        key: `question:${id}`,
        workshopId,
      })
    }
    if (before < copiesADay) {
      await postMail(tx, {
        template: 'question-copy',
        to: { email: asked.email, name: asked.name, userId: null },
        data: { workshop: link.workshop, question: asked.question },
        key: `question-copy:${id}`,
        workshopId,
      })
    }
  })
}
