'use client'

import { Segmented } from '@/components/ui/segmented'
import type { Beside, Comparison } from './use-comparison'

/** How the older version is drawn with the newer one. */
export function GhostChoice({ comparison }: { comparison: Comparison }) {
  const { older, beside, setBeside } = comparison
  if (older === null) return null
  return (
    <Segmented<Beside>
      label={`Drawing of version ${older}`}
      className="big2"
      value={beside}
      options={[
        { value: 'alone', label: 'Alone' },
        { value: 'ghost', label: `Ghost of ${older}` },
        { value: 'side', label: 'Side by side' },
      ]}
      onChange={setBeside}
    />
  )
}
