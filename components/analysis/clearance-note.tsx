'use client'

import { behindClearance } from '@/components/figures/behind-clearance'
import { Figures, Note } from '@/components/figures/note'
import { useClearances } from '@/components/figures/use-clearances'
import { StatusMark } from '@/components/ui/icon'
import { formatQuantity, quantityText } from '@/lib/units/format'
import { inSentence } from '@/scene/frame/clearance-words'
import { useSessionState } from '@/scene/session/react'

const looks = {
  clear: { look: 'st ok', mark: 'ok' },
  close: { look: 'st mon', mark: 'monitor' },
  touches: { look: 'st out', mark: 'out' },
} as const

/** The clearance that is tightest against its limit, and the other kinds' least below it. */
export function ClearanceNote() {
  const { clearances, sizes, results } = useClearances()
  const system = useSessionState((state) => state.system)
  // the tightest of every kind, tightest first
  const kinds = clearances.filter(
    ({ pair }, i) => clearances.findIndex((other) => other.pair.kind === pair.kind) === i,
  )
  if (kinds.length === 0) return null
  const [tightest] = kinds
  const { look, mark } = looks[tightest.status]
  return (
    <Note
      title={tightest.name}
      at={
        <span className={look}>
          <StatusMark kind={mark} />
          {tightest.status === 'touches'
            ? 'touches'
            : `at least ${quantityText(tightest.limit, 'length', system)}`}
        </span>
      }
    >
      <Figures
        rows={kinds.map((clearance, i) => ({
          name: i === 0 ? `${clearance.labels[0]}, ${inSentence(clearance.labels[1])}` : clearance.name,
          figure: formatQuantity(clearance.gap, 'length', system),
          behind: behindClearance(clearance, results.train, sizes),
        }))}
      />
    </Note>
  )
}
