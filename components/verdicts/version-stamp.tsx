'use client'

import type { Review } from '@/lib/contracts/verdicts'
import { givenWords, isDecisive } from '@/lib/review/version-states'
import { dayOfTime, useReview, type OfVersion } from './use-review'

/** The last word on a version as a stamp on its drawing: double edge, cut corners or dashed, and always the word. */
export function VersionStamp(of: OfVersion) {
  const { review } = useReview(of)
  const stamp = review && stampOf(review)
  if (!stamp) return null
  return (
    <p className={`stamp version-stamp ${stamp.look}`}>
      <b>{stamp.word}</b>
      <span>{stamp.line}</span>
    </p>
  )
}

function stampOf({ state, verdicts, version, reason }: Review) {
  if (state === 'withdrawn') return { look: 'ask', word: 'Withdrawn', line: `version ${version}: ${reason}` }
  if (state === 'superseded') return { look: 'com', word: 'Superseded', line: `version ${version}` }
  const own = verdicts.filter(({ guest }) => !guest)
  const said = state === 'draft' || state === 'in-review' ? own[0] : own.find(({ word }) => isDecisive(word))
  if (!said || (said.word !== 'comment' && (state === 'draft' || state === 'in-review'))) return null
  const look = { approve: '', 'approve-with-remarks': '', 'ask-for-changes': 'ask', comment: 'com' }[
    said.word
  ]
  return {
    look,
    word: said.word === 'ask-for-changes' ? 'Changes asked' : givenWords[said.word],
    line: `version ${version}, ${said.person}, ${dayOfTime(said.at)}`,
  }
}
