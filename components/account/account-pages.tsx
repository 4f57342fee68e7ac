'use client'

import { useState, type ReactNode } from 'react'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { Slips, useSlip } from '@/components/ui/slips'
import { call, Refusal } from '@/lib/contracts/call'
import type * as contracts from '@/lib/contracts/account'
import type * as tokens from '@/lib/contracts/tokens'
import { NameDialog } from './name-dialog'
import { PasswordDialog } from './password-dialog'
import { SessionTable } from './session-table'
import { TokenDialog } from './token-dialog'
import type { OwnWorkshop } from './own-workshop'
import { TokenTable } from './token-table'
import { useOwn } from './use-own'

interface Props {
  person: { name: string; email: string }
  workshops: OwnWorkshop[]
  /** The workshop before them. */
  present: string | null
  /** More sections, from other features. */
  children?: ReactNode
}

export const AccountPages = (props: Props) => (
  <Slips>
    <Pages {...props} />
  </Slips>
)

function Pages({ person, workshops, present, children }: Props) {
  const slip = useSlip()
  const [asking, setAsking] = useState<'name' | 'password' | 'token' | null>(null)
  const [name, setName] = useState(person.name)
  const own = useOwn()
  const close = () => setAsking(null)
  const act = async (work: () => Promise<string>) => {
    try {
      slip({ text: await work() })
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      slip({ text: `${error.problem.detail} ${error.problem.cure}`, mark: 'less' })
    }
    await own.refresh()
  }
  return (
    <>
      <section className="sheets-page wide" aria-label="Account">
        <h1>Account</h1>
        <SessionTable
          sessions={own.sessions}
          onEnd={({ id, device }) =>
            void act(async () => {
              await call<typeof contracts.endOneSession>({
                method: 'DELETE',
                path: '/api/v1/account/sessions/{id}',
                params: { id },
              })
              return `Signed out: ${device}.`
            })
          }
          onEndOthers={() =>
            void act(async () => {
              const { ended } = await call<typeof contracts.endOtherSessions>({
                method: 'DELETE',
                path: '/api/v1/account/sessions',
              })
              return ended === 1 ? 'Signed out on one other device.' : `Signed out on ${ended} other devices.`
            })
          }
        />
        <TokenTable
          tokens={own.tokens}
          onRevoke={({ id, name: token }) =>
            void act(async () => {
              await call<typeof tokens.revokeApiToken>({
                method: 'DELETE',
                path: '/api/v1/account/tokens/{id}',
                params: { id },
              })
              return `“${token}” is revoked for good.`
            })
          }
        />
        {own.error ? (
          <p className="state" role="alert">
            Some of this is out of reach.{' '}
            <button type="button" className="btn txt" onClick={() => void own.refresh()}>
              Try now
            </button>
          </p>
        ) : null}
        {children}
      </section>
      <TitleBlock>
        <TitleCell k="Account of" span={6} first top>
          <span className="v title">{name}</span>
        </TitleCell>
        <TitleCell k="Mail address" span={6} first>
          <span className="v">{person.email}</span>
        </TitleCell>
        <TitleActions>
          <button type="button" className="btn" onClick={() => setAsking('name')}>
            Name…
          </button>
          <button type="button" className="btn" onClick={() => setAsking('password')}>
            Password…
          </button>
          {workshops.length > 0 ? (
            <button type="button" className="btn pri" onClick={() => setAsking('token')}>
              New token…
            </button>
          ) : null}
        </TitleActions>
      </TitleBlock>
      {asking === 'name' ? (
        <NameDialog
          name={name}
          onClose={close}
          onRenamed={(renamed) => {
            setName(renamed)
            close()
            slip({ text: `You are ${renamed} from now on.` })
          }}
        />
      ) : asking === 'password' ? (
        <PasswordDialog
          email={person.email}
          onClose={close}
          onChanged={(ended) => {
            close()
            slip({ text: `The password is changed. Other sessions that ended: ${ended}.` })
            void own.refresh()
          }}
        />
      ) : asking === 'token' ? (
        <TokenDialog
          workshops={workshops}
          present={present}
          onClose={close}
          onMade={() => void own.refresh()}
        />
      ) : null}
    </>
  )
}
