import { z } from 'zod'
import { roles } from '@/lib/auth/access'
import { acts } from '@/lib/review/transitions'
import { checklistAnswers, verdictWords, versionStates } from '@/lib/review/version-states'
import { cursorSchema, idSchema, limitSchema, timeSchema } from './common'
import { operation } from './operation'

export const mostOfReviews = {
  reviewers: 12,
  message: 2_000,
  items: 20,
  item: 120,
  words: 500,
  sentence: 500,
  reason: 500,
  guestName: 80,
  /** Words of guests through one link on one version. */
  guestVerdicts: 5,
} as const

const versionNumber = z.int().min(1)
const hashSchema = z.string().regex(/^[0-9a-f]{64}$/)
const sentenceSchema = z.string().trim().max(mostOfReviews.sentence)
const itemSchema = z.string().trim().min(1).max(mostOfReviews.item)
export const checklistSchema = z.array(itemSchema).max(mostOfReviews.items)
/** A day without an hour. */
const daySchema = z.iso.date()

export const versionStateSchema = z.enum(versionStates)
const wordSchema = z.enum(verdictWords)

const byVersion = z.object({ id: idSchema, number: z.coerce.number().int().min(1) })

const verdictSchema = z
  .object({
    id: idSchema,
    /** As they are called, or as the guest said. */
    person: z.string(),
    guest: z.boolean(),
    word: wordSchema,
    sentence: z.string(),
    at: timeSchema,
    /** SHA-256 of the canonical text of what it was given on. */
    hash: hashSchema,
  })
  .meta({ id: 'Verdict' })
export type Verdict = z.output<typeof verdictSchema>

const answerSchema = z
  .object({
    /** Its place in the checklist, from 0. */
    item: z.int().min(0),
    answer: z.enum(checklistAnswers),
    words: z.string().trim().max(mostOfReviews.words).default(''),
  })
  .refine(({ answer, words }) => answer !== 'no' || words !== '', {
    path: ['words'],
    message: 'A “no” needs words: what stands against it.',
  })

const requestSchema = z.object({
  id: idSchema,
  askedBy: z.string(),
  askedAt: timeSchema,
  due: daySchema,
  message: z.string(),
  checklist: z.array(z.string()),
  reviewers: z.array(z.object({ id: idSchema, name: z.string() })),
  ended: z.enum(['answered', 'called-off', 'replaced', 'overtaken', 'withdrawn']).nullable(),
})

export const reviewSchema = z
  .object({
    sceneId: idSchema,
    title: z.string(),
    version: versionNumber,
    headVersion: versionNumber,
    author: z.string(),
    state: versionStateSchema,
    /** Why it was withdrawn. */
    reason: z.string(),
    /** The last time somebody asked about this version. */
    request: requestSchema.nullable(),
    /** Of whoever asks, on that request's checklist. */
    answers: z.array(z.object({ item: z.int(), answer: z.enum(checklistAnswers), words: z.string() })),
    /** How many items whoever asks has answered or, where they do not judge, whoever has answered most. */
    answered: z.int(),
    verdicts: z.array(verdictSchema),
    openErrors: z.array(z.int()),
    /** The latest version that is approved, and whether this one is the same, letter by letter. */
    approved: z
      .object({ version: versionNumber, person: z.string(), at: timeSchema, same: z.boolean() })
      .nullable(),
    /** What whoever asks may do here by their role, and what holds it up now. */
    offers: z.array(z.object({ act: z.enum(acts), held: z.string().nullable() })),
    /** Who can be asked; empty for those who may not ask. */
    judges: z.array(z.object({ id: idSchema, name: z.string(), role: z.enum(roles) })),
    /** What a review here asks about unless told otherwise. */
    standardChecklist: z.array(z.string()),
  })
  .meta({ id: 'Review' })
export type Review = z.output<typeof reviewSchema>

const review = '/api/v1/scenes/{id}/versions/{number}/review'
const answer = z.object({ review: reviewSchema })
const changed = { 409: 'The version is not in a state for this, or somebody was there first' } as const

export const readReview = operation({
  id: 'readReview',
  method: 'GET',
  path: review,
  summary: 'Where the review of a version stands, and what one may do about it',
  for: 'person',
  limit: 'reading',
  params: byVersion,
  status: 200,
  answer,
})

export const askReview = operation({
  id: 'askReview',
  method: 'POST',
  path: review,
  summary: 'Ask people of the workshop to judge a version; asking again begins anew',
  for: 'person',
  limit: 'writing',
  params: byVersion,
  body: z.object({
    reviewers: z.array(idSchema).min(1).max(mostOfReviews.reviewers),
    due: daySchema,
    message: z.string().trim().max(mostOfReviews.message).default(''),
    /** Default: the workshop's. */
    checklist: checklistSchema.optional(),
  }),
  idempotent: true,
  status: 201,
  answer,
  problems: changed,
})

export const callOffReview = operation({
  id: 'callOffReview',
  method: 'DELETE',
  path: review,
  summary: 'Call off the review of a version: it is a draft again',
  for: 'person',
  limit: 'writing',
  params: byVersion,
  status: 200,
  answer,
  problems: changed,
})

export const answerChecklist = operation({
  id: 'answerChecklist',
  method: 'PUT',
  path: '/api/v1/scenes/{id}/versions/{number}/checklist',
  summary: 'Answer items of the checklist for oneself; items not named stay as they are',
  for: 'person',
  limit: 'writing',
  params: byVersion,
  body: z.object({ answers: z.array(answerSchema).min(1).max(mostOfReviews.items) }),
  status: 200,
  answer,
  problems: changed,
})

export const giveVerdict = operation({
  id: 'giveVerdict',
  method: 'POST',
  path: '/api/v1/scenes/{id}/versions/{number}/verdicts',
  summary: 'Give one’s word on a version',
  for: 'person',
  limit: 'writing',
  params: byVersion,
  body: z.object({ word: wordSchema, sentence: sentenceSchema.default('') }),
  idempotent: true,
  status: 201,
  answer,
  problems: { 409: 'Held up, or somebody was there first: the answer says by what' },
})

export const withdrawVersion = operation({
  id: 'withdrawVersion',
  method: 'POST',
  path: '/api/v1/scenes/{id}/versions/{number}/withdraw',
  summary: 'Withdraw a version for good, approved or not; it stays readable and says so',
  for: 'person',
  limit: 'writing',
  params: byVersion,
  body: z.object({ reason: z.string().trim().min(1).max(mostOfReviews.reason) }),
  status: 200,
  answer,
  problems: changed,
})

export const approvalSchema = z
  .object({
    version: versionNumber,
    person: z.string(),
    word: z.enum(['approve', 'approve-with-remarks']),
    sentence: z.string(),
    at: timeSchema,
    /** As it was kept when the approval was given. */
    hash: hashSchema,
    /** Worked out now, from the version as it is stored. */
    recomputed: hashSchema,
    /** What the hash is of: SHA-256 over its text by RFC 8785, in UTF-8. */
    of: z.object({
      format: z.literal('verdict/1'),
      scene: idSchema,
      version: versionNumber,
      document: z.unknown(),
    }),
  })
  .meta({ id: 'Approval' })
export type ApprovalAnswer = z.output<typeof approvalSchema>

export const readApproval = operation({
  id: 'readApproval',
  method: 'GET',
  path: '/api/v1/scenes/{id}/versions/{number}/approval',
  summary: 'The approval of a version with the hash of what was approved, to work out again',
  for: 'person',
  limit: 'reading',
  params: byVersion,
  status: 200,
  answer: z.object({ approval: approvalSchema.nullable() }),
})

export const openVersionForReview = operation({
  id: 'openVersionForReview',
  method: 'POST',
  path: '/api/v1/scenes/{id}/versions/{number}/openings',
  summary: 'Say that one has a version before one',
  for: 'person',
  limit: 'writing',
  params: byVersion,
  status: 204,
})

export const evidenceSchema = z
  .object({
    openings: z.array(z.object({ person: z.string(), firstAt: timeSchema, lastAt: timeSchema })),
    requests: z.array(requestSchema),
    answers: z.array(
      z.object({
        request: idSchema,
        person: z.string(),
        item: z.string(),
        answer: z.enum(checklistAnswers),
        words: z.string(),
        at: timeSchema,
      }),
    ),
    verdicts: z.array(verdictSchema),
  })
  .meta({ id: 'ReviewEvidence' })
export type Evidence = z.output<typeof evidenceSchema>

export const readEvidence = operation({
  id: 'readEvidence',
  method: 'GET',
  path: '/api/v1/scenes/{id}/versions/{number}/evidence',
  summary: 'Evidence of a review: who opened the version, what was asked, answered and said',
  for: 'person',
  limit: 'reading',
  params: byVersion,
  status: 200,
  answer: z.object({ evidence: evidenceSchema }),
})

export const reviewLists = ['of-me', 'by-me', 'decided'] as const
export type ReviewList = (typeof reviewLists)[number]

export const listedReviewSchema = z
  .object({
    id: idSchema,
    sceneId: idSchema,
    title: z.string(),
    version: versionNumber,
    headVersion: versionNumber,
    state: versionStateSchema,
    askedBy: z.string(),
    askedAt: timeSchema,
    due: daySchema,
    message: z.string(),
    reviewers: z.array(z.string()),
    ended: requestSchema.shape.ended,
    endedAt: timeSchema.nullable(),
  })
  .meta({ id: 'ListedReview' })
export type ListedReview = z.output<typeof listedReviewSchema>

export const listReviews = operation({
  id: 'listReviews',
  method: 'GET',
  path: '/api/v1/reviews',
  summary: 'Reviews asked of one, asked by one, or decided in the workshop, a page at a time',
  for: 'person',
  limit: 'reading',
  query: z.object({
    workshop: idSchema.optional(),
    list: z.enum(reviewLists).default('of-me'),
    after: cursorSchema.optional(),
    limit: limitSchema,
  }),
  status: 200,
  answer: z.object({ reviews: z.array(listedReviewSchema), next: cursorSchema.nullable() }),
})

export const giveGuestVerdict = operation({
  id: 'giveGuestVerdict',
  method: 'POST',
  path: '/api/v1/shared/{token}/verdict',
  summary: 'A guest’s word on the version that a link shows; it is heard, and decides nothing',
  for: 'anyone',
  limit: 'guest-writing',
  params: z.object({ token: z.string() }),
  body: z.object({
    name: z.string().trim().min(1).max(mostOfReviews.guestName),
    word: wordSchema,
    sentence: sentenceSchema.default(''),
  }),
  status: 201,
  answer: z.object({
    verdict: z.object({
      version: versionNumber,
      name: z.string(),
      word: wordSchema,
      sentence: z.string(),
      at: timeSchema,
      hash: hashSchema,
    }),
  }),
  problems: {
    404: 'Unknown, ended or withdrawn: the same answer for each',
    409: 'As many words as a link takes on one version have been given',
  },
})

export const verdictOperations = [
  readReview,
  askReview,
  callOffReview,
  answerChecklist,
  giveVerdict,
  withdrawVersion,
  readApproval,
  openVersionForReview,
  readEvidence,
  listReviews,
  giveGuestVerdict,
]
