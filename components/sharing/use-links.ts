'use client'

import useSWR from 'swr'
import { addressOf, call, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type {
  changeShareLink,
  createShareLink,
  eraseLinkQuestions,
  eraseOpenings,
  listLinkQuestions,
  listOpenings,
  listShareLinks,
  revokeShareLink,
} from '@/lib/contracts/share-links'
import type { bodyOf } from './link-draft'

type Body = ReturnType<typeof bodyOf>

/** The links of a scene, and what can be done to them. */
export function useLinks(sceneId: string) {
  const path = '/api/v1/scenes/{id}/share-links' as const
  const { data, error, mutate } = useSWR(
    addressOf(path, { id: sceneId }),
    readAddress<AnswerOf<typeof listShareLinks>>,
  )
  const one = '/api/v1/share-links/{id}' as const
  return {
    links: data?.links,
    error: error as Error | undefined,
    async make(body: Body) {
      const made = await call<typeof createShareLink>({ method: 'POST', path, params: { id: sceneId }, body })
      await mutate()
      return made
    },
    async change(id: string, body: Body) {
      await call<typeof changeShareLink>({ method: 'PATCH', path: one, params: { id }, body })
      await mutate()
    },
    async withdraw(id: string) {
      await call<typeof revokeShareLink>({ method: 'DELETE', path: one, params: { id } })
      await mutate()
    },
    async erase(id: string, what: 'openings' | 'questions') {
      if (what === 'openings')
        await call<typeof eraseOpenings>({ method: 'DELETE', path: `${one}/openings`, params: { id } })
      else
        await call<typeof eraseLinkQuestions>({ method: 'DELETE', path: `${one}/questions`, params: { id } })
      await mutate()
    },
  }
}

export const openingsAddress = (id: string) => addressOf('/api/v1/share-links/{id}/openings', { id })
export const questionsAddress = (id: string) => addressOf('/api/v1/share-links/{id}/questions', { id })

export type OpeningsPage = AnswerOf<typeof listOpenings>
export type QuestionsPage = AnswerOf<typeof listLinkQuestions>
