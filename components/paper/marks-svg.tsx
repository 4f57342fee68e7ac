import type { Drawing } from '@/lib/sheet/marks'

/** The marks that the print draws, on the screen. */
export function MarksSvg({ drawing, className }: { drawing: Drawing; className: string }) {
  const { width, height, marks, words } = drawing
  return (
    <svg className={className} viewBox={`0 0 ${width} ${height}`} role="img" aria-label={words}>
      {marks.map((mark, i) =>
        mark.kind === 'text' ? (
          <text key={i} x={mark.x} y={mark.y} fontSize={mark.size} textAnchor={mark.anchor}>
            {mark.text}
          </text>
        ) : (
          <path
            key={i}
            d={mark.d}
            strokeWidth={mark.weight}
            strokeDasharray={mark.dash?.join(' ')}
            className={mark.fill ? `paper-fill-${mark.fill}` : 'paper-bare'}
          />
        ),
      )}
    </svg>
  )
}
