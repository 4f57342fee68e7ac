'use client'

import useSWRInfinite from 'swr/infinite'
import { readAddress } from '@/lib/contracts/call'

/** A list of a link, a page at a time as the database cuts it. */
export function useLog<Page extends { next: string | null }>(address: string) {
  const { data, error, size, setSize, mutate } = useSWRInfinite<Page, Error>(
    (index: number, before: Page | null) =>
      before && before.next === null
        ? null
        : `${address}?limit=50${index > 0 && before ? `&before=${before.next}` : ''}`,
    readAddress,
    { dedupingInterval: 0 },
  )
  return {
    ...{ pages: data, error },
    more: data?.at(-1)?.next ? () => setSize(size + 1) : null,
    refresh: () => mutate(),
  }
}
