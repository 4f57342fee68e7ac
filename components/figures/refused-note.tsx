'use client'

import { FieldNote } from '@/components/ui/field-note'
import type { Field } from '@/scene/session/field'
import { useBench } from '@/scene/session/react'
import type { Refusal } from '@/scene/session/session'

interface Props {
  id: string
  refusal: Refusal
  field: Field
  /** The last good value, as written. */
  stands: string
}

/** The note under a field whose text was not taken. */
export function RefusedNote({ id, refusal, field, stands }: Props) {
  const { session } = useBench()
  const { head, message, keep, key, text } = refusal
  const enter = (next: string) => {
    session.enter(field, next)
    session.seal()
  }
  const mends = refusal.mends.map((mend) => ({
    label: mend.label,
    run: () => {
      if ('text' in mend) enter(mend.text)
      else if (session.edit(mend.changes)) session.drop(key)
    },
  }))
  if (mends.length === 0 && stands) mends.push({ label: `Back to ${stands}`, run: () => session.drop(key) })
  return (
    <FieldNote
      id={id}
      head={head}
      text={`${message}${keep && stands ? ` The drawing keeps ${stands}.` : ''}`}
      mends={mends}
      keep={
        keep
          ? {
              label: keep,
              run: () => {
                session.enter(field, text, true)
                session.seal()
              },
            }
          : undefined
      }
    />
  )
}
