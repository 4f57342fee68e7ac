'use client'

import { useId, type ReactNode } from 'react'
import { Segmented } from '@/components/ui/segmented'
import { linkKinds, type Operation } from '@/lib/auth/access'
import type { ProblemAnswer } from '@/lib/contracts/common'
import { endsFor, endWords, kindWords, type LinkDraft } from './link-draft'

interface Props {
  draft: LinkDraft
  /** The version that a pinned link opens. */
  version: number
  changing: boolean
  may: readonly Operation[]
  issues: NonNullable<ProblemAnswer['issues']>
  onChange(draft: LinkDraft): void
}

/** What a link lets, which version it opens, until when, with which password and on whose pages. */
export function LinkFields({ draft, version, changing, may, issues, onChange }: Props) {
  const id = useId()
  const set = (part: Partial<LinkDraft>) => onChange({ ...draft, ...part })
  const wrong = (name: string) => issues.find(({ path }) => path.split('.')[0] === name)
  const field = (name: string) => ({
    id: `${id}-${name}`,
    'aria-invalid': wrong(name) ? true : undefined,
    'aria-describedby': wrong(name) ? `${id}-${name}-said` : undefined,
  })
  const said = (name: string): ReactNode => {
    const issue = wrong(name)
    return issue ? (
      <p className="msg" id={`${id}-${name}-said`}>
        {issue.message} {issue.fix}
      </p>
    ) : null
  }
  const locks = [
    { value: 'open' as const, label: 'none' },
    ...(draft.lock === 'kept' ? [{ value: 'kept' as const, label: 'as it is' }] : []),
    { value: 'new' as const, label: 'a new one' },
  ]
  return (
    <div className="set-out link-fields">
      <div className="lf">
        <label htmlFor={`${id}-label`}>For whom or what</label>
        <div className="box">
          <input
            {...field('label')}
            maxLength={120}
            value={draft.label}
            onChange={(event) => set({ label: event.target.value })}
          />
        </div>
      </div>
      <div className="lf">
        <span className="lab">Whoever has it may</span>
        <Segmented
          label="Whoever has it may"
          value={draft.kind}
          options={linkKinds.map((value) => ({ value, label: kindWords[value] }))}
          onChange={(kind) => set({ kind })}
        />
      </div>
      <div className="lf">
        <span className="lab">Opens</span>
        <Segmented
          label="Opens"
          value={draft.pinned}
          options={[
            { value: 'latest', label: 'the latest version' },
            { value: 'pinned', label: `version ${version} for good` },
          ]}
          onChange={(pinned) => set({ pinned })}
        />
      </div>
      <div className="lf">
        <label htmlFor={`${id}-ends`}>Ends after</label>
        <div className="box two-fields">
          <select
            id={`${id}-ends`}
            className="pick"
            value={draft.ends}
            onChange={(event) =>
              set({ ends: endsFor(may, changing).find((end) => end === event.target.value) })
            }
          >
            {endsFor(may, changing).map((end) => (
              <option key={end} value={end}>
                {endWords[end]}
              </option>
            ))}
          </select>
          {draft.ends === 'day' ? (
            <input
              {...field('endsAt')}
              type="date"
              aria-label="Last day"
              value={draft.day}
              onChange={(event) => set({ day: event.target.value })}
            />
          ) : null}
        </div>
        {said('endsAt')}
      </div>
      <div className="lf">
        <span className="lab">Password</span>
        <Segmented label="Password" value={draft.lock} options={locks} onChange={(lock) => set({ lock })} />
        {draft.lock === 'new' ? (
          <div className="box">
            <input
              {...field('password')}
              aria-label="New password of the link"
              autoComplete="off"
              maxLength={200}
              value={draft.password}
              onChange={(event) => set({ password: event.target.value })}
            />
          </div>
        ) : null}
        {said('password')}
      </div>
      <div className="lf">
        <label htmlFor={`${id}-frameOrigins`}>Sites that may show it in a frame, one a line</label>
        <div className="box">
          <textarea
            {...field('frameOrigins')}
            className="fig"
            rows={2}
            placeholder="https://www.example.com"
            value={draft.origins}
            onChange={(event) => set({ origins: event.target.value })}
          />
        </div>
        {said('frameOrigins')}
      </div>
    </div>
  )
}
