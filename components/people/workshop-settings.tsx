'use client'

import { useState, type FormEvent, type ReactNode } from 'react'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { Slips, useSlip } from '@/components/ui/slips'
import { Switch } from '@/components/ui/switch'
import { TextLine } from '@/components/ui/text-line'
import { useRefusal } from '@/components/ui/use-refusal'
import { call } from '@/lib/contracts/call'
import type { changeWorkshop, WorkshopAnswer } from '@/lib/contracts/workshops'
import { ChecklistLines } from './checklist-lines'
import { NewWorkshopDialog } from './new-workshop-dialog'

const form = 'workshop-settings'

interface Props {
  workshop: WorkshopAnswer
  /** More sections, from other features. */
  children?: ReactNode
}

export const WorkshopSettings = (props: Props) => (
  <Slips>
    <Settings {...props} />
  </Slips>
)

/** Whole days as they are typed; what is no number is sent as it is, for the server to name the field. */
const daysOf = (text: string) => (/^\s*\d+\s*$/.test(text) ? Number(text) : Number.NaN)

function Settings({ workshop, children }: Props) {
  const slip = useSlip()
  const [name, setName] = useState(workshop.name)
  const [needsTwoPeople, setNeedsTwoPeople] = useState(workshop.needsTwoPeople)
  const [checklist, setChecklist] = useState(workshop.checklist)
  const [days, setDays] = useState(String(workshop.openingsKeptDays))
  const [making, setMaking] = useState(false)
  const { run, busy, words, field } = useRefusal()
  const changes = workshop.may.includes('workshop.change')
  const unread = Number.isNaN(daysOf(days))

  const save = (event: FormEvent) => {
    event.preventDefault()
    if (unread) return
    void run(async () => {
      const saved = await call<typeof changeWorkshop>({
        method: 'PATCH',
        path: '/api/v1/workshops/{id}',
        params: { id: workshop.id },
        body: { name, needsTwoPeople, checklist, openingsKeptDays: daysOf(days) },
      })
      setName(saved.name)
      setChecklist(saved.checklist)
      slip({ text: 'The settings are saved.' })
    })
  }

  return (
    <>
      <section className="sheets-page" aria-label="Settings">
        <h1>Settings</h1>
        <form id={form} onSubmit={save}>
          <fieldset className="form-lines" disabled={!changes}>
            <legend className="vh">How the workshop is set</legend>
            <TextLine
              label="Name"
              value={name}
              onChange={setName}
              required
              maxLength={120}
              bad={field === 'name'}
            />
            <h2>Reviews</h2>
            <Switch label="Approval takes a second person" on={needsTwoPeople} onChange={setNeedsTwoPeople} />
            <p className="cap">Then nobody approves a version that they made themselves.</p>
            <ChecklistLines items={checklist} onChange={setChecklist} changes={changes} />
            <h2>Links</h2>
            <TextLine
              label="Openings of links are kept, days"
              className="fig"
              inputMode="numeric"
              value={days}
              onChange={setDays}
              hint="1 to 730. Whoever opens a link is told; what is older is erased each night. A link that never ends is made by owners alone."
              bad={unread || field === 'openingsKeptDays'}
              required
            />
            <p className="msg refused" role="alert">
              {unread ? `“${days}” is not a whole number of days. Type one from 1 to 730.` : words}
            </p>
          </fieldset>
        </form>
        {children}
      </section>
      <TitleBlock>
        <TitleCell k="Workshop" span={6} first top>
          <span className="v title">{name}</span>
        </TitleCell>
        <TitleCell k="Open to you as" span={6} first>
          <span className="v">{workshop.role}</span>
        </TitleCell>
        <TitleActions note={changes ? null : 'An owner changes these.'}>
          <button type="button" className="btn" onClick={() => setMaking(true)}>
            New workshop…
          </button>
          {changes ? (
            <button type="submit" form={form} className="btn pri" disabled={busy}>
              Save settings
            </button>
          ) : null}
        </TitleActions>
      </TitleBlock>
      {making ? <NewWorkshopDialog onClose={() => setMaking(false)} /> : null}
    </>
  )
}
