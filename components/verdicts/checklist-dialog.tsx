'use client'

import { useId, useState, type FormEvent } from 'react'
import { Dialog } from '@/components/ui/dialog'
import { call } from '@/lib/contracts/call'
import type { answerChecklist, Review } from '@/lib/contracts/verdicts'
import { answerWords, checklistAnswers, type ChecklistAnswer } from '@/lib/review/version-states'
import { paramsOf, refusalWords } from './use-review'

interface Props {
  review: Review
  /** May answer for themselves. */
  may: boolean
  onAnswer(answer: { review: Review }): void
  onClose(): void
}

interface Typed {
  answer: ChecklistAnswer | null
  words: string
}

/** The items of a review, each answered by oneself; a “no” says what stands against it. */
export function ChecklistDialog({ review, may, onAnswer, onClose }: Props) {
  const id = useId()
  const { request, version, sceneId } = review
  const items = request?.checklist ?? []
  const open = may && request !== null && request.ended === null
  const [typed, setTyped] = useState<Typed[]>(() =>
    items.map((_, item) => {
      const given = review.answers.find((answer) => answer.item === item)
      return { answer: given?.answer ?? null, words: given?.words ?? '' }
    }),
  )
  const [refused, setRefused] = useState('')
  const [busy, setBusy] = useState(false)
  const put = (item: number, change: Partial<Typed>) =>
    setTyped(typed.map((one, index) => (index === item ? { ...one, ...change } : one)))
  const done = typed.filter(({ answer }) => answer !== null).length

  async function submit(event: FormEvent) {
    event.preventDefault()
    const silent = typed.findIndex(({ answer, words }) => answer === 'no' && words.trim() === '')
    if (silent >= 0) {
      setRefused(`“${items[silent]}” is answered no: say what stands against it.`)
      document.getElementById(`${id}-${silent}-words`)?.focus()
      return
    }
    const answers = typed.flatMap(({ answer, words }, item) => (answer ? [{ item, answer, words }] : []))
    if (answers.length === 0) return onClose()
    setBusy(true)
    try {
      onAnswer(
        await call<typeof answerChecklist>({
          method: 'PUT',
          path: '/api/v1/scenes/{id}/versions/{number}/checklist',
          params: paramsOf({ sceneId, version }),
          body: { answers },
        }),
      )
      onClose()
    } catch (error) {
      setRefused(refusalWords(error))
    } finally {
      setBusy(false)
    }
  }

  return (
    <Dialog
      title="Checklist"
      about={{ k: `Version ${version}`, v: `${done} of ${items.length} answered` }}
      wide
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            {open ? 'Leave as it was' : 'Close'}
          </button>
          {open ? (
            <button type="submit" form={`${id}-form`} className="btn pri" disabled={busy}>
              Keep answers
            </button>
          ) : null}
        </>
      }
    >
      {items.length === 0 ? <p>This review asks about nothing in particular.</p> : null}
      {open ? null : <p className="cap">The review is not open to your answers now.</p>}
      <form id={`${id}-form`} className="checklist" onSubmit={submit}>
        {items.map((name, item) => (
          <fieldset key={item} disabled={!open}>
            <legend>
              <span className="fig">{item + 1}</span> {name}
            </legend>
            <div className="answers">
              {checklistAnswers.map((answer) => (
                <label key={answer} className="pick-one">
                  <input
                    type="radio"
                    name={`${id}-${item}`}
                    checked={typed[item].answer === answer}
                    onChange={() => put(item, { answer })}
                  />
                  {answerWords[answer]}
                </label>
              ))}
            </div>
            <div className="box">
              <input
                id={`${id}-${item}-words`}
                aria-label={`Words on ${name}`}
                placeholder={typed[item].answer === 'no' ? 'What stands against it' : 'In words, if you like'}
                maxLength={500}
                value={typed[item].words}
                onChange={(event) => put(item, { words: event.target.value })}
              />
            </div>
          </fieldset>
        ))}
        <p className="msg" role="alert">
          {refused}
        </p>
      </form>
    </Dialog>
  )
}
