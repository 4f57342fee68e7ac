'use client'

import type { ComponentProps } from 'react'
import { BenchNotes } from '@/components/notes/bench-notes'
import { BenchStanding } from '@/components/verdicts/bench-standing'

/** How the saved version stands with those who judge it, and what they have noted on it. */
export const Standing = (props: ComponentProps<typeof BenchStanding>) => (
  <>
    <BenchStanding {...props} />
    <BenchNotes {...props} />
  </>
)
