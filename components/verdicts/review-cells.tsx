'use client'

import { useEffect, useState } from 'react'
import { TitleCell } from '@/components/shell/title-block'
import { useSlip } from '@/components/ui/slips'
import type { Operation } from '@/lib/auth/access'
import { call } from '@/lib/contracts/call'
import type { callOffReview, Review } from '@/lib/contracts/verdicts'
import { isApproval, stateWords } from '@/lib/review/version-states'
import { AskReview } from './ask-review'
import { ChecklistDialog } from './checklist-dialog'
import { EvidenceDialog } from './evidence-dialog'
import { noteOpening } from './note-opening'
import {
  dayWords,
  heldWords,
  paramsOf,
  refusalWords,
  reviewPath,
  useReview,
  type OfVersion,
} from './use-review'
import { WithdrawDialog } from './withdraw-dialog'

type Open = 'checklist' | 'evidence' | 'ask' | 'withdraw' | null

/** What the title block says of a review: which version, how it stands, who drew and who checked it, and what can be done. */
export function ReviewCells({ may, ...of }: OfVersion & { may: readonly Operation[] }) {
  const { sceneId, version } = of
  const { review, put } = useReview(of)
  const [open, setOpen] = useState<Open>(null)
  const slip = useSlip()
  useEffect(() => void noteOpening({ sceneId, version }), [sceneId, version])
  if (!review) {
    return (
      <TitleCell k="Version" span={6} first>
        <span className="v">{version}</span>
      </TitleCell>
    )
  }
  const { request } = review
  const items = request?.checklist.length ?? 0
  const askHeld = heldWords(review, 'ask')
  const withdrawHeld = heldWords(review, 'withdraw')

  async function callOff() {
    try {
      put(await call<typeof callOffReview>({ method: 'DELETE', path: reviewPath, params: paramsOf(of) }))
      slip({ text: `The review of version ${version} is called off.` })
    } catch (error) {
      slip({ text: refusalWords(error), mark: 'less' })
    }
  }

  return (
    <>
      <TitleCell k="Version" span={2} first>
        <span className="v">
          {version} of {review.headVersion}
        </span>
      </TitleCell>
      <TitleCell k="Status" span={2}>
        <span className="v" title={review.reason || undefined}>
          {stateWords[review.state]}
        </span>
      </TitleCell>
      <TitleCell k="Due" span={2}>
        <span className="v">{request?.ended === null ? dayWords(request.due) : 'no day set'}</span>
      </TitleCell>
      <TitleCell k="Drawn by" span={3} first>
        <span className="v">{review.author}</span>
      </TitleCell>
      <TitleCell k="Checked by" span={3}>
        <span className="v">{checkedBy(review)}</span>
      </TitleCell>
      <TitleCell k="Checklist" span={3} first>
        {items > 0 ? (
          <button type="button" className="v cell-button" onClick={() => setOpen('checklist')}>
            {review.answered} of {items} answered
          </button>
        ) : (
          <span className="v">none</span>
        )}
      </TitleCell>
      <TitleCell k="Approval" span={3}>
        <span className="v">{sinceApproval(review)}</span>
      </TitleCell>
      <div className="c6 acts first review-acts">
        <button type="button" className="btn txt sm" onClick={() => setOpen('evidence')}>
          Evidence…
        </button>
        {may.includes('version.withdraw') && review.state !== 'withdrawn' ? (
          <button
            type="button"
            className="btn txt sm"
            disabled={Boolean(withdrawHeld)}
            onClick={() => setOpen('withdraw')}
          >
            Withdraw version…
          </button>
        ) : null}
        <span className="grow" />
        {may.includes('review.ask') ? (
          <>
            {review.state === 'in-review' ? (
              <button type="button" className="btn sm" onClick={() => void callOff()}>
                Call off
              </button>
            ) : null}
            <button
              type="button"
              className="btn sm"
              disabled={Boolean(askHeld)}
              onClick={() => setOpen('ask')}
            >
              {askHeld ? 'Ask for review' : 'Ask for review…'}
            </button>
          </>
        ) : null}
        {askHeld ? <span className="cap held-words">held: {askHeld}</span> : null}
      </div>
      {open === 'checklist' ? (
        <ChecklistDialog
          review={review}
          may={may.includes('verdict.give')}
          onAnswer={put}
          onClose={() => setOpen(null)}
        />
      ) : null}
      {open === 'evidence' ? <EvidenceDialog review={review} onClose={() => setOpen(null)} /> : null}
      {open === 'withdraw' ? (
        <WithdrawDialog review={review} onAnswer={put} onClose={() => setOpen(null)} />
      ) : null}
      {open === 'ask' ? (
        <AskReview
          review={review}
          onAnswer={(answer) => {
            put(answer)
            slip({ text: `The review of version ${version} is asked for. Everybody named is told by mail.` })
          }}
          onClose={() => setOpen(null)}
        />
      ) : null}
    </>
  )
}

/** Who approved it or, as long as nobody has, who is asked to. */
function checkedBy({ verdicts, request }: Review): string {
  const approval = verdicts.find(({ word, guest }) => !guest && isApproval(word))
  if (approval) return approval.person
  const asked = request?.ended === null ? request.reviewers.map(({ name }) => name) : []
  return asked.length > 0 ? `asked: ${asked.join(', ')}` : 'nobody yet'
}

function sinceApproval({ approved, version }: Pick<Review, 'approved' | 'version'>): string {
  if (!approved) return 'nothing approved yet'
  if (approved.version === version) return 'this version'
  if (approved.same) return `same as version ${approved.version}`
  return approved.version < version
    ? `changed since version ${approved.version}`
    : `version ${approved.version} is approved`
}
