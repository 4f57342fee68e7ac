import { StatusMark } from '@/components/ui/icon'
import type { ClearanceStatus } from '@/lib/mechanics/clearance/clearances'

const marks = {
  clear: { mark: 'ok', look: 'st ok' },
  close: { mark: 'monitor', look: 'st mon' },
  touches: { mark: 'out', look: 'st out' },
} as const

interface Props {
  status: ClearanceStatus
  /** Where the word stands beside it anyway. */
  bare?: boolean
}

/** How a clearance stands, by its shape and in a word. */
export function ClearanceMark({ status, bare }: Props) {
  const { mark, look } = marks[status]
  return (
    <span className={look}>
      <StatusMark kind={mark} />
      {bare ? null : status}
    </span>
  )
}
