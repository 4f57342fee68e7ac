'use client'

import { useState } from 'react'
import { Tabs } from '@/components/ui/tabs'
import { BalanceNotes } from './balance-notes'
import { FitNotes } from './fit-notes'
import { LoadNotes } from './load-notes'
import { MotionNotes } from './motion-notes'
import { Caution } from '@/components/figures/note'

type Page = 'balance' | 'loads' | 'motion' | 'fits'

/** The figures of the sheet, in four pages. */
export function MarginNotes() {
  const [page, setPage] = useState<Page>('balance')
  return (
    <section className="notes" aria-label="Margin notes">
      <Tabs
        label="Margin notes"
        value={page}
        tabs={[
          { value: 'balance', label: 'Balance' },
          { value: 'loads', label: 'Loads' },
          { value: 'motion', label: 'Motion' },
          { value: 'fits', label: 'Fits' },
        ]}
        onChange={setPage}
      >
        {page === 'balance' ? <BalanceNotes /> : null}
        {page === 'loads' ? <LoadNotes /> : null}
        {page === 'motion' ? <MotionNotes /> : null}
        {page === 'fits' ? <FitNotes /> : null}
      </Tabs>
      <div className="notes-foot">
        <Caution />
      </div>
    </section>
  )
}
