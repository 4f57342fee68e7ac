import useSWR from 'swr'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { getSession } from '@/lib/contracts/people'
import type { listScenes, OpenedScene } from '@/lib/contracts/scenes'

const once = { shouldRetryOnError: false, revalidateOnFocus: false }

/** Saved scenes of the workshop, the latest first; none for somebody who is not signed in. */
export function useWorkshopScenes() {
  const { data: session } = useSWR<AnswerOf<typeof getSession>>('/api/v1/auth/session', readAddress, once)
  const person = session?.person
  const { data } = useSWR<AnswerOf<typeof listScenes>>(
    person ? addressOf('/api/v1/scenes', {}, { limit: 100 }) : null,
    readAddress,
    once,
  )
  return { scenes: data?.scenes ?? [], guest: person === null }
}

export const readSceneOf = (id: string) => readAddress<OpenedScene>(addressOf('/api/v1/scenes/{id}', { id }))
