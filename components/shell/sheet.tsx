import type { ReactNode } from 'react'
import { Edges } from './edges'
import { SheetNav, type SheetName, type SheetPerson } from './sheet-nav'
import { ThemeSwitch } from './theme-switch'

export type { SheetPerson } from './sheet-nav'

interface Props {
  current: SheetName
  person: SheetPerson | null
  /** Layout class of the frame: the page's own grid. */
  className: string
  signOut?: (form: FormData) => void | Promise<void>
  children: ReactNode
}

/** The drawing sheet every page is: frame, edges with zone marks, navigation in the upper edge. */
export function Sheet({ current, person, className, signOut, children }: Props) {
  return (
    <div className={`sheet sheet-${className.split(' ')[0]}`}>
      <a className="skip" href="#main">
        To the drawing
      </a>
      <SheetNav current={current} person={person} signOut={signOut} />
      <Edges />
      <main className={`frame ${className}`} id="main" tabIndex={-1}>
        {children}
      </main>
      <ThemeSwitch />
    </div>
  )
}
