import type { ReactNode } from 'react'
import { Edges } from './edges'
import { ThemeSwitch } from './theme-switch'

interface Props {
  /** The workshop whose sheet this is. */
  brand: string
  className: string
  /** Quiet words at the right of the edge. */
  words?: string
  children: ReactNode
}

/** A sheet without navigation: for whoever holds a link, and where there is nothing to show. */
export function GuestSheet({ brand, className, words, children }: Props) {
  return (
    <div className={`sheet sheet-${className}`}>
      <a className="skip" href="#main">
        To the drawing
      </a>
      <header className="edge edge-t guest">
        <div>
          <span className="brand">{brand}</span>
        </div>
        <div className="rt">{words}</div>
      </header>
      <Edges />
      <main className={`frame ${className}`} id="main" tabIndex={-1}>
        {children}
      </main>
      <ThemeSwitch />
    </div>
  )
}
