import { createHash } from 'node:crypto'
import { beforeAll, describe, expect, it } from 'vitest'
import { roles, type Role } from '@/lib/auth/access'
import type { Evidence, ListedReview } from '@/lib/contracts/verdicts'
import { remindReview } from '@/lib/services/reviews/remind-review'
import { call } from './support/call'
import { newScene } from './support/links'
import { newMember, newOwner, type Someone } from './support/people'
import { dayFromNow, newVersion, openError, reviewIn, reviewing } from './support/reviews'
import { useServer } from './support/server'

const server = useServer()
let owner: Someone
const member = {} as Record<Role, Someone>

beforeAll(async () => {
  owner = await newOwner()
  for (const role of roles) member[role] = await newMember(server.sql, owner.workshopId, role)
})

const mailsOf = (someone: Someone, template: string) =>
  server.sql`select data, key from mails where to_email = ${someone.email} and template = ${template} order by created_at`

/** A scene of the designer's with its version 1 in review by the reviewer, every item answered unless told otherwise. */
async function inReview({ answered = true } = {}) {
  const sceneId = await newScene(member.designer)
  expect((await reviewing(member.designer, sceneId).ask([member.reviewer])).status).toBe(201)
  const judge = reviewing(member.reviewer, sceneId)
  if (answered) expect((await judge.answerAll()).status).toBe(200)
  return { sceneId, judge, maker: reviewing(member.designer, sceneId) }
}

describe('asking for a review', () => {
  it('POST …/review names people, day and checklist, mails each of them once and plans two reminders', async () => {
    const sceneId = await newScene(member.designer)
    const maker = reviewing(member.designer, sceneId)
    const due = dayFromNow(5)
    const key = { 'idempotency-key': `ask-${sceneId}` }
    const body = {
      reviewers: [member.reviewer.id],
      due,
      message: 'Mind the skirt.',
      checklist: ['Gap', 'Units'],
    }
    const path = `/api/v1/scenes/${sceneId}/versions/1/review`
    const before = (await mailsOf(member.reviewer, 'review-asked')).length
    for (let time = 0; time < 2; time++) {
      const answer = await call('POST', path, { cookie: member.designer.cookie, body, headers: key })
      expect(answer.status).toBe(201)
    }
    const review = await maker.read()
    expect(review).toMatchObject({
      state: 'in-review',
      request: {
        askedBy: 'A designer',
        due,
        checklist: ['Gap', 'Units'],
        reviewers: [{ name: 'A reviewer' }],
      },
    })
    const mails = await mailsOf(member.reviewer, 'review-asked')
    expect(mails).toHaveLength(before + 1)
    expect(mails.at(-1)?.data).toMatchObject({
      version: 1,
      asker: 'A designer',
      due,
      message: 'Mind the skirt.',
    })
    const jobs = await server.sql`
      select key, run_at from graphile_worker.jobs where key like ${`review:${review.request?.id}:%`} order by run_at`
    expect(jobs.map(({ key, run_at }) => [key.split(':')[2], run_at.toISOString()])).toEqual([
      ['before', `${dayFromNow(4)}T06:00:00.000Z`],
      ['due', `${due}T06:00:00.000Z`],
    ])
    const [row] = await server.sql`
      select after from audit_log where subject = ${`scene:${sceneId}`} and operation = 'review.ask'`
    expect(row.after).toMatchObject({ state: 'in-review', due, checklist: ['Gap', 'Units'] })
  })

  it('POST …/review refuses who may not judge, a past day, and the author alone where two are wanted', async () => {
    const workshop = await newOwner()
    const sceneId = await newScene(workshop)
    const designer = await newMember(server.sql, workshop.workshopId, 'designer')
    const maker = reviewing(workshop, sceneId)
    const paths = async (asked: Promise<{ status: number; body: unknown }>) => {
      const { status, body } = await asked
      expect(status).toBe(422)
      return (body as { issues: { path: string }[] }).issues.map(({ path }) => path)
    }
    expect(await paths(maker.ask([workshop, designer]))).toEqual(['reviewers.1'])
    expect(await paths(maker.ask([workshop], { due: '2020-02-29' }))).toEqual(['due'])
    await server.sql`update workshops set needs_two_people = true where id = ${workshop.workshopId}`
    expect(await paths(maker.ask([workshop]))).toEqual(['reviewers'])
    expect((await maker.read()).state).toBe('draft')
  })

  it('asking again begins anew: nobody’s answers are carried over, and the older request has ended', async () => {
    const { sceneId, judge, maker } = await inReview()
    expect((await judge.read()).answered).toBe(6)
    await newVersion(member.designer, sceneId, 1, 20)
    const later = reviewing(member.designer, sceneId, 2)
    expect((await later.ask([member.reviewer])).status).toBe(201)
    expect((await reviewing(member.reviewer, sceneId, 2).read()).answered).toBe(0)
    expect(await maker.read()).toMatchObject({ state: 'superseded', request: { ended: 'overtaken' } })
    expect((await later.ask([member.reviewer, owner])).status).toBe(201)
    const ends =
      await server.sql`select ended_as from review_requests where scene_id = ${sceneId} order by created_at`
    expect(ends.map(({ ended_as }) => ended_as)).toEqual(['overtaken', 'replaced', null])
  })

  it('DELETE …/review makes it a draft again, once', async () => {
    const { maker } = await inReview()
    expect(reviewIn(await maker.callOff())).toMatchObject({
      state: 'draft',
      request: { ended: 'called-off' },
    })
    expect((await maker.callOff()).status).toBe(409)
  })
})

describe('reminders', () => {
  it('remindReview() run twice mails each reviewer once, and nobody who has left or after an answer', async () => {
    const sceneId = await newScene(member.designer)
    const leaver = await newMember(server.sql, owner.workshopId, 'reviewer')
    const stayer = await newMember(server.sql, owner.workshopId, 'reviewer')
    const maker = reviewing(member.designer, sceneId)
    const { request } = reviewIn(await maker.ask([leaver, stayer], { checklist: [] }))
    await server.sql`delete from memberships where user_id = ${leaver.id}`
    await Promise.all([1, 2, 3].map(() => remindReview(request?.id ?? '', 'before')))
    expect(await mailsOf(stayer, 'review-reminder')).toHaveLength(1)
    expect(await mailsOf(leaver, 'review-reminder')).toHaveLength(0)
    expect((await reviewing(stayer, sceneId).say('approve')).status).toBe(201)
    await remindReview(request?.id ?? '', 'due')
    expect(await mailsOf(stayer, 'review-reminder')).toHaveLength(1)
  })
})

describe('what holds an approval up', () => {
  it('unanswered items do, and a “no” wants words', async () => {
    const { judge } = await inReview({ answered: false })
    const held = await judge.say('approve')
    expect(held).toMatchObject({ status: 409, body: { held: 'unanswered', state: 'in-review' } })
    expect((await judge.answer({ item: 0, answer: 'no' })).status).toBe(422)
    expect((await judge.answer({ item: 6, answer: 'yes' })).status).toBe(422)
    expect((await judge.answer({ item: 0, answer: 'no', words: 'Out by 2°' })).status).toBe(200)
    const offers = (await judge.read()).offers
    expect(offers.find(({ act }) => act === 'approve')?.held).toBe('5 of 6 on the checklist are unanswered')
    await judge.answerAll()
    expect((await judge.say('approve')).status).toBe(201)
    expect((await judge.answerAll()).status).toBe(409)
  })

  it('an open error does, and its settling lets it go', async () => {
    const { sceneId, judge } = await inReview()
    const number = await openError(server.sql, member.reviewer, sceneId)
    expect(await judge.say('approve-with-remarks')).toMatchObject({
      status: 409,
      body: { held: 'open-errors' },
    })
    const review = await judge.read()
    expect(review.openErrors).toEqual([number])
    expect(review.offers.find(({ act }) => act === 'approve')?.held).toBe(`note ${number} is an open error`)
    expect(review.offers.find(({ act }) => act === 'ask-for-changes')?.held).toBeNull()
    await server.sql`update notes set state = 'settled', settled = '{}' where scene_id = ${sceneId}`
    expect((await judge.say('approve-with-remarks', 'Wording.')).status).toBe(201)
  })

  it('being the author does where the workshop wants two people, and only there', async () => {
    const workshop = await newOwner()
    const other = await newMember(server.sql, workshop.workshopId, 'reviewer')
    for (const two of [true, false]) {
      await server.sql`update workshops set needs_two_people = ${two} where id = ${workshop.workshopId}`
      const sceneId = await newScene(workshop)
      const own = reviewing(workshop, sceneId)
      expect((await own.ask([other, workshop], { checklist: [] })).status).toBe(201)
      const answer = await own.say('approve')
      if (!two) expect(answer.status).toBe(201)
      else {
        expect(answer).toMatchObject({ status: 409, body: { held: 'own-version' } })
        expect((await reviewing(other, sceneId).say('approve')).status).toBe(201)
      }
    }
  })

  it('a word that is no plain approval wants a sentence', async () => {
    const { judge } = await inReview()
    for (const word of ['approve-with-remarks', 'ask-for-changes', 'comment']) {
      expect((await judge.say(word, '  ')).status).toBe(422)
    }
  })
})

describe('verdicts', () => {
  it('an approval freezes and hashes what it was given on; a changed byte has another hash', async () => {
    const { sceneId, judge } = await inReview()
    await judge.say('approve', 'Good.')
    const { approval } = (await judge.approval()).body as {
      approval: { hash: string; recomputed: string; of: Record<string, unknown> }
    }
    expect(approval.recomputed).toBe(approval.hash)
    const [stored] = await server.sql`select document from scene_versions where scene_id = ${sceneId}`
    expect(approval.of).toEqual({
      format: 'verdict/1',
      scene: sceneId,
      version: 1,
      document: stored.document,
    })
    // written out apart from the product's own: JSON with the members of every object in order
    const ordered = (value: unknown): unknown =>
      Array.isArray(value)
        ? value.map(ordered)
        : value && typeof value === 'object'
          ? Object.fromEntries(
              Object.entries(value)
                .sort(([a], [b]) => (a < b ? -1 : 1))
                .map(([name, member]) => [name, ordered(member)]),
            )
          : value
    const sha = (value: unknown) =>
      createHash('sha256')
        .update(JSON.stringify(ordered(value)))
        .digest('hex')
    expect(sha(approval.of)).toBe(approval.hash)
    const changed = structuredClone(approval.of) as { document: { view: { angleDeg: number } } }
    changed.document.view.angleDeg += 1e-9
    expect(sha(changed)).not.toBe(approval.hash)
    const [row] = await server.sql`
      select after from audit_log where subject = ${`scene:${sceneId}`} and operation = 'verdict.give'`
    expect(row.after).toMatchObject({ hash: approval.hash, state: 'approved' })
  })

  it('a later version is said to be changed since, and one that is the same letter by letter is not', async () => {
    const { sceneId, judge } = await inReview()
    await judge.say('approve')
    await newVersion(member.designer, sceneId, 1, 20)
    await newVersion(member.designer, sceneId, 2, 11)
    const same = async (number: number) => (await reviewing(member.reviewer, sceneId, number).read()).approved
    expect(await same(2)).toMatchObject({ version: 1, person: 'A reviewer', same: false })
    expect(await same(3)).toMatchObject({ version: 1, same: true })
  })

  it('an approval supersedes every older version, and the list of scenes and versions says what each is', async () => {
    const { sceneId, judge } = await inReview()
    await judge.say('approve')
    await newVersion(member.designer, sceneId, 1, 20)
    await newVersion(member.designer, sceneId, 2, 30)
    await reviewing(member.designer, sceneId, 3).ask([member.reviewer], { checklist: [] })
    await reviewing(member.reviewer, sceneId, 3).say('approve-with-remarks', 'Wording.')
    const { body } = await call('GET', `/api/v1/scenes/${sceneId}/versions`, member.sales)
    const states = (body as { versions: { state: string }[] }).versions.map(({ state }) => state)
    expect(states).toEqual(['approved-with-remarks', 'superseded', 'superseded'])
    const scenes = await call('GET', `/api/v1/scenes?limit=100`, member.sales)
    const listed = (scenes.body as { scenes: { id: string; state: string }[] }).scenes
    expect(listed.find(({ id }) => id === sceneId)?.state).toBe('approved-with-remarks')
  })

  it('is told to the asker and the author, each once, and not to whoever gave it', async () => {
    const sceneId = await newScene(member.designer)
    await reviewing(owner, sceneId).ask([member.reviewer], { checklist: [] })
    const before = [
      await mailsOf(owner, 'review-answered'),
      await mailsOf(member.designer, 'review-answered'),
    ]
    await reviewing(member.reviewer, sceneId).say('ask-for-changes', 'Gap first.')
    for (const [index, someone] of [owner, member.designer].entries()) {
      const mails = await mailsOf(someone, 'review-answered')
      expect(mails).toHaveLength(before[index].length + 1)
      expect(mails.at(-1)?.data).toMatchObject({
        person: 'A reviewer',
        word: 'Changes asked for',
        sentence: 'Gap first.',
      })
    }
    expect(await mailsOf(member.reviewer, 'review-answered')).toHaveLength(0)
  })

  it('of two at once the second is told what the first has decided, and the same one sent twice counts once', async () => {
    const { sceneId, judge } = await inReview()
    await reviewing(owner, sceneId).answerAll()
    const answers = await Promise.all([
      judge.say('approve'),
      reviewing(owner, sceneId).say('ask-for-changes', 'No.'),
    ])
    expect(answers.map(({ status }) => status).sort()).toEqual([201, 409])
    const refused = answers.find(({ status }) => status === 409)
    const state = (await judge.read()).state
    expect(refused?.body).toMatchObject({ held: 'state', state })
    expect((await judge.read()).verdicts).toHaveLength(1)

    const key = { 'idempotency-key': `word-${sceneId}` }
    await Promise.all([1, 2, 3].map(() => judge.say('comment', 'Once.', key)))
    expect((await judge.read()).verdicts).toHaveLength(2)
    expect((await judge.say('comment', 'Other.', key)).status).toBe(409)
  })

  it('are append-only in the database itself', async () => {
    const { sceneId, judge } = await inReview()
    await judge.say('approve')
    await expect(server.sql`update verdicts set sentence = '' where scene_id = ${sceneId}`).rejects.toThrow()
    await expect(server.sql`delete from verdicts where scene_id = ${sceneId}`).rejects.toThrow()
    await expect(server.sql`truncate verdicts`).rejects.toThrow()
  })

  it('a version, approved or not, is withdrawn with a reason and takes no word after it', async () => {
    const { judge, maker } = await inReview()
    await judge.say('approve')
    expect((await maker.withdraw(' ')).status).toBe(422)
    const review = reviewIn(await maker.withdraw('Wrong pin mass.'))
    expect(review).toMatchObject({ state: 'withdrawn', reason: 'Wrong pin mass.', approved: null })
    expect((await judge.say('comment')).status).toBe(409)
    expect((await maker.withdraw('Again.')).status).toBe(409)
    // what was approved stays written
    expect((await judge.approval()).body).toMatchObject({ approval: { version: 1, word: 'approve' } })
  })
})

describe('evidence and lists', () => {
  it('GET …/evidence tells who opened the version, what was answered and said', async () => {
    const { judge, sceneId } = await inReview({ answered: false })
    for (let time = 0; time < 2; time++) expect((await judge.open()).status).toBe(204)
    await judge.answer({ item: 5, answer: 'no', words: 'Two words for one part.' })
    await judge.say('comment', 'Half way.')
    const { evidence } = (await judge.evidence()).body as { evidence: Evidence }
    expect(evidence.openings).toHaveLength(1)
    const [{ firstAt, lastAt, person }] = evidence.openings
    expect(person).toBe('A reviewer')
    expect(lastAt > firstAt).toBe(true)
    expect(evidence.answers).toMatchObject([
      { person: 'A reviewer', item: 'Wording', answer: 'no', words: 'Two words for one part.' },
    ])
    expect(evidence.verdicts).toMatchObject([{ word: 'comment', sentence: 'Half way.' }])
    const rows = await server.sql`
      select after from audit_log where subject = ${`scene:${sceneId}`} and operation = 'checklist.answer'`
    expect(rows).toHaveLength(1)
  })

  it('GET /reviews lists what is asked of one by its day, what one asked, and what was decided, page by page', async () => {
    const workshop = await newOwner()
    const judge = await newMember(server.sql, workshop.workshopId, 'reviewer')
    const ids: string[] = []
    for (const days of [9, 3, 6]) {
      const sceneId = await newScene(workshop)
      await reviewing(workshop, sceneId).ask([judge], { due: dayFromNow(days), checklist: [] })
      ids.push(sceneId)
    }
    const list = async (someone: Someone, name: string) => {
      const found: ListedReview[] = []
      let after = ''
      do {
        const { body } = await call(
          'GET',
          `/api/v1/reviews?list=${name}&limit=2${after && `&after=${after}`}`,
          someone,
        )
        const page = body as { reviews: ListedReview[]; next: string | null }
        found.push(...page.reviews)
        after = page.next ?? ''
      } while (after)
      return found.map(({ sceneId }) => ids.indexOf(sceneId))
    }
    expect(await list(judge, 'of-me')).toEqual([1, 2, 0])
    expect(await list(workshop, 'by-me')).toEqual([2, 1, 0])
    await reviewing(judge, ids[1]).say('approve')
    await reviewing(judge, ids[0]).say('ask-for-changes', 'Gap.')
    expect(await list(judge, 'of-me')).toEqual([2])
    expect(await list(judge, 'decided')).toEqual([0, 1])
    expect(await list(workshop, 'of-me')).toEqual([])
  })
})
