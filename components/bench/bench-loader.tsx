'use client'

import dynamic from 'next/dynamic'
import type { BenchProps } from './bench'

const Bench = dynamic(() => import('./bench').then((module) => module.Bench), {
  ssr: false,
  loading: () => <SettingOut />,
})

/** The bench works in the browser alone: kept drafts, units and what can draw are known only there. */
export function BenchLoader(props: BenchProps) {
  return <Bench {...props} />
}

/** Construction lines, until the parts arrive. */
function SettingOut() {
  return (
    <div className="setting-out-sheet">
      <svg className="dr" viewBox="0 0 200 66" aria-hidden="true">
        <path className="chain" d="M4 46H196" />
        {[8, 58, 110, 160].map((x) => (
          <path key={x} className="chain" d={`M${x} 6h32v20h-32zM${x + 16} 26V46`} />
        ))}
      </svg>
      <p>Setting out the bench</p>
      <noscript>The bench draws and reckons in your browser: it needs scripts to be on.</noscript>
    </div>
  )
}
