'use client'

import { useId, useMemo, useState } from 'react'
import { CrankStar } from '@/components/drawing/crank-star'
import { Dialog } from '@/components/ui/dialog'
import { presetGroups, presets, type Preset } from '@/scene/model/presets'

interface Props {
  onClose(): void
  onChoose(preset: Preset): void
}

const groupWords: Record<Preset['group'], string> = {
  single: 'Single',
  twin: 'Twins',
  'in-line': 'In-line',
  V: 'V',
  flat: 'Flat',
  radial: 'Radial',
  'two-stroke': 'Two-stroke',
}

/** What may be searched for: title, layout words, counts, orders. */
const wordsOf = ({ id, group, train }: Preset) =>
  `${train.title} ${group} ${groupWords[group]} ${id} ${train.cycle} ${train.cylinders.length} cylinders ${train.firingOrder.join('-')}`.toLowerCase()

/** Invented engines to start from. */
export function PresetsDialog({ onClose, onChoose }: Props) {
  const id = useId()
  const [search, setSearch] = useState('')
  const found = useMemo(() => {
    const words = search.toLowerCase().split(/\s+/).filter(Boolean)
    return presets.filter((preset) => words.every((word) => wordsOf(preset).includes(word)))
  }, [search])
  return (
    <Dialog
      title="Start from a preset"
      wide
      about={{ k: 'Presets', v: `${found.length} of ${presets.length}` }}
      onClose={onClose}
      actions={
        <button type="button" className="btn" onClick={onClose}>
          Keep the drawing
        </button>
      }
    >
      <div className="lf">
        <label htmlFor={id}>Search by layout, cylinders, firing order</label>
        <div className="box">
          <input id={id} type="search" value={search} onChange={(event) => setSearch(event.target.value)} />
        </div>
      </div>
      <div className="preset-list">
        {presetGroups.map((group) => {
          const members = found.filter((preset) => preset.group === group)
          return members.length === 0 ? null : (
            <section key={group} aria-label={groupWords[group]}>
              <h3>{groupWords[group]}</h3>
              <ul>
                {members.map((preset) => (
                  <li key={preset.id}>
                    <button type="button" onClick={() => onChoose(preset)}>
                      <CrankStar train={preset.train} />
                      <span>
                        <b>{preset.train.title}</b>
                        <span className="cap fig">{preset.train.firingOrder.join('-')}</span>
                      </span>
                    </button>
                  </li>
                ))}
              </ul>
            </section>
          )
        })}
        {found.length === 0 ? (
          <p className="cap">No preset says that. Set out a crank train of your own instead.</p>
        ) : null}
      </div>
      <p className="cap">All engines are invented. Undo brings your drawing back.</p>
    </Dialog>
  )
}
