'use client'

import Link from 'next/link'
import { useState } from 'react'
import { Mark } from './mark'

export interface SheetPerson {
  name: string
  workshop: string
}

export type SheetName = 'scenes' | 'bench' | 'sign-in' | 'none'

interface Props {
  current: SheetName
  person: SheetPerson | null
  signOut?: (form: FormData) => void | Promise<void>
}

/** The upper edge of the sheet: eight zones, the first is home, the last two are workshop and person. */
export function SheetNav({ current, person, signOut }: Props) {
  const [open, setOpen] = useState(false)
  const zone = (number: number, name: SheetName, href: string, label: string) => (
    <div className={`zone-${number}`}>
      <Link href={href} aria-current={current === name ? 'page' : undefined}>
        <span className="z" aria-hidden="true">
          {number}
        </span>
        {label}
      </Link>
    </div>
  )
  return (
    <nav className={open ? 'edge edge-t is-open' : 'edge edge-t'} aria-label="Sheets">
      <div>
        <Link className="mark" href="/">
          <Mark />
          <span>Counterthrow</span>
        </Link>
      </div>
      {zone(2, 'scenes', '/scenes', 'Scenes')}
      {zone(3, 'bench', '/bench', 'Bench')}
      <div className="blank" />
      <div className="blank" />
      {person ? (
        <div>
          {signOut ? (
            <form action={signOut}>
              <button type="submit">
                <span className="z" aria-hidden="true">
                  6
                </span>
                Sign out
              </button>
            </form>
          ) : null}
        </div>
      ) : (
        <div className="blank" />
      )}
      <div className={person ? undefined : 'blank'}>
        {person ? <Who zone={7} text={person.workshop} /> : null}
      </div>
      {person ? (
        <div className="zone-8">
          <Who zone={8} text={person.name} />
        </div>
      ) : (
        zone(8, 'sign-in', '/sign-in', 'Sign in')
      )}
      <button type="button" className="sheets-button" aria-expanded={open} onClick={() => setOpen(!open)}>
        Sheets
      </button>
    </nav>
  )
}

function Who({ zone, text }: { zone: number; text: string }) {
  return (
    <div className="who">
      <span className="z" aria-hidden="true">
        {zone}
      </span>
      <span>{text}</span>
    </div>
  )
}
