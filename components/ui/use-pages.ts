'use client'

import useSWRInfinite, { type SWRInfiniteConfiguration } from 'swr/infinite'

/**
 * A list that the database cuts into pages, read as far as somebody asked. `addressOf` gives the address of the page
 * after a cursor, of the first without one, and null where there is nothing to read.
 */
export function usePages<Page extends { next: string | number | null }>(
  addressOf: (after: NonNullable<Page['next']> | undefined) => string | null,
  read: (address: string) => Promise<Page>,
  settings: SWRInfiniteConfiguration<Page, Error> = {},
) {
  const { data, error, isLoading, isValidating, size, setSize, mutate } = useSWRInfinite<Page, Error>(
    (index: number, before: Page | null) =>
      before && before.next === null ? null : addressOf(index ? (before?.next ?? undefined) : undefined),
    read,
    // what was changed a moment ago may stand on another page: each is read anew when it is shown
    { keepPreviousData: true, dedupingInterval: 0, ...settings },
  )
  const last = data?.at(-1)
  return {
    /** Null until the first has come. */
    pages: data ?? null,
    loading: isLoading,
    busy: isValidating,
    error,
    more: last && last.next !== null ? () => void setSize(size + 1) : null,
    refresh: () => mutate(),
  }
}
