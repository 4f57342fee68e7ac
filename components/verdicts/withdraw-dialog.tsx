'use client'

import { useId, useState, type FormEvent } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { call } from '@/lib/contracts/call'
import type { Review, withdrawVersion } from '@/lib/contracts/verdicts'
import { paramsOf, refusalWords } from './use-review'

interface Props {
  review: Review
  onAnswer(answer: { review: Review }): void
  onClose(): void
}

export function WithdrawDialog({ review, onAnswer, onClose }: Props) {
  const id = useId()
  const [reason, setReason] = useState('')
  const [refused, setRefused] = useState('')
  const { version, sceneId } = review
  async function submit(event: FormEvent) {
    event.preventDefault()
    if (reason.trim() === '') return setRefused('Say why: whoever opens this version will read it.')
    try {
      onAnswer(
        await call<typeof withdrawVersion>({
          method: 'POST',
          path: '/api/v1/scenes/{id}/versions/{number}/withdraw',
          params: paramsOf({ sceneId, version }),
          body: { reason },
        }),
      )
      onClose()
    } catch (error) {
      setRefused(refusalWords(error))
    }
  }
  return (
    <Dialog
      title={`Withdraw version ${version}?`}
      about={{ k: 'Scene', v: review.title }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Keep
          </button>
          <button type="submit" form={`${id}-form`} className="btn warn">
            Withdraw version
          </button>
        </>
      }
    >
      <p>
        It stays readable and says that it is withdrawn. No verdict is taken on it any more, and this is not
        undone; an older approved version does not come back by it.
      </p>
      <form id={`${id}-form`} className="lf" onSubmit={submit}>
        <label htmlFor={id}>Why</label>
        <div className={refused ? 'box bad' : 'box'}>
          <input
            id={id}
            value={reason}
            maxLength={500}
            aria-describedby={`${id}-refused`}
            onChange={(event) => setReason(event.target.value)}
          />
        </div>
        <p className="msg" role="alert" id={`${id}-refused`}>
          {refused}
        </p>
      </form>
    </Dialog>
  )
}
