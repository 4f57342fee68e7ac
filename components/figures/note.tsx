import type { ReactNode } from 'react'
import { withUnit, type Figure } from '@/lib/units/format'
import { BehindFigure, type Behind } from './behind'

export { Caution } from './caution'

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
  /** What stands behind it: then the figure can be pressed. */
  behind?: Behind
}

/** Name left, value right-aligned, unit in a column of its own. */
export function Figures({ rows }: { rows: FigureRow[] }) {
  return (
    <dl className="kv">
      {rows.map(({ name, figure, behind }) => (
        <div key={name} className="kv-row">
          <dt>{name}</dt>
          <dd className="n">
            {behind ? (
              <BehindFigure behind={behind} label={`${name}, ${withUnit(figure.text, figure.unit)}`}>
                {figure.text}
              </BehindFigure>
            ) : (
              figure.text
            )}
          </dd>
          <dd className="un">{figure.unit}</dd>
        </div>
      ))}
    </dl>
  )
}
