'use client'

import Link from 'next/link'
import { useEffect } from 'react'
import type { Operation } from '@/lib/auth/access'
import { stateWords } from '@/lib/review/version-states'
import { noteOpening } from './note-opening'
import { useReview, type OfVersion } from './use-review'

interface Props extends OfVersion {
  may: readonly Operation[]
  /** The bench holds something else than the version. */
  changed: boolean
}

/** One line of the bench's title block: how the version stands, and whether what is here has changed since an approval. */
export function BenchStanding({ may, changed, ...of }: Props) {
  return may.includes('review.read') ? <Line {...of} changed={changed} /> : null
}

function Line({ changed, ...of }: Omit<Props, 'may'>) {
  const { sceneId, version } = of
  const { review } = useReview(of)
  useEffect(() => void noteOpening({ sceneId, version }), [sceneId, version])
  if (!review) return null
  const { approved, state } = review
  const since =
    approved && (changed || !approved.same) ? `, changed since approval of version ${approved.version}` : ''
  return (
    <div className="c6 first bench-standing">
      <span className="cap">
        <Link href={`/scenes/${sceneId}/review?version=${version}`}>Version {version}</Link>:{' '}
        {stateWords[state].toLowerCase()}
        {since}
      </span>
    </div>
  )
}
