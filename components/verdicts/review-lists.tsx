'use client'

import Link from 'next/link'
import { useState } from 'react'
import { Tabs } from '@/components/ui/tabs'
import { usePages } from '@/components/ui/use-pages'
import { addressOf, readAddress } from '@/lib/contracts/call'
import type { AnswerOf } from '@/lib/contracts/operation'
import type { ListedReview, listReviews, ReviewList } from '@/lib/contracts/verdicts'
import { stateWords } from '@/lib/review/version-states'
import { dayOfTime, dayWords } from './use-review'

type Page = AnswerOf<typeof listReviews>

const lists: { value: ReviewList; label: string }[] = [
  { value: 'of-me', label: 'Asked of you' },
  { value: 'by-me', label: 'You asked' },
  { value: 'decided', label: 'Decided' },
]

const nothing: Record<ReviewList, string> = {
  'of-me': 'Nothing waits for your verdict.',
  'by-me': 'You have asked for no review yet. Open a version of a scene and ask from its title block.',
  decided: 'Nothing has been decided in this workshop yet.',
}

/** What waits for one’s verdict, what one has asked for, and what was decided lately. */
export function ReviewLists({ workshop, judges }: { workshop: string; judges: boolean }) {
  const shown = judges ? lists : lists.slice(1)
  const [list, setList] = useState<ReviewList>(shown[0].value)
  const { pages, error, loading, more, refresh } = usePages<Page>(
    (after) => addressOf('/api/v1/reviews', {}, { workshop, list, after }),
    readAddress,
  )
  const reviews = pages?.flatMap((page) => page.reviews) ?? []
  return (
    <section className="reg" aria-label="Reviews">
      <div className="regtop">
        <h1>Review</h1>
      </div>
      <Tabs<ReviewList> label="List" value={list} tabs={shown} onChange={setList}>
        {error ? (
          <div className="state" role="alert">
            <p>
              <b>The list is out of reach.</b>
              <br />
              <button type="button" className="btn txt" onClick={() => void refresh()}>
                Try now
              </button>
            </p>
          </div>
        ) : reviews.length > 0 ? (
          <table className="revt">
            <thead>
              <tr>
                <th>Scene</th>
                <th>Version</th>
                <th>Status</th>
                <th>{list === 'decided' ? 'Answered' : 'Due'}</th>
                <th>{list === 'by-me' ? 'Asked of' : 'Asked by'}</th>
              </tr>
            </thead>
            <tbody>
              {reviews.map((review) => (
                <Row key={review.id} review={review} list={list} />
              ))}
            </tbody>
          </table>
        ) : (
          <div className="state">
            <p>{loading ? 'Setting out the list' : nothing[list]}</p>
          </div>
        )}
        {more ? (
          <p className="reg-more">
            <button type="button" className="btn" onClick={more}>
              Show more
            </button>
          </p>
        ) : null}
      </Tabs>
    </section>
  )
}

const today = () => {
  const now = new Date()
  return [now.getFullYear(), now.getMonth() + 1, now.getDate()]
    .map((part) => String(part).padStart(2, '0'))
    .join('-')
}

function Row({ review, list }: { review: ListedReview; list: ReviewList }) {
  const { sceneId, version, headVersion, title, message, reviewers } = review
  const late = review.ended === null && review.due < today()
  return (
    <tr>
      <th scope="row">
        <Link href={`/scenes/${sceneId}/review?version=${version}`}>{title}</Link>
        {message ? <span className="cap">{message}</span> : null}
      </th>
      <td className="fig">
        <span className="phone-only-inline">version </span>
        {version} of {headVersion}
      </td>
      <td>{stateWords[review.state]}</td>
      <td className={late ? 'late' : undefined}>
        {list === 'decided' && review.endedAt
          ? dayOfTime(review.endedAt)
          : `${dayWords(review.due)}${late ? ', past' : ''}`}
      </td>
      <td>{list === 'by-me' ? reviewers.join(', ') : review.askedBy}</td>
    </tr>
  )
}
