/** Banks by letter and hatch, at 45° to the part: single, paired, broken, crossed, dotted, paired broken. */
const lines = [
  { size: 6, d: 'M0 3H6' },
  { size: 9, d: 'M0 2H9M0 4.6H9' },
  { size: 7, d: 'M0 3.5H4.5' },
  { size: 7, d: 'M0 3.5H7M3.5 0V7' },
  { size: 5, d: 'M0 2.5H1.6' },
  { size: 9, d: 'M0 2H5.5M0 4.6H5.5' },
]

export function BankHatch({ id, index }: { id: string; index: number }) {
  const { size, d } = lines[index % lines.length]
  return (
    <pattern
      id={id}
      className="hatch"
      width={size}
      height={size}
      patternUnits="userSpaceOnUse"
      patternTransform="rotate(45)"
    >
      <path d={d} />
    </pattern>
  )
}
