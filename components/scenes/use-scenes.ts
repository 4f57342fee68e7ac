'use client'

import { usePages } from '@/components/ui/use-pages'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { listScenes, sceneLayouts } from '@/lib/contracts/scenes'
import type { AnswerOf } from '@/lib/contracts/operation'

export type SceneState = 'current' | 'archived'
export type SceneLayout = 'all' | (typeof sceneLayouts)[number]
type Page = AnswerOf<typeof listScenes>

/** The register, a page at a time as the database cuts it. */
export function useScenes(workshop: string, state: SceneState, layout: SceneLayout, search: string) {
  const { pages, ...rest } = usePages<Page>(
    (after) =>
      addressOf(
        '/api/v1/scenes',
        {},
        { workshop, state, search, layout: layout === 'all' ? undefined : layout, after },
      ),
    readAddress,
  )
  return { scenes: pages?.flatMap((page) => page.scenes) ?? [], ...rest }
}
