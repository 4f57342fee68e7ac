import Link from 'next/link'
import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'

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
          <Link className="btn pri" href="/">
            First page
          </Link>
        </TitleActions>
      </TitleBlock>
    </GuestSheet>
  )
}
