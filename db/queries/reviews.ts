import { and, asc, desc, eq, inArray, isNotNull, isNull, sql } from 'drizzle-orm'
import type { Transaction } from '../client'
import type { TimePosition } from './people'
import { stateOfVersion } from './version-state'
import {
  checklistAnswers,
  memberships,
  reviewRequests,
  reviewReviewers,
  scenes,
  sceneVersions,
  users,
  verdicts,
  versionOpenings,
  versionStates,
  workshops,
} from '../schema'

/** A version as those who judge it see it: a draft until somebody has done something to it. */
export async function judgedVersion(tx: Transaction, sceneId: string, number: number) {
  const [found] = await tx
    .select({
      number: sceneVersions.number,
      authorId: sceneVersions.authorId,
      author: users.name,
      authorEmail: users.email,
      document: sceneVersions.document,
      state: stateOfVersion,
      reason: sql<string>`coalesce(${versionStates.reason}, '')`,
    })
    .from(sceneVersions)
    .innerJoin(users, eq(users.id, sceneVersions.authorId))
    .leftJoin(
      versionStates,
      and(eq(versionStates.sceneId, sceneVersions.sceneId), eq(versionStates.number, sceneVersions.number)),
    )
    .where(and(eq(sceneVersions.sceneId, sceneId), eq(sceneVersions.number, number)))
  return found
}
export type JudgedVersion = NonNullable<Awaited<ReturnType<typeof judgedVersion>>>

/** What was asked about a version, the latest first. */
export const requestsOf = (tx: Transaction, sceneId: string, version: number) =>
  tx
    .select({ request: reviewRequests, asker: users.name, askerEmail: users.email })
    .from(reviewRequests)
    .innerJoin(users, eq(users.id, reviewRequests.askedBy))
    .where(and(eq(reviewRequests.sceneId, sceneId), eq(reviewRequests.version, version)))
    .orderBy(desc(reviewRequests.createdAt), desc(reviewRequests.id))
export type RequestRow = Awaited<ReturnType<typeof requestsOf>>[number]

export const reviewersOf = (tx: Transaction, requestIds: string[]) =>
  tx
    .select({
      requestId: reviewReviewers.requestId,
      id: users.id,
      name: users.name,
      email: users.email,
    })
    .from(reviewReviewers)
    .innerJoin(users, eq(users.id, reviewReviewers.userId))
    .where(inArray(reviewReviewers.requestId, requestIds))
    .orderBy(asc(users.name), asc(users.id))

export const answersOf = (tx: Transaction, requestIds: string[]) =>
  tx
    .select({ answer: checklistAnswers, person: users.name })
    .from(checklistAnswers)
    .innerJoin(users, eq(users.id, checklistAnswers.userId))
    .where(inArray(checklistAnswers.requestId, requestIds))
    .orderBy(asc(checklistAnswers.requestId), asc(users.name), asc(checklistAnswers.item))

/** The latest first. */
export const verdictsOf = (tx: Transaction, sceneId: string, version: number) =>
  tx
    .select({ verdict: verdicts, person: users.name })
    .from(verdicts)
    .leftJoin(users, eq(users.id, verdicts.userId))
    .where(and(eq(verdicts.sceneId, sceneId), eq(verdicts.version, version)))
    .orderBy(desc(verdicts.createdAt), desc(verdicts.id))
export type VerdictRow = Awaited<ReturnType<typeof verdictsOf>>[number]

const approvalStates = ['approved', 'approved-with-remarks'] as const

/** The verdict by which a version was approved, whatever has become of it since; the latest version unless one is named. */
export async function approvalRow(tx: Transaction, sceneId: string, version?: number) {
  const [found] = await tx
    .select({
      version: verdicts.version,
      word: verdicts.word,
      sentence: verdicts.sentence,
      hash: verdicts.hash,
      at: verdicts.createdAt,
      person: users.name,
      state: versionStates.state,
      document: sceneVersions.document,
    })
    .from(verdicts)
    .innerJoin(users, eq(users.id, verdicts.userId))
    .innerJoin(
      versionStates,
      and(eq(versionStates.sceneId, verdicts.sceneId), eq(versionStates.number, verdicts.version)),
    )
    .innerJoin(
      sceneVersions,
      and(eq(sceneVersions.sceneId, verdicts.sceneId), eq(sceneVersions.number, verdicts.version)),
    )
    .where(
      and(
        eq(verdicts.sceneId, sceneId),
        inArray(verdicts.word, ['approve', 'approve-with-remarks']),
        version === undefined
          ? inArray(versionStates.state, [...approvalStates])
          : eq(verdicts.version, version),
      ),
    )
    .orderBy(desc(verdicts.version), desc(verdicts.createdAt))
    .limit(1)
  return found
}

/** People of a workshop with one of these roles. */
export const peopleWith = (
  tx: Transaction,
  workshopId: string,
  roles: (typeof memberships.$inferSelect)['role'][],
) =>
  tx
    .select({ id: users.id, name: users.name, email: users.email, role: memberships.role })
    .from(memberships)
    .innerJoin(users, eq(users.id, memberships.userId))
    .where(and(eq(memberships.workshopId, workshopId), inArray(memberships.role, roles)))
    .orderBy(asc(users.name), asc(users.id))

export const openingsOf = (tx: Transaction, sceneId: string, version: number) =>
  tx
    .select({ person: users.name, firstAt: versionOpenings.firstAt, lastAt: versionOpenings.lastAt })
    .from(versionOpenings)
    .innerJoin(users, eq(users.id, versionOpenings.userId))
    .where(and(eq(versionOpenings.sceneId, sceneId), eq(versionOpenings.version, version)))
    .orderBy(asc(versionOpenings.firstAt), asc(users.id))

interface ReviewPage {
  workshopId: string
  userId: string
  list: 'of-me' | 'by-me' | 'decided'
  after?: TimePosition
  limit: number
}

const { createdAt, due, endedAt, id } = reviewRequests

/** What is due first stands first; what has been asked or decided, the latest first. */
const orders = {
  'of-me': { column: due, type: sql`date`, up: true },
  'by-me': { column: createdAt, type: sql`timestamptz`, up: false },
  decided: { column: endedAt, type: sql`timestamptz`, up: false },
} as const

/** A page of reviews by keyset and one more, each with its scene and the state of its version. */
export async function pageOfReviews(tx: Transaction, page: ReviewPage) {
  const { column, type, up } = orders[page.list]
  const { after } = page
  const asked = tx
    .select({ one: sql`1` })
    .from(reviewReviewers)
    .where(and(eq(reviewReviewers.requestId, id), eq(reviewReviewers.userId, page.userId)))
  const wanted = {
    'of-me': and(isNull(endedAt), sql`exists ${asked}`),
    'by-me': eq(reviewRequests.askedBy, page.userId),
    decided: and(isNotNull(endedAt), eq(reviewRequests.endedAs, 'answered')),
  }[page.list]
  const rows = await tx
    .select({
      request: reviewRequests,
      askedBy: users.name,
      title: scenes.title,
      headVersion: scenes.headVersion,
      state: stateOfVersion,
    })
    .from(reviewRequests)
    .innerJoin(scenes, eq(scenes.id, reviewRequests.sceneId))
    .innerJoin(users, eq(users.id, reviewRequests.askedBy))
    .leftJoin(
      versionStates,
      and(
        eq(versionStates.sceneId, reviewRequests.sceneId),
        eq(versionStates.number, reviewRequests.version),
      ),
    )
    .where(
      and(
        eq(scenes.workshopId, page.workshopId),
        isNull(scenes.archivedAt),
        wanted,
        after && sql`(${column}, ${id}) ${up ? sql`>` : sql`<`} (${after.at}::${type}, ${after.id}::uuid)`,
      ),
    )
    .orderBy(up ? asc(column) : desc(column), up ? asc(id) : desc(id))
    .limit(page.limit + 1)
  return rows
}
export type ReviewRow = Awaited<ReturnType<typeof pageOfReviews>>[number]

/** What its page is sorted by; a day stands for its beginning. */
export const placeOfReview = ({ request }: ReviewRow, list: ReviewPage['list']) => ({
  at: {
    'of-me': new Date(request.due),
    'by-me': request.createdAt,
    decided: request.endedAt ?? request.createdAt,
  }[list],
  id: request.id,
})

/** How a workshop wants its reviews. */
export async function reviewRules(tx: Transaction, workshopId: string) {
  const [rules] = await tx
    .select({ needsTwoPeople: workshops.needsTwoPeople, checklist: workshops.checklist })
    .from(workshops)
    .where(eq(workshops.id, workshopId))
  return rules
}
