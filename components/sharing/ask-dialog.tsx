'use client'

import { useId, useState, type FormEvent } from 'react'
import type { MovingScene } from '@/components/drawing/start-scene'
import { Dialog } from '@/components/ui/dialog'
import { Refusal, sendTo } from '@/lib/contracts/call'
import { linkAddress, type LinkHeld } from './link-address'

interface Props extends LinkHeld {
  moving: MovingScene | null
  onClose(): void
}

const degrees = 180 / Math.PI
/** As long as the interface takes them (lib/contracts/shared). */
const most = { name: 120, email: 254, words: 2000 }

/** A question to whoever sent the link, with the crank angle that stands before the visitor. */
export function AskDialog({ moving, onClose, ...held }: Props) {
  const id = useId()
  const [since] = useState(() => performance.now())
  const [angleDeg] = useState(() => moving && Math.round(moving.clock.angle * degrees * 10) / 10)
  const [state, setState] = useState<'writing' | 'sending' | 'sent'>('writing')
  const [problem, setProblem] = useState<Refusal | null>(null)

  const send = async (event: FormEvent<HTMLFormElement>) => {
    event.preventDefault()
    const form = new FormData(event.currentTarget)
    const text = (name: string) => String(form.get(name) ?? '')
    setState('sending')
    setProblem(null)
    try {
      await sendTo('POST', linkAddress(held, '/questions'), {
        body: {
          ...{
            name: text('name'),
            email: text('email'),
            question: text('question'),
            website: text('website'),
          },
          ...{ angleDeg, view: null, writtenForMs: performance.now() - since },
        },
      })
      setState('sent')
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      setProblem(error)
      setState('writing')
    }
  }
  const issueOf = (name: string) => problem?.problem.issues?.find(({ path }) => path === name)
  const field = (name: string) => ({
    id: `${id}-${name}`,
    name,
    required: true,
    'aria-invalid': issueOf(name) ? true : undefined,
    'aria-describedby': issueOf(name) ? `${id}-${name}-said` : undefined,
  })
  const said = (name: string) => {
    const issue = issueOf(name)
    return issue ? (
      <p className="msg" id={`${id}-${name}-said`}>
        {issue.message} {issue.fix}
      </p>
    ) : null
  }
  const about = {
    k: 'About',
    v: angleDeg === null ? 'this drawing' : `this drawing, at ${angleDeg.toFixed(1)}°`,
  }
  if (state === 'sent')
    return (
      <Dialog
        title="The question is on its way"
        about={about}
        onClose={onClose}
        actions={
          <button type="button" className="btn pri" onClick={onClose}>
            Close
          </button>
        }
      >
        <p role="status">Whoever sent the link has it, and a copy goes to your address.</p>
      </Dialog>
    )
  return (
    <Dialog
      title="Ask a question"
      about={about}
      onClose={onClose}
      actions={
        <>
          <button type="button" className="btn" onClick={onClose}>
            Close
          </button>
          <button type="submit" form={id} className="btn pri" disabled={state === 'sending'}>
            {state === 'sending' ? 'Sending' : 'Send'}
          </button>
        </>
      }
    >
      <p>It goes to whoever sent you the link, who answers by mail. You get a copy.</p>
      <form id={id} className="ask" onSubmit={send} noValidate>
        <div className="lf">
          <label htmlFor={`${id}-name`}>Your name</label>
          <div className="box">
            <input {...field('name')} autoComplete="name" maxLength={most.name} />
          </div>
          {said('name')}
        </div>
        <div className="lf">
          <label htmlFor={`${id}-email`}>Mail address</label>
          <div className="box">
            <input {...field('email')} type="email" autoComplete="email" maxLength={most.email} />
          </div>
          {said('email')}
        </div>
        <div className="lf">
          <label htmlFor={`${id}-question`}>Question</label>
          <div className="box">
            <textarea {...field('question')} rows={4} maxLength={most.words} />
          </div>
          {said('question')}
        </div>
        <div className="off-sheet" aria-hidden="true">
          <label htmlFor={`${id}-website`}>Leave this empty</label>
          <input id={`${id}-website`} name="website" tabIndex={-1} autoComplete="off" />
        </div>
        {problem &&
        !problem.problem.issues?.some(({ path }) => ['name', 'email', 'question'].includes(path)) ? (
          <p className="msg" role="alert">
            {problem.problem.detail} {problem.problem.cure}
          </p>
        ) : null}
      </form>
    </Dialog>
  )
}
