import type { CrankTrain } from '@/scene/model/crank-train'

type Layout = Pick<CrankTrain, 'throws' | 'banks' | 'rotation'>

const reach = 15
const round = (value: number) => Math.round(value * 100) / 100

/** Angles are positive in the direction of rotation, so an engine that turns the other way is drawn mirrored. */
const at = (angleDeg: number, radius: number, mirror: number) => {
  const angle = (angleDeg * Math.PI) / 180
  return [round(mirror * radius * Math.sin(angle)), round(-radius * Math.cos(angle))] as const
}

/** The crank seen from the free end, every throw a spoke, the banks as ticks outside the circle. */
export function CrankStar({ train, label }: { train: Layout; label?: string }) {
  const mirror = train.rotation === 'clockwise' ? 1 : -1
  const distinct = (angles: number[]) => [
    ...new Set(angles.map((angle) => round(((angle % 360) + 360) % 360))),
  ]
  return (
    <svg
      viewBox="-22 -22 44 44"
      role={label ? 'img' : undefined}
      aria-label={label}
      aria-hidden={label ? undefined : true}
    >
      <circle className="d-thin nofill" r={reach} strokeDasharray="3 2" />
      <path className="d-thin" d="M-4 0H4M0 -4V4" />
      {distinct(train.banks.map((bank) => bank.angleDeg)).map((angle) => {
        const [x1, y1] = at(angle, reach + 2.5, mirror)
        const [x2, y2] = at(angle, reach + 6.5, mirror)
        return <path key={`b${angle}`} className="d-thin" d={`M${x1} ${y1}L${x2} ${y2}`} />
      })}
      {distinct(train.throws.map((pin) => pin.angleDeg)).map((angle) => {
        const [x, y] = at(angle, reach - 3.4, mirror)
        const [cx, cy] = at(angle, reach, mirror)
        return (
          <g key={`t${angle}`}>
            <path className="d-thick" d={`M0 0L${x} ${y}`} />
            <circle className="d-mid f-paper" cx={cx} cy={cy} r={3.2} />
          </g>
        )
      })}
    </svg>
  )
}
