'use client'

import { lazy, Suspense } from 'react'
import type { DeskProps } from './desk'

const Desk = lazy(() => import('./desk'))

/** What a guest's page has beside the drawing; fetched once the engine is seen. */
export const SecondStep = (props: DeskProps) => (
  <Suspense>
    <Desk {...props} />
  </Suspense>
)
