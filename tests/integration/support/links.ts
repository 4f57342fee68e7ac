import { expect } from 'vitest'
import type { Operation } from '@/lib/auth/access'
import type { OpenedScene } from '@/lib/contracts/scenes'
import type { ShareLink } from '@/lib/contracts/share-links'
import { call, type Answer } from './call'
import { sceneOf } from './documents'
import { anchorOn } from './notes'
import type { Someone } from './people'

export async function newScene({ cookie }: Someone, title = 'For Delphine'): Promise<string> {
  const body = { title, document: sceneOf('single-450', { angleDeg: 11 }) }
  const created = await call('POST', '/api/v1/scenes', { cookie, body })
  expect(created.status).toBe(201)
  return (created.body as OpenedScene).scene.id
}

export interface MadeLink {
  link: ShareLink
  url: string
  token: string
}

export async function newLink({ cookie }: Someone, sceneId: string, body: object = {}): Promise<MadeLink> {
  const answer = await call('POST', `/api/v1/scenes/${sceneId}/share-links`, { cookie, body })
  expect(answer.status, JSON.stringify(answer.body)).toBe(201)
  const { link, url } = answer.body as { link: ShareLink; url: string }
  return { link, url, token: url.split('/s/')[1] }
}

export const linksOf = async (someone: Someone, sceneId: string) =>
  (
    (await call('GET', `/api/v1/scenes/${sceneId}/share-links`, { cookie: someone.cookie })).body as {
      links: ShareLink[]
    }
  ).links

export interface BehindLink {
  method: string
  path: string
  /** As the access table names it. */
  operation: Operation
  body?: unknown
  /** Done before it, where it needs something to be there. */
  after?: Omit<BehindLink, 'operation'>
}

const note = {
  method: 'POST',
  path: '/notes',
  body: {
    name: 'Delphine',
    anchor: anchorOn('single-450', 'counterweight:1F'),
    words: 'Is this the heavy one?',
  },
}

/** Every call of the interface that a link opens; a new one is added here and thereby guarded by the tests. */
export const behindLinks: readonly BehindLink[] = [
  { method: 'GET', path: '', operation: 'scene.read' },
  { method: 'GET', path: '/poster.png', operation: 'scene.read' },
  { method: 'GET', path: '/card.png', operation: 'scene.read' },
  { method: 'POST', path: '/openings', operation: 'opening.count' },
  {
    method: 'POST',
    path: '/openings/01900000-0000-7000-8000-000000000000',
    operation: 'opening.count',
    body: { drawingSeconds: 1, figuresSeconds: 0, notesSeconds: 0 },
  },
  {
    method: 'POST',
    path: '/questions',
    operation: 'question.ask',
    body: { name: 'Delphine', email: 'delphine@example.com', question: 'Which rod?', writtenForMs: 9_000 },
  },
  { method: 'GET', path: '/notes', operation: 'note.read' },
  { ...note, operation: 'note.write' },
  {
    method: 'POST',
    path: '/notes/1/posts',
    operation: 'note.write',
    body: { name: 'Delphine', words: 'I see.' },
    after: note,
  },
  {
    method: 'POST',
    path: '/verdict',
    operation: 'verdict.give',
    body: { name: 'Delphine', word: 'comment', sentence: 'It runs.' },
  },
]

export async function askBehind(
  token: string,
  { method, path, body, after }: Omit<BehindLink, 'operation'>,
  headers: Record<string, string> = {},
): Promise<Answer> {
  if (after) await askBehind(token, after, headers)
  return call(method, `/api/v1/shared/${token}${path}`, { body, headers })
}
