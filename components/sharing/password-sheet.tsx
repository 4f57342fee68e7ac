import { GuestSheet } from '@/components/shell/guest-sheet'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'

interface Props {
  /** Where the form goes. It works without scripts. */
  action: string
  /** What was said of the last try. */
  said: string | null
}

const words = new Map([
  ['wrong', 'This is not the password. Ask the person who sent the link.'],
  ['often', 'Too many tries. Wait a minute, then try again.'],
])

/** All that is shown of a link with a password before it is given: nothing of the scene, nor of whose it is. */
export function PasswordSheet({ action, said }: Props) {
  const message = said === null ? undefined : words.get(said)
  return (
    <GuestSheet brand="Counterthrow" className="gone">
      <div className="state">
        <form id="link-password" className="ask" method="post" action={action}>
          <p>
            <b>This link wants a password.</b>
            <br />
            Whoever sent it has it.
          </p>
          <div className="lf">
            <label htmlFor="link-password-field">Password</label>
            <div className="box">
              <input
                id="link-password-field"
                name="password"
                type="password"
                required
                maxLength={200}
                autoComplete="off"
                aria-invalid={message ? true : undefined}
                aria-describedby={message ? 'link-password-said' : undefined}
              />
            </div>
            {message ? (
              <p className="msg" id="link-password-said" role="alert">
                {message}
              </p>
            ) : null}
          </div>
        </form>
      </div>
      <TitleBlock>
        <TitleCell k="Share link" span={6} first top>
          <h1 className="v title">Password wanted</h1>
        </TitleCell>
        <TitleActions>
          <button type="submit" form="link-password" className="btn pri">
            Open
          </button>
        </TitleActions>
      </TitleBlock>
    </GuestSheet>
  )
}
