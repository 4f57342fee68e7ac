'use client'

import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'

/** What is left of a sheet that could not be drawn; as bare as can be, for every page carries it. */
export default function ErrorSheet({ reset }: { error: Error; reset: () => void }) {
  return (
    <div className="sheet sheet-gone">
      <main className="frame gone" id="main">
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
      </main>
    </div>
  )
}
