import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleBlock, TitleCell } from '@/components/shell/title-block'

/** One neutral sheet for an invitation that is unknown, used, ended or withdrawn: it must not tell which. */
export function UnavailableInvitation() {
  return (
    <GuestSheet brand="Counterthrow" className="gone">
      <div className="state">
        <p>
          <b>This invitation is not available.</b>
          <br />
          Ask the person who sent it.
        </p>
      </div>
      <TitleBlock>
        <TitleCell k="Invitation" span={6} first top>
          <h1 className="v title">Nothing to show</h1>
        </TitleCell>
      </TitleBlock>
    </GuestSheet>
  )
}
