'use client'

import useSWR from 'swr'
import { Dialog } from '@/components/ui/dialog'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { ApprovalAnswer, Evidence, Review } from '@/lib/contracts/verdicts'
import { answerWords } from '@/lib/review/version-states'
import { paramsOf, timeWords } from './use-review'
import { VerdictLines } from './verdict-lines'

const base = '/api/v1/scenes/{id}/versions/{number}'

/** Who opened the version, what each answered and said, and whether what was approved is still what is stored. */
export function EvidenceDialog({ review, onClose }: { review: Review; onClose(): void }) {
  const of = paramsOf(review)
  const { data } = useSWR<{ evidence: Evidence }, Error>(addressOf(`${base}/evidence`, of), readAddress)
  const { data: approved } = useSWR<{ approval: ApprovalAnswer | null }, Error>(
    addressOf(`${base}/approval`, of),
    readAddress,
  )
  const approval = approved?.approval
  return (
    <Dialog
      title={`Evidence of the review of version ${review.version}`}
      about={{ k: 'Scene', v: review.title }}
      wide
      onClose={onClose}
      actions={
        <button type="button" className="btn pri" onClick={onClose}>
          Close
        </button>
      }
    >
      {data ? (
        <div className="evidence">
          <h3>Said</h3>
          <VerdictLines review={review} />
          {approval ? (
            <p className="cap hash">
              SHA-256 of what was approved: <span className="fig">{approval.hash}</span>
              <br />
              Worked out again now from what is stored:{' '}
              <b>{approval.recomputed === approval.hash ? 'the same' : 'another one'}</b>
            </p>
          ) : null}
          <h3>Opened</h3>
          {data.evidence.openings.length === 0 ? <p className="cap">By nobody yet.</p> : null}
          <ul>
            {data.evidence.openings.map((opening) => (
              <li key={opening.person + opening.firstAt}>
                {opening.person}
                <span className="cap">
                  {' '}
                  first {timeWords(opening.firstAt)}, last {timeWords(opening.lastAt)}
                </span>
              </li>
            ))}
          </ul>
          <h3>Checklist</h3>
          {data.evidence.answers.length === 0 ? <p className="cap">Nothing answered yet.</p> : null}
          <ul>
            {data.evidence.answers.map((answer) => (
              <li key={answer.request + answer.person + answer.item}>
                {answer.item}: <b>{answerWords[answer.answer]}</b>, {answer.person}
                {answer.words ? <span className="said">“{answer.words}”</span> : null}
              </li>
            ))}
          </ul>
        </div>
      ) : (
        <p className="cap">Setting out the evidence</p>
      )}
    </Dialog>
  )
}
