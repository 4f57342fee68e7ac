import type { Review } from '@/lib/contracts/verdicts'
import { givenWords } from '@/lib/review/version-states'
import { timeWords } from './use-review'

/** What has been said of a version, the latest first. */
export function VerdictLines({ review, most }: { review: Review; most?: number }) {
  const shown = review.verdicts.slice(0, most)
  const more = review.verdicts.length - shown.length
  if (shown.length === 0) return <p className="cap">Nobody has said anything yet.</p>
  return (
    <ul className="verdict-lines">
      {shown.map((verdict) => (
        <li key={verdict.id}>
          <b>{givenWords[verdict.word]}</b>, {verdict.person}
          {verdict.guest ? ' (guest)' : ''}
          <span className="cap"> {timeWords(verdict.at)}</span>
          {verdict.sentence ? <span className="said">“{verdict.sentence}”</span> : null}
        </li>
      ))}
      {more > 0 ? <li className="cap">and {more} more, in the evidence</li> : null}
    </ul>
  )
}
