'use client'

import { useId, useState } from 'react'
import { angleWord } from '@/components/figures/interval-words'
import { FieldNote } from '@/components/ui/field-note'
import { NumberField } from '@/components/ui/number-field'
import type { PulseWindow } from '@/lib/mechanics/exhaust-pulses'
import { parseQuantity } from '@/lib/units/parse'
import { fromSi } from '@/lib/units/units'

interface Props {
  /** As the document has it. */
  usual: PulseWindow
  own: Partial<PulseWindow>
  cycle: number
  onOwn(own: Partial<PulseWindow>): void
}

const fields = [
  { key: 'opens', label: 'Exhaust opens after firing' },
  { key: 'length', label: 'Blow-down lasts' },
] as const

/** Where the blow-down windows lie: the document's figures until others are typed. */
export function PulseWindowFields({ usual, own, cycle, onOwn }: Props) {
  const id = useId()
  const [typed, setTyped] = useState<Partial<Record<keyof PulseWindow, { text: string; message: string }>>>(
    {},
  )
  const enter = (key: keyof PulseWindow, text: string) => {
    const parsed = parseQuantity(text, 'angle', '°')
    const message = parsed.ok ? outOf(parsed.value, cycle) : parsed.message
    setTyped({ ...typed, [key]: message === null ? undefined : { text, message } })
    if (message === null && parsed.ok) onOwn({ ...own, [key]: parsed.value })
  }
  const back = (key: keyof PulseWindow) => {
    setTyped({ ...typed, [key]: undefined })
    onOwn({ ...own, [key]: undefined })
  }
  return (
    <div className="firing-window">
      {fields.map(({ key, label }) => {
        const refused = typed[key]
        const value = own[key] ?? usual[key]
        return (
          <div key={key} className="lf">
            <label htmlFor={`${id}-${key}`}>{label}</label>
            <NumberField
              id={`${id}-${key}`}
              look="box"
              unit="°"
              text={angleWord(fromSi(value, '°'))}
              refused={refused?.text}
              describedBy={refused ? `${id}-${key}-note` : undefined}
              onText={(text) => enter(key, text)}
              onEscape={() => back(key)}
            />
            {refused ? (
              <FieldNote
                id={`${id}-${key}-note`}
                head="Not taken."
                text={refused.message}
                mends={[{ label: `Back to ${angleWord(fromSi(usual[key], '°'))}°`, run: () => back(key) }]}
              />
            ) : null}
          </div>
        )
      })}
      {own.opens !== undefined || own.length !== undefined ? (
        <button
          type="button"
          className="btn sm"
          onClick={() => {
            setTyped({})
            onOwn({})
          }}
        >
          As the document has it
        </button>
      ) : null}
    </div>
  )
}

function outOf(angle: number, cycle: number): string | null {
  if (angle > 0 && angle <= cycle + 1e-9) return null
  return `${angleWord(fromSi(angle, '°'))}° lies outside the cycle: give more than 0° and up to ${angleWord(fromSi(cycle, '°'))}°.`
}
