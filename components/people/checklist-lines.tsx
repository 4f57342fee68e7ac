'use client'

import { useRef } from 'react'
import { Icon } from '@/components/ui/icon'

interface Props {
  items: string[]
  changes: boolean
  onChange(items: string[]): void
}

const most = 20

/** What a review asks about: a line each, in order, added and taken away by buttons alone. */
export function ChecklistLines({ items, changes, onChange }: Props) {
  const list = useRef<HTMLOListElement>(null)
  const add = () => {
    onChange([...items, ''])
    // the new line is there after this turn
    requestAnimationFrame(() => list.current?.querySelector<HTMLInputElement>('li:last-child input')?.focus())
  }
  return (
    <div className="lf">
      <span className="lab">Checklist of a review, unless it says otherwise</span>
      <ol className="checklist-lines" ref={list}>
        {items.map((item, index) => (
          <li key={index}>
            <span className="box">
              <input
                aria-label={`Item ${index + 1}`}
                value={item}
                required
                maxLength={120}
                onChange={(event) => onChange(items.with(index, event.target.value))}
              />
            </span>
            {changes ? (
              <button
                type="button"
                className="btn ic"
                aria-label={`Take item ${index + 1} away`}
                onClick={() => onChange(items.toSpliced(index, 1))}
              >
                <Icon name="cross" />
              </button>
            ) : null}
          </li>
        ))}
      </ol>
      {changes ? (
        <button type="button" className="btn sm" onClick={add} disabled={items.length >= most}>
          Add an item
        </button>
      ) : null}
    </div>
  )
}
