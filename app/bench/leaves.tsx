'use client'

import dynamic from 'next/dynamic'
import type { ComponentType } from 'react'
import { MarginNotes } from '@/components/analysis/margin-notes'
import type { BenchProps } from '@/components/bench/bench'
import { BenchLoader } from '@/components/bench/bench-loader'

/** A page of the bench, fetched when it is first opened. */
const leaf = (title: string, load: () => Promise<ComponentType>) => ({
  title,
  Content: dynamic(load, { ssr: false, loading: () => <p className="setting-out">Setting out</p> }),
})

/** The pages beside the drawing, in the order of their tabs. */
const leaves: BenchProps['leaves'] = {
  balance: leaf('Balance', () => import('@/components/balance/balance-leaf').then((it) => it.BalanceLeaf)),
  firing: leaf('Firing', () => import('@/components/firing/firing-leaf').then((it) => it.FiringLeaf)),
  layouts: leaf('Layouts', () => import('@/components/layouts/layouts-leaf').then((it) => it.LayoutsLeaf)),
  loads: leaf('Loads', () => import('@/components/loads/loads-leaf').then((it) => it.LoadsLeaf)),
  gas: leaf('Gas', () => import('@/components/gas/gas-leaf').then((it) => it.GasLeaf)),
  clearances: leaf('Clearances', () =>
    import('@/components/clearances/clearances-leaf').then((it) => it.ClearancesLeaf),
  ),
  compare: leaf('Compare', () => import('@/components/compare/compare-leaf').then((it) => it.CompareLeaf)),
  paper: leaf('Paper', () => import('@/components/paper/paper-leaf').then((it) => it.PaperLeaf)),
}

const Share = dynamic(() => import('@/components/sharing/share-dialog').then((it) => it.ShareDialog), {
  ssr: false,
})

const Standing = dynamic(() => import('./standing').then((it) => it.Standing), { ssr: false })

export const BenchWithLeaves = (props: Omit<BenchProps, 'notes' | 'leaves' | 'Share' | 'Standing'>) => (
  <BenchLoader {...props} notes={<MarginNotes />} leaves={leaves} Share={Share} Standing={Standing} />
)
