import type { ReactNode } from 'react'
import type { Figure } from '@/lib/units/format'

/** One margin note: what, under which condition, figures, and what follows from them. */
export function Note({ title, at, children }: { title: string; at?: ReactNode; children: ReactNode }) {
  return (
    <section className="note">
      <h3>
        {title} {at ? <span className="at">{at}</span> : null}
      </h3>
      {children}
    </section>
  )
}

export interface FigureRow {
  name: string
  figure: Figure
}

/** Name left, value right-aligned, unit in a column of its own. */
export function Figures({ rows }: { rows: FigureRow[] }) {
  return (
    <dl className="kv">
      {rows.map(({ name, figure }) => (
        <div key={name} className="kv-row">
          <dt>{name}</dt>
          <dd className="n">{figure.text}</dd>
          <dd className="un">{figure.unit}</dd>
        </div>
      ))}
    </dl>
  )
}

export const Caution = () => (
  <p className="caution">
    Planning figures: rigid crank, steady speed, each main hinged to its neighbours. The maker’s data, the
    machine shop and a qualified person come first.
  </p>
)
