'use client'

import { useId, useRef, useState, type FormEvent } from 'react'
import { useSlip } from '@/components/ui/slips'
import type { Operation } from '@/lib/auth/access'
import { call, Refusal } from '@/lib/contracts/call'
import type { giveVerdict, Review } from '@/lib/contracts/verdicts'
import { givenWords, verdictWords, type VerdictWord } from '@/lib/review/version-states'
import { ChecklistDialog } from './checklist-dialog'
import { paramsOf, refusalWords, useReview, type OfVersion } from './use-review'
import { verdictLabels as labels } from './verdict-labels'
import { VerdictLines } from './verdict-lines'

/** What each word does, where nothing holds it up. */
const effects = (version: number): Record<VerdictWord, string> => ({
  approve: `freezes version ${version}`,
  'approve-with-remarks': 'freezes it, your remarks beside',
  'ask-for-changes': 'the author makes a new version',
  comment: 'no word on approval',
})

/** One's word on a version; for those who give none, what others have said. */
export function VerdictBar({ may, ...of }: OfVersion & { may: readonly Operation[] }) {
  const { review, error, put } = useReview(of)
  if (error) return <p role="alert">The review cannot be read now. Reload the page to try again.</p>
  if (!review) return <p className="cap">Setting out the review</p>
  if (!may.includes('verdict.give')) {
    return (
      <div className="verdict-read">
        <p className="head">Verdicts on version {of.version}</p>
        <VerdictLines review={review} />
      </div>
    )
  }
  return <VerdictForm key={review.version} review={review} onAnswer={put} />
}

interface FormProps {
  review: Review
  onAnswer(answer: { review: Review }): void
}

function VerdictForm({ review, onAnswer }: FormProps) {
  const id = useId()
  const slip = useSlip()
  const key = useRef<string | null>(null)
  const [chosen, setChosen] = useState<VerdictWord | null>(null)
  const [sentence, setSentence] = useState('')
  const [refused, setRefused] = useState('')
  const [busy, setBusy] = useState(false)
  const [checking, setChecking] = useState(false)
  const { version } = review
  const offers = verdictWords.flatMap((word) => review.offers.filter(({ act }) => act === word))
  const heldBy = (word: VerdictWord) => offers.find(({ act }) => act === word)?.held ?? null
  // what is held meanwhile is not chosen any more
  const word = chosen && heldBy(chosen) === null ? chosen : null
  const open = review.request && review.request.ended === null
  const missing = open ? (review.request?.checklist.length ?? 0) - review.answered : 0

  async function submit(event: FormEvent) {
    event.preventDefault()
    if (!word) return setRefused('Choose a word first.')
    if (word !== 'approve' && sentence.trim() === '') {
      setRefused(`Say in a sentence what “${labels[word]}” is about.`)
      document.getElementById(`${id}-sentence`)?.focus()
      return
    }
    setBusy(true)
    try {
      const answer = await call<typeof giveVerdict>({
        method: 'POST',
        path: '/api/v1/scenes/{id}/versions/{number}/verdicts',
        params: paramsOf({ sceneId: review.sceneId, version }),
        body: { word, sentence },
        key: (key.current ??= crypto.randomUUID()),
      })
      key.current = null
      onAnswer(answer)
      setChosen(null)
      setSentence('')
      setRefused('')
      slip({
        text: `Version ${version}: ${givenWords[word].toLowerCase()}. Author and asker are told by mail.`,
      })
    } catch (error) {
      // without an answer it may have been carried out all the same: then it is asked again under the same key
      if (!(error instanceof Refusal && error.status === 0)) key.current = null
      setRefused(refusalWords(error))
    } finally {
      setBusy(false)
    }
  }

  return (
    <>
      <form className="verdict-form" onSubmit={submit}>
        <fieldset>
          <legend className="head">Your verdict on version {version}</legend>
          <div className="vopts">
            {verdictWords.map((option) => {
              const held = heldBy(option)
              return (
                <label key={option} className={`vo${held ? ' held' : ''}${word === option ? ' on' : ''}`}>
                  <input
                    type="radio"
                    name={`${id}-word`}
                    checked={word === option}
                    disabled={held !== null}
                    aria-describedby={`${id}-${option}`}
                    onChange={() => {
                      setChosen(option)
                      setRefused('')
                    }}
                  />
                  <span>
                    <b>{labels[option]}</b>
                    <small id={`${id}-${option}`}>{held ? `held: ${held}` : effects(version)[option]}</small>
                  </span>
                </label>
              )
            })}
          </div>
        </fieldset>
        <div className="lf say2">
          <label htmlFor={`${id}-sentence`}>In a sentence{word === 'approve' ? ', if you like' : ''}</label>
          <div className={refused ? 'box bad' : 'box'}>
            <input
              id={`${id}-sentence`}
              value={sentence}
              maxLength={500}
              aria-describedby={`${id}-refused`}
              onChange={(event) => setSentence(event.target.value)}
            />
          </div>
        </div>
        <div className="verdict-acts">
          {missing > 0 ? (
            <button type="button" className="btn" onClick={() => setChecking(true)}>
              Checklist, {missing} to go…
            </button>
          ) : null}
          <button type="submit" className="btn pri" disabled={busy}>
            {busy ? 'Giving' : 'Give verdict'}
          </button>
        </div>
        <p className="msg" role="alert" id={`${id}-refused`}>
          {refused}
        </p>
        {review.verdicts.length > 0 ? <VerdictLines review={review} most={2} /> : null}
      </form>
      {checking ? (
        <ChecklistDialog review={review} may onAnswer={onAnswer} onClose={() => setChecking(false)} />
      ) : null}
    </>
  )
}
