'use client'

import useSWRInfinite from 'swr/infinite'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { listScenes, sceneLayouts } from '@/lib/contracts/scenes'
import type { AnswerOf } from '@/lib/contracts/operation'

export type SceneState = 'current' | 'archived'
export type SceneLayout = 'all' | (typeof sceneLayouts)[number]
type Page = AnswerOf<typeof listScenes>

/** The register, a page at a time as the database cuts it. */
export function useScenes(workshop: string, state: SceneState, layout: SceneLayout, search: string) {
  const { data, error, isLoading, isValidating, size, setSize, mutate } = useSWRInfinite<Page, Error>(
    (index: number, before: Page | null) =>
      before && !before.next
        ? null
        : addressOf(
            '/api/v1/scenes',
            {},
            {
              ...{ workshop, state, search },
              layout: layout === 'all' ? undefined : layout,
              after: index ? before?.next : undefined,
            },
          ),
    readAddress,
    // what was archived a moment ago is already in the other list: each is read anew when it is shown
    { keepPreviousData: true, dedupingInterval: 0 },
  )
  return {
    scenes: data?.flatMap((page) => page.scenes) ?? [],
    loading: isLoading,
    busy: isValidating,
    error,
    more: data && data[data.length - 1]?.next ? () => setSize(size + 1) : null,
    refresh: () => mutate(),
  }
}
