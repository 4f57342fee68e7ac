'use client'

import { useId, useState } from 'react'
import type { Field } from '@/scene/session/field'
import { useBench, useSessionState } from '@/scene/session/react'
import { RefusedNote } from '@/components/figures/refused-note'

/** Two columns, angle and absolute pressure in bar, as they come out of a spreadsheet or an indicator. */
const traceField: Field = {
  key: 'gas.trace',
  label: 'Pressure trace',
  read(text) {
    const angleDeg: number[] = []
    const pressureBar: number[] = []
    const lines = text.split(/\r?\n/)
    for (const [i, line] of lines.entries()) {
      if (line.trim() === '') continue
      const cells = line.trim().split(/[\t; ]+|,(?=\s*[-\d])/)
      const [angle, pressure] = cells.map((cell) => Number(cell.trim().replace('−', '-')))
      if (cells.length < 2 || !Number.isFinite(angle) || !Number.isFinite(pressure)) {
        if (i === 0) continue
        return {
          ok: false,
          message: `Row ${i + 1}: could not read “${line.trim().slice(0, 40)}” as angle and pressure. Example: 12.5 64.2.`,
          mends: [],
        }
      }
      angleDeg.push(angle)
      pressureBar.push(pressure)
    }
    return {
      ok: true,
      changes: [{ path: ['train', 'gas'], value: { model: 'trace', angleDeg, pressureBar } }],
    }
  },
}

export function TraceRow({ number }: { number: number }) {
  const { session } = useBench()
  const id = useId()
  const gas = useSessionState((state) => state.scene.train.gas)
  const refusal = useSessionState((state) => state.refused[traceField.key])
  const [text, setText] = useState<string | null>(null)
  if (gas.model !== 'trace') return null
  const lines = gas.angleDeg.map((angle, i) => `${angle}\t${gas.pressureBar[i]}`).join('\n')
  return (
    <tr className={refusal ? 'bad' : 'free'} data-row={traceField.key}>
      <td className="no">
        <span className="ball">{number}</span>
      </td>
      <td colSpan={3} className="trace-cell">
        <label htmlFor={id}>
          Trace: degrees from firing top dead centre, bar absolute, {gas.angleDeg.length} rows
        </label>
        <textarea
          id={id}
          className="fig"
          rows={6}
          spellCheck={false}
          value={text ?? refusal?.text ?? lines}
          onChange={(event) => setText(event.target.value)}
          onBlur={() => {
            if (text !== null && text !== lines) session.enter(traceField, text)
            session.seal()
            setText(null)
          }}
        />
        {refusal ? (
          <RefusedNote id={`${id}-note`} refusal={refusal} field={traceField} stands="the last trace" />
        ) : null}
      </td>
    </tr>
  )
}
