import type { ReactNode } from 'react'
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

/** Zone marks at the sides and the foot. */
export function Edges() {
  const side = (name: string) => (
    <div className={`edge ${name}`} aria-hidden="true">
      <span />
      <span />
      <span className="centre" />
      <span />
      <span />
    </div>
  )
  return (
    <>
      {side('edge-l')}
      {side('edge-r')}
      <div className="edge edge-b" aria-hidden="true">
        {[1, 2, 3, 4, 5, 6, 7, 8].map((zone) => (
          <span key={zone}>{zone}</span>
        ))}
      </div>
    </>
  )
}
