export interface Span {
  from: number
  to: number
}

/**
 * One window on a cycle as spans that do not pass its end, and the parts of it that lie in windows of the same length
 * that open elsewhere. Degrees.
 */
export function wholeSpans(
  opens: number,
  others: readonly number[],
  length: number,
  cycle: number,
): { own: Span[]; shared: Span[] } {
  const shared = others
    .flatMap((other) => {
      const after = (((other - opens) % cycle) + cycle) % cycle
      return [
        { from: after, to: length },
        { from: 0, to: after + length - cycle },
      ]
    })
    .filter(({ from, to }) => to - from > 1e-6)
  return {
    own: onCycle({ from: opens, to: opens + length }, cycle),
    shared: merged(shared).flatMap(({ from, to }) => onCycle({ from: opens + from, to: opens + to }, cycle)),
  }
}

function merged(spans: Span[]): Span[] {
  const out: Span[] = []
  for (const span of spans.toSorted((one, other) => one.from - other.from)) {
    const last = out.at(-1)
    if (last && span.from <= last.to) last.to = Math.max(last.to, span.to)
    else out.push({ ...span })
  }
  return out
}

/** A span cut where the cycle ends. */
function onCycle({ from, to }: Span, cycle: number): Span[] {
  if (from >= cycle) return onCycle({ from: from - cycle, to: to - cycle }, cycle)
  if (to <= cycle) return [{ from, to }]
  return [
    { from, to: cycle },
    { from: 0, to: to - cycle },
  ]
}
