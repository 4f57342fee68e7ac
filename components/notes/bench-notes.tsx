'use client'

import Link from 'next/link'
import type { Operation } from '@/lib/auth/access'
import { everyNote, useNoteList } from './use-notes'

interface Props {
  sceneId: string
  version: number
  may: readonly Operation[]
}

/** How many notes on the saved version are open, and the way to them. */
export const BenchNotes = ({ may, ...of }: Props) => (may.includes('note.read') ? <Count {...of} /> : null)

function Count({ sceneId, version }: Omit<Props, 'may'>) {
  const { counts } = useNoteList(sceneId, version, everyNote)
  if (!counts || counts.all === 0) return null
  const { open, openErrors } = counts
  return (
    <div className="c6 first bench-standing">
      <span className="cap">
        <Link href={`/scenes/${sceneId}/review?version=${version}`} prefetch={false}>
          Notes: {open === 0 ? 'all settled' : `${open} open`}
          {openErrors > 0 ? `, ${openErrors} of them ${openErrors === 1 ? 'an error' : 'errors'}` : ''}
        </Link>
      </span>
    </div>
  )
}
