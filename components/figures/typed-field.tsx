'use client'

import { useId } from 'react'
import { FieldNote } from '@/components/ui/field-note'
import { NumberField } from '@/components/ui/number-field'
import { withUnit } from '@/lib/units/format'
import type { Typed } from './use-typed'

interface Props {
  label: string
  typed: Typed
  shown: { text: string; unit: string }
}

/** A labelled field of a calculator; what was refused stays in it, with its reason and a way back. */
export function TypedField({ label, typed, shown }: Props) {
  const id = useId()
  const { refused } = typed
  return (
    <div className="typed-field">
      <label htmlFor={id}>{label}</label>
      <NumberField
        id={id}
        look="box"
        text={shown.text}
        unit={shown.unit}
        refused={refused?.text}
        describedBy={refused ? `${id}-note` : undefined}
        onText={typed.enter}
        onEscape={typed.drop}
      />
      {refused ? (
        <FieldNote
          id={`${id}-note`}
          head={`${label}: not taken.`}
          text={`${refused.message}${shown.text ? ` ${withUnit(shown.text, shown.unit)} still stands.` : ''}`}
          mends={[
            ...refused.mends.map(({ label: words, text }) => ({
              label: words,
              run: () => typed.enter(text),
            })),
            ...(refused.mends.length === 0
              ? [
                  {
                    label: shown.text ? `Keep ${withUnit(shown.text, shown.unit)}` : 'Leave it empty',
                    run: typed.drop,
                  },
                ]
              : []),
          ]}
        />
      ) : null}
    </div>
  )
}
