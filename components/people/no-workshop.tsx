'use client'

import { useState } from 'react'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { NewWorkshopDialog } from './new-workshop-dialog'

/** For somebody who is signed in and belongs to no workshop: says so, and both ways on. */
export function NoWorkshop({ email }: { email: string }) {
  const [making, setMaking] = useState(false)
  return (
    <>
      <section className="state" aria-label="No workshop">
        <h1>You belong to no workshop</h1>
        <p className="read">
          Scenes are kept by workshops. Open one of your own, or have an owner of one invite {email}: the mail
          has a link that brings you in. The bench is open to you all the same.
        </p>
      </section>
      <TitleBlock>
        <TitleCell k="Signed in as" span={6} first top>
          <span className="v title">{email}</span>
        </TitleCell>
        <TitleActions>
          <button type="button" className="btn pri" onClick={() => setMaking(true)}>
            Open a workshop…
          </button>
        </TitleActions>
      </TitleBlock>
      {making ? <NewWorkshopDialog onClose={() => setMaking(false)} /> : null}
    </>
  )
}
