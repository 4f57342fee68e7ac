import { z } from 'zod'
import { linkKinds } from '@/lib/auth/access'
import { emailSchema, idSchema, themeSchema, timeSchema } from './common'
import { sceneDocument } from './documents'
import { operation } from './operation'

/** Any text: what could not be a token is answered like one that is not known. */
const byToken = z.object({ token: z.string() })

/** How everything behind a link is refused, in this order. */
export const linkProblems = {
  401: 'The link wants a password',
  403: 'The link does not include this',
  404: 'Unknown, ended or withdrawn: the same answer for each',
} as const

export const mostOfQuestions = { name: 120, words: 2_000, view: 120 } as const

export const sharedSceneSchema = z
  .object({
    title: z.string(),
    workshop: z.string(),
    kind: z.enum(linkKinds),
    version: z.int().min(1),
    /** How many the scene has: their number, nothing of what is in them. */
    versions: z.int().min(1),
    savedAt: timeSchema,
    /** The workshop's stamp on this version, if it has one that still holds. */
    approved: z.object({ word: z.enum(['approve', 'approve-with-remarks']), at: timeSchema }).nullable(),
    endsAt: timeSchema.nullable(),
    /** For how many days it is kept when and how the link was opened. */
    openingsKeptDays: z.int(),
    /** Some site may show it in a frame. */
    framable: z.boolean(),
    /** It wanted a password. */
    locked: z.boolean(),
    document: sceneDocument,
  })
  .meta({ id: 'SharedScene' })
export type SharedScene = z.output<typeof sharedSceneSchema>

export const openShareLink = operation({
  id: 'openShareLink',
  method: 'GET',
  path: '/api/v1/shared/{token}',
  summary: 'What a share link opens',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  status: 200,
  answer: sharedSceneSchema,
  problems: linkProblems,
})

export const passLink = operation({
  id: 'passLink',
  method: 'POST',
  path: '/api/v1/shared/{token}/pass',
  summary: 'Give the password of a link; the pass is set as a cookie, and told for where none is sent',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  body: z.object({ password: z.string().min(1).max(200) }),
  status: 200,
  /** To be sent as the header X-Link-Pass; null where no password is wanted. */
  answer: z.object({ pass: z.string().nullable(), seconds: z.int() }),
  problems: linkProblems,
})

export const countOpening = operation({
  id: 'countOpening',
  method: 'POST',
  path: '/api/v1/shared/{token}/openings',
  summary: 'Count that somebody has the page of a share link before them',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  status: 200,
  /** Null where it is not counted: for robots and the workshop's own people. */
  answer: z.object({ opening: idSchema.nullable() }),
  problems: linkProblems,
})

const seconds = z.int().min(0).max(86_400)

export const keepLooking = operation({
  id: 'keepLooking',
  method: 'POST',
  path: '/api/v1/shared/{token}/openings/{opening}',
  summary: 'Tell for how long the parts of the page have been looked at so far',
  for: 'anyone',
  limit: 'shared',
  params: byToken.extend({ opening: idSchema }),
  body: z.object({ drawingSeconds: seconds, figuresSeconds: seconds, notesSeconds: seconds }),
  status: 204,
  problems: linkProblems,
})

export const askQuestion = operation({
  id: 'askQuestion',
  method: 'POST',
  path: '/api/v1/shared/{token}/questions',
  summary: 'Ask whoever sent the link',
  for: 'anyone',
  limit: 'guest-writing',
  params: byToken,
  body: z.object({
    name: z.string().trim().min(1).max(mostOfQuestions.name),
    email: emailSchema,
    question: z.string().trim().min(1).max(mostOfQuestions.words),
    /** What stands before whoever asks. */
    angleDeg: z.number().min(-360).max(1440).nullable().default(null),
    view: z.string().trim().max(mostOfQuestions.view).nullable().default(null),
    /** Nobody sees this field: what fills it in is no person. */
    website: z.string().max(500).default(''),
    /** For how long the question was being written. */
    writtenForMs: z.number().min(0),
  }),
  status: 202,
  problems: linkProblems,
})

const picture = {
  method: 'GET',
  for: 'anyone',
  limit: 'shared',
  params: byToken,
  query: z.object({ theme: themeSchema.default('light') }),
  status: 200,
  media: 'image/png',
  problems: linkProblems,
} as const

export const sharedPoster = operation({
  ...picture,
  id: 'sharedPoster',
  path: '/api/v1/shared/{token}/poster.png',
  summary: 'A picture of what a share link opens',
})

export const sharedCard = operation({
  ...picture,
  id: 'sharedCard',
  path: '/api/v1/shared/{token}/card.png',
  summary: 'The picture that stands beside the link where it is talked about',
})

const pixels = z.coerce.number().int().min(200).max(4_000)

export const embedDescription = operation({
  id: 'embedDescription',
  method: 'GET',
  path: '/api/v1/oembed',
  summary: 'How to put a link’s page into another (oEmbed 1.0, JSON)',
  for: 'anyone',
  limit: 'shared',
  query: z.object({
    url: z.string().max(2_000),
    maxwidth: pixels.optional(),
    maxheight: pixels.optional(),
    format: z.literal('json').default('json'),
  }),
  status: 200,
  answer: z.object({
    version: z.literal('1.0'),
    type: z.literal('rich'),
    title: z.string(),
    provider_name: z.string(),
    provider_url: z.url(),
    width: z.int(),
    height: z.int(),
    html: z.string(),
    thumbnail_url: z.url(),
    thumbnail_width: z.int(),
    thumbnail_height: z.int(),
  }),
  problems: linkProblems,
})

export const sharedOperations = [
  openShareLink,
  passLink,
  countOpening,
  keepLooking,
  askQuestion,
  sharedPoster,
  sharedCard,
  embedDescription,
]
