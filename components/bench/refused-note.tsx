'use client'

import { FieldNote } from '@/components/ui/field-note'
import type { Field } from '@/scene/session/field'
import { fitOrder } from '@/scene/session/fit-order'
import { applyChanges } from '@/scene/session/path'
import { useBench } from '@/scene/session/react'
import type { Refusal } from '@/scene/session/session'

/** Where a new firing order is the usual way out: the throws or banks were turned, or a cylinder moved. */
const needsOrder = /^(firingOrder|throws|banks|bankAngle|cycle|cylinders\.\d+\.(bank|throw))/

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
  const { head, message, keep, key, text, changes } = refusal
  const enter = (next: string) => {
    session.enter(field, next)
    session.seal()
  }
  const mends = refusal.mends.map((mend) => ({ label: mend.label, run: () => enter(mend.text) }))
  const repair =
    changes && !keep && needsOrder.test(key) ? orderRepair(session.getState().scene, changes) : null
  if (repair)
    mends.push({
      label: `Use order ${repair.order.join('-')}`,
      run: () => {
        if (session.edit(repair.changes)) session.drop(key)
      },
    })
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

function orderRepair(scene: Parameters<Field['read']>[1], changes: NonNullable<Refusal['changes']>) {
  const order = fitOrder(applyChanges(scene, changes).train)
  return { order, changes: [...changes, { path: ['train', 'firingOrder'], value: order }] }
}
