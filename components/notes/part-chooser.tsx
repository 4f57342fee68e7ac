'use client'

import { useEffect, useEffectEvent, useRef, useState, type KeyboardEvent } from 'react'

export interface PartChoice {
  id: string
  label: string
}

interface Props {
  /** What it is for: "Pin a note". */
  what: string
  choices: readonly PartChoice[]
  /** Where the choice begins. */
  from?: string
  onPart(id: string): void
  onLight(id: string | null): void
  onClose(): void
}

/** Where the next pin goes: a click on a part, or arrows and Enter from here. */
export function PartChooser({ what, choices, from, onPart, onLight, onClose }: Props) {
  const field = useRef<HTMLDivElement>(null)
  const [at, setAt] = useState(() =>
    Math.max(
      0,
      choices.findIndex(({ id }) => id === from),
    ),
  )
  const go = (next: number) => {
    const place = (next + choices.length) % choices.length
    setAt(place)
    onLight(choices[place].id)
  }
  const dim = useEffectEvent(() => onLight(null))
  useEffect(() => {
    field.current?.focus()
    return () => dim()
  }, [])

  const key = (event: KeyboardEvent) => {
    const by = { ArrowRight: 1, ArrowDown: 1, ArrowLeft: -1, ArrowUp: -1, PageDown: 10, PageUp: -10 }[
      event.key
    ]
    if (by) go(at + by)
    else if (event.key === 'Home') go(0)
    else if (event.key === 'End') go(choices.length - 1)
    else if (event.key === 'Enter') onPart(choices[at].id)
    else if (event.key === 'Escape') onClose()
    else if (/^\p{L}$/u.test(event.key)) {
      const letter = event.key.toLowerCase()
      const order = choices.map((_, i) => (at + 1 + i) % choices.length)
      const next = order.find((i) => choices[i].label.toLowerCase().startsWith(letter))
      if (next !== undefined) go(next)
    } else return
    event.preventDefault()
  }
  return (
    <div className="part-chooser" role="group" aria-label="Where the note goes">
      <p>{what}: click a part, or choose it here.</p>
      <div
        ref={field}
        className="box"
        role="spinbutton"
        tabIndex={0}
        aria-label="Part"
        aria-valuemin={1}
        aria-valuemax={choices.length}
        aria-valuenow={at + 1}
        aria-valuetext={choices[at].label}
        onKeyDown={key}
        onFocus={() => onLight(choices[at].id)}
      >
        {choices[at].label}
      </div>
      <button type="button" className="btn sm" onClick={() => onPart(choices[at].id)}>
        Pin here
      </button>
      <button type="button" className="btn sm txt" onClick={onClose}>
        Leave it
      </button>
      <p className="cap">Arrows change the part, Enter pins at its middle, Escape leaves it.</p>
    </div>
  )
}
