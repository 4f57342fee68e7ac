import type { ReactNode } from 'react'

/** Bottom right of every surface: what this is, and its main actions with the primary one last. */
export function TitleBlock({ label = 'Title block', children }: { label?: string; children: ReactNode }) {
  return (
    <section className="tb" aria-label={label}>
      {children}
    </section>
  )
}

interface CellProps {
  k: string
  span: 2 | 3 | 4 | 6
  first?: boolean
  top?: boolean
  children: ReactNode
}

/** One named cell of six columns; `first` stands at the left edge, `top` at the upper one. */
export function TitleCell({ k, span, first, top, children }: CellProps) {
  return (
    <div className={`c${span}${first ? ' first' : ''}${top ? ' top' : ''}`}>
      <span className="k">{k}</span>
      {children}
    </div>
  )
}

export function TitleActions({ note, children }: { note?: ReactNode; children: ReactNode }) {
  return (
    <div className="c6 acts first">
      <span className="cap grow">{note}</span>
      {children}
    </div>
  )
}
