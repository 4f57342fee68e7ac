import type { Look } from './types'

/** Names of lines at the height of their ends, pushed apart so that each can be read. */
export function Names({
  x,
  ends,
  top,
  bottom,
}: {
  x: number
  ends: { name: string; look: Look; y: number }[]
  top: number
  bottom: number
}) {
  const heights = apart(
    ends.map(({ y }) => y),
    top + 6,
    bottom,
  )
  return ends.map(({ name, look }, i) => (
    <text key={name} className={`t sm c${look}`} x={x + 4} y={heights[i]}>
      {name}
    </text>
  ))
}

const APART = 14

function apart(wanted: number[], top: number, bottom: number): number[] {
  const order = wanted.map((_, i) => i).sort((a, b) => wanted[a] - wanted[b])
  const placed = [...wanted]
  let least = top
  for (const i of order) {
    placed[i] = Math.max(least, Math.min(wanted[i] + 4, bottom - 2))
    least = placed[i] + APART
  }
  // where the last ones ran past the bottom, all move up together
  let most = bottom - 2
  for (const i of order.reverse()) {
    placed[i] = Math.min(most, placed[i])
    most = placed[i] - APART
  }
  return placed
}

/** Room for the longest name at the small size of the sheet's lettering. */
export const roomFor = (names: string[]): number =>
  Math.max(0, ...names.map((name) => 6.6 * name.length)) + 12
