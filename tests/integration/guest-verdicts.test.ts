import { beforeAll, describe, expect, it } from 'vitest'
import { roles, type Role } from '@/lib/auth/access'
import { call } from './support/call'
import { newLink, newScene } from './support/links'
import { newMember, newOwner, type Someone } from './support/people'
import { reviewing } from './support/reviews'
import { useServer } from './support/server'

const server = useServer()
const member = {} as Record<Role, Someone>

beforeAll(async () => {
  const owner = await newOwner()
  for (const role of roles) member[role] = await newMember(server.sql, owner.workshopId, role)
})

const mailsOf = (someone: Someone) =>
  server.sql`select data from mails where to_email = ${someone.email} and template = 'review-answered' order by created_at`

/** A scene of the designer's with its version 1 in review by the reviewer, who has nothing left to answer. */
async function inReview() {
  const sceneId = await newScene(member.designer)
  await reviewing(member.designer, sceneId).ask([member.reviewer], { checklist: [] })
  return { sceneId, judge: reviewing(member.reviewer, sceneId) }
}

describe('guests', () => {
  async function guestOf(kind: string) {
    const { sceneId, judge } = await inReview()
    const { token } = await newLink(member.sales, sceneId, { kind, label: 'For Delphine' })
    const say = (word: string, sentence = 'As shown.') =>
      call('POST', `/api/v1/shared/${token}/verdict`, {
        body: { name: 'Delphine Astercroft', word, sentence },
      })
    return { sceneId, judge, say }
  }

  it('a guest’s word is kept, marked, hashed alike and told to the link’s maker, and moves no version', async () => {
    const { judge, say } = await guestOf('decide')
    const before = (await mailsOf(member.sales)).length
    const answer = await say('approve')
    expect(answer.status).toBe(201)
    const { verdict } = answer.body as { verdict: { hash: string } }
    expect(Object.keys(verdict).sort()).toEqual(['at', 'hash', 'name', 'sentence', 'version', 'word'])
    const review = await judge.read()
    expect(review.state).toBe('in-review')
    expect(review.verdicts).toMatchObject([
      { person: 'Delphine Astercroft', guest: true, word: 'approve', hash: verdict.hash },
    ])
    await judge.say('approve')
    expect((await judge.read()).verdicts[0].hash).toBe(verdict.hash)
    const mails = await mailsOf(member.sales)
    expect(mails).toHaveLength(before + 1)
    expect(mails.at(-1)?.data).toMatchObject({ person: 'Delphine Astercroft (guest)', sentence: 'As shown.' })
  })

  it('a second word adds, up to five through one link on one version, also at once', async () => {
    const { judge, say } = await guestOf('decide')
    const answers = await Promise.all(
      Array.from({ length: 8 }, (_, index) => say('comment', `Word ${index}`)),
    )
    expect(answers.filter(({ status }) => status === 201)).toHaveLength(5)
    expect(answers.filter(({ status }) => status === 409)).toHaveLength(3)
    expect((await judge.read()).verdicts).toHaveLength(5)
  })

  it.each(['look', 'note'])('a link to %s takes no verdict, an unknown one is not there', async (kind) => {
    const { say } = await guestOf(kind)
    expect((await say('approve')).status).toBe(403)
    const unknown = await call('POST', '/api/v1/shared/nobodys/verdict', {
      body: { name: 'D', word: 'approve' },
    })
    expect(unknown.status).toBe(404)
  })
})
