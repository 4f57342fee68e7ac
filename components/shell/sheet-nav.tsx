'use client'

import Link from 'next/link'
import { useState } from 'react'
import { EdgeMenu } from './edge-menu'
import { Mark } from './mark'

type FormAction = (form: FormData) => void | Promise<void>

export interface SheetPerson {
  name: string
  /** The workshop before them; null for somebody who belongs to none. */
  workshop: string | null
  /** Those they may go over to. */
  others?: { id: string; name: string }[]
  goOver?: FormAction
}

export type SheetName = 'scenes' | 'bench' | 'review' | 'people' | 'settings' | 'account' | 'sign-in' | 'none'

interface Props {
  current: SheetName
  person: SheetPerson | null
  signOut?: FormAction
}

/** The upper edge of the sheet: eight zones, the first is home, the last two are workshop and person. */
export function SheetNav({ current, person, signOut }: Props) {
  const [open, setOpen] = useState(false)
  const link = (name: SheetName, href: string, label: string, number?: number) => (
    <Link href={href} aria-current={current === name ? 'page' : undefined}>
      {number ? (
        <span className="z" aria-hidden="true">
          {number}
        </span>
      ) : null}
      {label}
    </Link>
  )
  return (
    <nav className={open ? 'edge edge-t is-open' : 'edge edge-t'} aria-label="Sheets">
      <div>
        <Link className="mark" href="/">
          <Mark />
          <span>Counterthrow</span>
        </Link>
      </div>
      <div className="zone-2">{link('scenes', '/scenes', 'Scenes', 2)}</div>
      <div className="zone-3">{link('bench', '/bench', 'Bench', 3)}</div>
      {person ? (
        <div className="zone-4">{link('review', '/review', 'Review', 4)}</div>
      ) : (
        <div className="blank" />
      )}
      <div className="blank" />
      <div className="blank" />
      {person ? (
        <EdgeMenu
          zone={7}
          label={person.workshop ?? 'No workshop'}
          current={current === 'people' || current === 'settings'}
        >
          {person.workshop ? (
            <>
              {link('people', '/people', 'People')}
              {link('settings', '/settings', 'Settings')}
            </>
          ) : (
            link('scenes', '/scenes', 'Find a workshop')
          )}
          {person.others?.map(({ id, name }) => (
            <form key={id} action={person.goOver}>
              <input type="hidden" name="workshop" value={id} />
              <button type="submit">Go over to {name}</button>
            </form>
          ))}
        </EdgeMenu>
      ) : (
        <div className="blank" />
      )}
      {person ? (
        <EdgeMenu zone={8} label={person.name} current={current === 'account'}>
          {link('account', '/account', 'Account')}
          {signOut ? (
            <form action={signOut}>
              <button type="submit">Sign out</button>
            </form>
          ) : null}
        </EdgeMenu>
      ) : (
        <div className="zone-8">{link('sign-in', '/sign-in', 'Sign in', 8)}</div>
      )}
      <button type="button" className="sheets-button" aria-expanded={open} onClick={() => setOpen(!open)}>
        Sheets
      </button>
    </nav>
  )
}
