import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'

/** Every page carries what this needs in the browser, so it needs nothing there. */
export default function NotFoundSheet() {
  return (
    <GuestSheet brand="Counterthrow" className="gone">
      <div className="state">
        <p>
          <b>There is no sheet at this address.</b>
          <br />
          Check the address, or begin from the first page.
        </p>
      </div>
      <TitleBlock>
        <TitleCell k="Address" span={6} first top>
          <h1 className="v title">Nothing to show</h1>
        </TitleCell>
        <TitleActions>
          <form action="/">
            <button type="submit" className="btn pri">
              First page
            </button>
          </form>
        </TitleActions>
      </TitleBlock>
    </GuestSheet>
  )
}
