import { usePages } from '@/components/ui/use-pages'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { listVersions } from '@/lib/contracts/scenes'

type Page = AnswerOf<typeof listVersions>

/** Versions of a scene, the newest first, a page at a time as the database cuts it. */
export function useVersions(sceneId: string) {
  const { pages, error, more, refresh } = usePages<Page>(
    (before) => addressOf('/api/v1/scenes/{id}/versions', { id: sceneId }, { before }),
    readAddress,
    { shouldRetryOnError: false },
  )
  return {
    versions: pages?.flatMap((page) => page.versions) ?? [],
    loading: !pages && !error,
    ...{ error, more, refresh },
  }
}
