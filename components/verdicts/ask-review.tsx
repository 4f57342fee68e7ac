'use client'

import { useId, useRef, useState, type FormEvent } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { call, Refusal } from '@/lib/contracts/call'
import type { askReview, Review } from '@/lib/contracts/verdicts'
import { paramsOf, refusalWords, reviewPath } from './use-review'

interface Props {
  review: Review
  onAnswer(answer: { review: Review }): void
  onClose(): void
}

const inAWeek = () => {
  const day = new Date()
  day.setDate(day.getDate() + 7)
  return [day.getFullYear(), day.getMonth() + 1, day.getDate()]
    .map((part) => String(part).padStart(2, '0'))
    .join('-')
}

/** Whom to ask, until when, with which words and about what. */
export function AskReview({ review, onAnswer, onClose }: Props) {
  const id = useId()
  const key = useRef<string | null>(null)
  const { judges, version, sceneId } = review
  const [people, setPeople] = useState<string[]>(() => (judges.length === 1 ? [judges[0].id] : []))
  const [due, setDue] = useState(inAWeek)
  const [message, setMessage] = useState('')
  const [items, setItems] = useState(() => review.standardChecklist.join('\n'))
  const [refused, setRefused] = useState<{ where: 'people' | 'due' | 'other'; words: string } | null>(null)
  const [busy, setBusy] = useState(false)
  const again = review.request?.ended === null

  async function submit(event: FormEvent) {
    event.preventDefault()
    if (people.length === 0) {
      setRefused({ where: 'people', words: 'Name at least one person.' })
      document.getElementById(`${id}-people`)?.querySelector('input')?.focus()
      return
    }
    if (due === '') {
      setRefused({ where: 'due', words: 'A review wants a day by which it is answered.' })
      return
    }
    setBusy(true)
    try {
      onAnswer(
        await call<typeof askReview>({
          method: 'POST',
          path: reviewPath,
          params: paramsOf({ sceneId, version }),
          body: {
            ...{ reviewers: people, due, message },
            checklist: items.split('\n').flatMap((line) => (line.trim() ? [line.trim()] : [])),
          },
          key: (key.current ??= crypto.randomUUID()),
        }),
      )
      onClose()
    } catch (error) {
      key.current = null
      const words = refusalWords(error)
      const path = error instanceof Refusal ? (error.problem.issues?.[0]?.path ?? '') : ''
      setRefused({ where: path.startsWith('reviewers') ? 'people' : path === 'due' ? 'due' : 'other', words })
    } finally {
      setBusy(false)
    }
  }

  const said = (where: 'people' | 'due' | 'other') => (
    <p className="msg" role="alert" id={`${id}-${where}-refused`}>
      {refused?.where === where ? refused.words : ''}
    </p>
  )

  return (
    <Dialog
      title={`Ask for a review of version ${version}`}
      about={{ k: 'Scene', v: review.title }}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Not yet
          </button>
          <button
            type="submit"
            form={`${id}-form`}
            className="btn pri"
            disabled={busy || judges.length === 0}
          >
            {busy ? 'Asking' : 'Ask for review'}
          </button>
        </>
      }
    >
      <form id={`${id}-form`} className="ask-form" onSubmit={submit}>
        {again ? (
          <p className="cap">The review that is open ends with this one; its answers are not carried over.</p>
        ) : null}
        <fieldset id={`${id}-people`} aria-describedby={`${id}-people-refused`}>
          <legend>Who gives the verdict</legend>
          {judges.length === 0 ? <p>Nobody in this workshop may give one yet.</p> : null}
          {judges.map((judge) => (
            <label key={judge.id} className="pick-one">
              <input
                type="checkbox"
                checked={people.includes(judge.id)}
                onChange={(event) =>
                  setPeople(
                    event.target.checked ? [...people, judge.id] : people.filter((one) => one !== judge.id),
                  )
                }
              />
              {judge.name}
              <span className="cap">{judge.role}</span>
            </label>
          ))}
        </fieldset>
        {said('people')}
        <div className="lf due">
          <label htmlFor={`${id}-due`}>Due, reminded the day before and on the day</label>
          <div className={refused?.where === 'due' ? 'box bad' : 'box'}>
            <input
              id={`${id}-due`}
              type="date"
              value={due}
              aria-describedby={`${id}-due-refused`}
              onChange={(event) => setDue(event.target.value)}
            />
          </div>
        </div>
        {said('due')}
        <div className="lf">
          <label htmlFor={`${id}-message`}>Words to them</label>
          <div className="box">
            <textarea
              id={`${id}-message`}
              rows={2}
              maxLength={2000}
              value={message}
              onChange={(event) => setMessage(event.target.value)}
            />
          </div>
        </div>
        <div className="lf">
          <label htmlFor={`${id}-items`}>
            Checklist, a line an item; each is answered before an approval
          </label>
          <div className="box">
            <textarea
              id={`${id}-items`}
              rows={6}
              value={items}
              onChange={(event) => setItems(event.target.value)}
            />
          </div>
        </div>
        {said('other')}
      </form>
    </Dialog>
  )
}
