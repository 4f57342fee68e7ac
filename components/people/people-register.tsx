'use client'

import { useState } from 'react'
import { TitleActions, TitleBlock, TitleCell } from '@/components/shell/title-block'
import { goTo } from '@/components/ui/go-to'
import { usePages } from '@/components/ui/use-pages'
import { Slips, useSlip } from '@/components/ui/slips'
import { Tabs } from '@/components/ui/tabs'
import type { Operation, Role } from '@/lib/auth/access'
import { addressOf, call, readAddress, Refusal } from '@/lib/contracts/call'
import type * as inviting from '@/lib/contracts/invitations'
import type { AnswerOf } from '@/lib/contracts/operation'
import type * as contracts from '@/lib/contracts/workshops'
import { EndDialog } from './end-dialog'
import { InvitationTable } from './invitation-table'
import { InviteDialog } from './invite-dialog'
import { PeopleTable } from './people-table'
import { TransferDialog } from './transfer-dialog'

interface Props {
  workshop: { id: string; name: string }
  role: Role
  may: readonly Operation[]
}

type Asking = 'invite' | 'transfer' | 'leave' | contracts.Member | null
type Leaf = 'people' | 'invitations'

export const PeopleRegister = (props: Props) => (
  <Slips>
    <Register {...props} />
  </Slips>
)

function Register({ workshop, role, may }: Props) {
  const slip = useSlip()
  const [leaf, setLeaf] = useState<Leaf>('people')
  const [asking, setAsking] = useState<Asking>(null)
  const base = `/api/v1/workshops/${workshop.id}`
  const people = usePages<AnswerOf<typeof contracts.listPeople>>(
    (after) => addressOf(`${base}/people`, {}, { limit: 50, after }),
    readAddress,
  )
  const invites = may.includes('person.invite')
  const invitations = usePages<AnswerOf<typeof inviting.listInvitations>>(
    (after) => (invites ? addressOf(`${base}/invitations`, {}, { limit: 50, after }) : null),
    readAddress,
  )
  const members = people.pages?.flatMap((page) => page.people) ?? []
  const open = invitations.pages?.flatMap((page) => page.invitations) ?? []
  const others = members.filter(({ you }) => !you)
  // told only when everybody is in view; the server holds it in any case
  const alone = !people.more && members.filter((member) => member.role === 'owner').length === 1
  const held = alone ? 'The only owner: make somebody else one first.' : null

  const act = async (work: () => Promise<unknown>, done: string) => {
    try {
      await work()
      slip({ text: done })
    } catch (error) {
      if (!(error instanceof Refusal)) throw error
      slip({ text: `${error.problem.detail} ${error.problem.cure}`, mark: 'less' })
    }
    await Promise.all([people.refresh(), invitations.refresh()])
  }
  const close = () => setAsking(null)
  const shown = leaf === 'people' ? people : invitations

  return (
    <>
      <section className="reg" aria-label="People">
        <div className="regtop">
          <h1>People</h1>
        </div>
        <Tabs<Leaf>
          label="People and invitations"
          value={leaf}
          tabs={[
            { value: 'people', label: 'People' },
            ...(invites ? [{ value: 'invitations', label: 'Invitations' } as const] : []),
          ]}
          onChange={setLeaf}
        >
          {shown.error ? (
            <div className="state" role="alert">
              <p>
                <b>The list is out of reach.</b>
                <br />
                <button type="button" className="btn txt" onClick={() => void shown.refresh()}>
                  Try now
                </button>
              </p>
            </div>
          ) : shown.loading ? (
            <p className="state">Setting out the list</p>
          ) : leaf === 'people' ? (
            <PeopleTable
              people={members}
              may={may}
              held={held}
              onRole={(person, to) =>
                void act(
                  () =>
                    call<typeof contracts.changeRole>({
                      method: 'PATCH',
                      path: '/api/v1/workshops/{id}/people/{person}',
                      params: { id: workshop.id, person: person.id },
                      body: { role: to },
                    }),
                  `${person.name} is ${to} now.`,
                )
              }
              onRemove={setAsking}
            />
          ) : open.length > 0 ? (
            <InvitationTable
              invitations={open}
              onSendAgain={({ id, email }) =>
                void act(
                  () =>
                    call<typeof inviting.sendInvitationAgain>({
                      method: 'POST',
                      path: '/api/v1/invitations/{id}/sendings',
                      params: { id },
                    }),
                  `Sent again to ${email}. The link of the first mail opens nothing any more.`,
                )
              }
              onWithdraw={({ id, email }) =>
                void act(
                  () =>
                    call<typeof inviting.withdrawInvitation>({
                      method: 'DELETE',
                      path: '/api/v1/invitations/{id}',
                      params: { id },
                    }),
                  `The invitation to ${email} is withdrawn.`,
                )
              }
            />
          ) : (
            <div className="state">
              <p>
                <b>Nobody is invited.</b>
                <br />
                An invitation brings somebody in with the role you give.
              </p>
            </div>
          )}
          {shown.more ? (
            <p className="reg-more">
              <button type="button" className="btn" onClick={shown.more}>
                Show more
              </button>
            </p>
          ) : null}
        </Tabs>
      </section>
      <TitleBlock>
        <TitleCell k="People of" span={6} first top>
          <span className="v title">{workshop.name}</span>
        </TitleCell>
        <TitleCell k="In the workshop" span={3} first>
          <span className="v">
            {people.loading ? '' : `${members.length}${people.more ? ' or more' : ''}`}
          </span>
        </TitleCell>
        <TitleCell k="Open to you as" span={3}>
          <span className="v">{role}</span>
        </TitleCell>
        <TitleActions note={role === 'owner' ? held : null}>
          <button
            type="button"
            className="btn"
            disabled={role === 'owner' && alone}
            onClick={() => setAsking('leave')}
          >
            Leave…
          </button>
          {may.includes('workshop.transfer') && others.length > 0 ? (
            <button type="button" className="btn" onClick={() => setAsking('transfer')}>
              Hand over…
            </button>
          ) : null}
          {invites ? (
            <button type="button" className="btn pri" onClick={() => setAsking('invite')}>
              Invite…
            </button>
          ) : null}
        </TitleActions>
      </TitleBlock>
      {asking === 'invite' ? (
        <InviteDialog
          workshop={workshop}
          onClose={close}
          onInvited={(email) => {
            close()
            setLeaf('invitations')
            slip({ text: `The invitation to ${email} is in the post.` })
            void invitations.refresh()
          }}
        />
      ) : asking === 'transfer' ? (
        <TransferDialog workshop={workshop} others={others} onClose={close} />
      ) : asking === 'leave' ? (
        <EndDialog workshop={workshop} person={null} onClose={close} onEnded={() => goTo('/scenes')} />
      ) : asking ? (
        <EndDialog
          workshop={workshop}
          person={asking}
          onClose={close}
          onEnded={() => {
            close()
            slip({ text: `${asking.name} is out of the workshop.` })
            void people.refresh()
          }}
        />
      ) : null}
    </>
  )
}
