'use client'

import { lazy, Suspense } from 'react'

const Count = lazy(() =>
  import('@/components/sharing/count-looking').then((it) => ({ default: it.CountLooking })),
)

/** Counts a framed page like any other, once the engine is seen. */
export const CountFrame = (props: { token: string; pass: string | null }) => (
  <Suspense>
    <Count {...props} />
  </Suspense>
)
