import useSWRInfinite from 'swr/infinite'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { listVersions } from '@/lib/contracts/scenes'

type Page = AnswerOf<typeof listVersions>

/** Versions of a scene, the newest first, a page at a time as the database cuts it. */
export function useVersions(sceneId: string) {
  const { data, error, size, setSize, mutate } = useSWRInfinite<Page, Error>(
    (index: number, before: Page | null) =>
      before && before.next === null
        ? null
        : addressOf(
            '/api/v1/scenes/{id}/versions',
            { id: sceneId },
            { before: index ? before?.next : undefined },
          ),
    readAddress,
    { keepPreviousData: true, shouldRetryOnError: false },
  )
  return {
    versions: data?.flatMap((page) => page.versions) ?? [],
    loading: !data && !error,
    error,
    more: data && data[data.length - 1].next !== null ? () => setSize(size + 1) : null,
    refresh: () => mutate(),
  }
}
