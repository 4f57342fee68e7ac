import useSWRInfinite from 'swr/infinite'
import { addressOf, readAddress } from '@/lib/contracts/call'

/** A list that the database cuts into pages, read as far as somebody asked. */
export function usePages<Page extends { next: string | null }>(path: string | null) {
  const { data, error, isLoading, size, setSize, mutate } = useSWRInfinite<Page, Error>(
    (index: number, before: Page | null) =>
      path === null || (before && !before.next)
        ? null
        : addressOf(path, {}, { limit: 50, after: index ? before?.next : undefined }),
    readAddress,
    { keepPreviousData: true, dedupingInterval: 0 },
  )
  const last = data?.[data.length - 1]
  return {
    pages: data ?? [],
    loading: isLoading,
    error,
    more: last?.next ? () => void setSize(size + 1) : null,
    refresh: () => mutate(),
  }
}
