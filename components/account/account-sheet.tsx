import type { ReactNode } from 'react'
import { Edges } from '@/components/shell/edges'
import { Mark } from '@/components/shell/mark'
import { ThemeSwitch } from '@/components/shell/theme-switch'
import Link from 'next/link'

interface Props {
  heading: string
  words: string
  /** The drawing that stands beside the form. */
  drawing: ReactNode
  children: ReactNode
}

/** The sheet of sign-in and its kin: a drawing, a heading, and a title block that is the form. */
export function AccountSheet({ heading, words, drawing, children }: Props) {
  return (
    <div className="sheet plain">
      <nav className="edge edge-t" aria-label="Sheets">
        <div>
          <Link className="mark" href="/">
            <Mark />
            <span>Counterthrow</span>
          </Link>
        </div>
      </nav>
      <Edges />
      <main className="frame signin-p" id="main">
        <section className="stage" aria-hidden="true">
          {drawing}
        </section>
        <section className="hello">
          <h1>{heading}</h1>
          <p className="read">{words}</p>
        </section>
        {children}
      </main>
      <ThemeSwitch />
    </div>
  )
}
