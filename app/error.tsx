'use client'

import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'

/** What is left of a sheet that could not be drawn. */
export default function ErrorSheet({ reset }: { error: Error; reset: () => void }) {
  return (
    <GuestSheet brand="Counterthrow" className="gone">
      <div className="state" role="alert">
        <p>
          <b>This sheet could not be drawn.</b>
          <br />
          Nothing saved is lost. Try again; if it stays so, the server needs a look.
        </p>
      </div>
      <TitleBlock>
        <TitleCell k="Something is missing" span={6} first top>
          <h1 className="v title">Not drawn</h1>
        </TitleCell>
        <TitleActions>
          <button type="button" className="btn pri" onClick={reset}>
            Draw it again
          </button>
        </TitleActions>
      </TitleBlock>
    </GuestSheet>
  )
}
