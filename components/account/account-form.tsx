'use client'

import { useId, useState, useSyncExternalStore, type FormEvent, type ReactNode } from 'react'
import { Refusal } from '@/lib/contracts/call'

export interface AccountField {
  name: string
  label: string
  type: 'text' | 'email' | 'password'
  autoComplete: string
  hint?: string
  optional?: boolean
  minLength?: number
}

interface Props {
  title: string
  /** Over the fields, of which there may be none. */
  words?: ReactNode
  fields: AccountField[]
  submit: string
  /** Two cells of the title block: other ways on. */
  ways?: ReactNode
  /** Left of the button. */
  aside?: ReactNode
  send(values: Record<string, string>): Promise<void>
}

/** One form for signing in, signing up and passwords: the typed text stays, and what is wrong stands beside it. */
export function AccountForm({ title, words, fields, submit, ways, aside, send }: Props) {
  const id = useId()
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const [sending, setSending] = useState(false)
  // before the script stands the browser itself would send the form, to nowhere
  const ready = useSyncExternalStore(
    () => () => {},
    () => true,
    () => false,
  )
  // a field may be sent as part of something, such as account.password
  const isOf = (path: string, name: string) => path === name || path.endsWith(`.${name}`)
  const issueOf = (name: string) => refusal?.problem.issues?.find(({ path }) => isOf(path, name))
  const general = refusal && !fields.some((field) => issueOf(field.name))

  async function onSubmit(event: FormEvent<HTMLFormElement>) {
    event.preventDefault()
    const form = event.currentTarget
    setSending(true)
    setRefusal(null)
    try {
      await send(Object.fromEntries([...new FormData(form)].map(([name, value]) => [name, String(value)])))
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      setRefusal(error)
      const wrong = fields.find((field) => error.problem.issues?.some(({ path }) => isOf(path, field.name)))
      form.querySelector<HTMLInputElement>(`[name="${(wrong ?? fields[0])?.name}"]`)?.focus()
    } finally {
      setSending(false)
    }
  }

  return (
    <form className="tb signin" aria-label={title} onSubmit={onSubmit} method="post">
      <div className="c6 top first">
        <span className="k">{title}</span>
        <h2 className="v title">Counterthrow</h2>
      </div>
      <div className="c6 first in2">
        {words}
        {fields.map((field) => (
          <Field key={field.name} field={field} id={`${id}-${field.name}`} issue={issueOf(field.name)} />
        ))}
        <div role="alert">
          {general ? (
            <p className="msg refused">
              <span>
                {refusal.problem.detail} {refusal.problem.cure}
              </span>
            </p>
          ) : null}
        </div>
      </div>
      {ways}
      <div className="c6 acts first">
        <span className="cap grow">{aside}</span>
        <button className="btn pri" type="submit" disabled={sending || !ready}>
          {submit}
        </button>
      </div>
    </form>
  )
}

function Field({
  field,
  id,
  issue,
}: {
  field: AccountField
  id: string
  issue?: { message: string; fix: string }
}) {
  const [shown, setShown] = useState(false)
  const secret = field.type === 'password'
  const described = [field.hint ? `${id}-hint` : '', issue ? `${id}-issue` : ''].filter(Boolean).join(' ')
  return (
    <div className="lf">
      <label htmlFor={id}>{field.label}</label>
      <div className={issue ? 'box bad' : 'box'}>
        <input
          id={id}
          name={field.name}
          type={secret && shown ? 'text' : field.type}
          autoComplete={field.autoComplete}
          required={!field.optional}
          minLength={field.minLength}
          aria-invalid={issue ? true : undefined}
          aria-describedby={described || undefined}
        />
        {secret ? (
          <button type="button" className="btn txt sm" aria-pressed={shown} onClick={() => setShown(!shown)}>
            {shown ? 'Hide' : 'Show'}
          </button>
        ) : null}
      </div>
      {field.hint ? (
        <span className="cap" id={`${id}-hint`}>
          {field.hint}
        </span>
      ) : null}
      {issue ? (
        <p className="msg refused" id={`${id}-issue`}>
          <span>
            {issue.message} {issue.fix}
          </span>
        </p>
      ) : null}
    </div>
  )
}
