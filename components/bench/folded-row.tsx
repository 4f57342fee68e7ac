'use client'

import { useId, useState, type ReactNode } from 'react'
import { Icon } from '@/components/ui/icon'

interface Props {
  /** Names the row for whoever looks for it. */
  row: string
  number: number
  label: string
  /** What the folded row tells: "8", "none". */
  count: string | number
  /** Something in it is refused: it stands open. */
  bad: boolean
  children: ReactNode
}

/** A list of the parts list, folded away until it is wanted. */
export function FoldedRow({ row, number, label, count, bad, children }: Props) {
  const id = useId()
  const [open, setOpen] = useState(false)
  return (
    <>
      <tr className={bad ? 'bad' : 'free'} data-row={row}>
        <td className="no">
          <span className="ball">{number}</span>
        </td>
        <th scope="row">{label}</th>
        <td className="wideval r" colSpan={2}>
          <button
            type="button"
            className="btn sm txt fold"
            aria-expanded={open}
            aria-controls={id}
            aria-label={`${label}, ${count}`}
            onClick={() => setOpen(!open)}
          >
            <span className="fig">{count}</span> <Icon name="down" />
          </button>
        </td>
      </tr>
      {open || bad ? (
        <tr className="subtable-row">
          <td colSpan={4} id={id}>
            {children}
          </td>
        </tr>
      ) : null}
    </>
  )
}
