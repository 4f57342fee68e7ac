import { useEffect, useMemo } from 'react'
import { createClock, type Clock } from '@/scene/session/clock'

/**
 * The clock of each pane. Together: the bench's own, or one of the longest cycle where the bench's is shorter. Apart:
 * every other pane has one of its own, which begins where the bench's stands.
 */
export function useClocks(bench: Clock, cycles: readonly number[], together: boolean): Clock[] {
  const longest = Math.max(...cycles)
  const key = cycles.join(' ')
  const clocks = useMemo(() => {
    const begun = (cycle: number) => {
      const clock = createClock(cycle)
      clock.setAngle(bench.angle)
      clock.setRate(bench.rate)
      return clock
    }
    const own = key.split(' ').map(Number)
    if (!together) return own.map((cycle, i) => (i === 0 ? bench : begun(cycle)))
    const shared = longest > bench.cycle + 1e-9 ? begun(longest) : bench
    return own.map(() => shared)
  }, [bench, key, longest, together])
  // what nobody sees does not run on
  useEffect(
    () => () => {
      for (const clock of clocks) if (clock !== bench) clock.pause()
    },
    [clocks, bench],
  )
  return clocks
}
