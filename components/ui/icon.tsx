const strokes = {
  play: <path className="s" d="M3 1.5v11l9-5.5z" />,
  pause: <path className="s" d="M2.5 1.5h3v11h-3zM8.5 1.5h3v11h-3z" />,
  back: <path d="M9.5 2.5 5 7l4.5 4.5" />,
  on: <path d="M4.5 2.5 9 7l-4.5 4.5" />,
  cross: <path d="M3 3l8 8M11 3l-8 8" />,
  less: <path d="M2 7h10" />,
  more: <path d="M7 2v10M2 7h10" />,
  tick: <path d="M2 7.5 5.5 11 12 3.5" />,
  undo: <path d="M5.5 2.5 2 6l3.5 3.5M2 6h6.5a3.5 3.5 0 0 1 0 7H6" />,
  redo: <path d="M8.5 2.5 12 6 8.5 9.5M12 6H5.5a3.5 3.5 0 0 0 0 7H8" />,
  reverse: <path d="M4.5 1.5 1.5 4.5l3 3M1.5 4.5H12M9.5 6.5l3 3-3 3M12.5 9.5H2" />,
  locked: <path d="M3 6.5h8v6H3zM4.8 6.5V4.2a2.2 2.2 0 0 1 4.4 0v2.3" />,
  unlocked: <path d="M3 6.5h8v6H3zM4.8 6.5V4.2a2.2 2.2 0 0 1 4.2-.9" />,
  down: <path d="M2.5 5 7 9.5 11.5 5" />,
}

type IconName = keyof typeof strokes

export function Icon({ name }: { name: IconName }) {
  return (
    <svg className="i" viewBox="0 0 14 14" aria-hidden="true">
      {strokes[name]}
    </svg>
  )
}

/** Status marks: shape and word, never colour alone. */
export function StatusMark({ kind }: { kind: 'ok' | 'monitor' | 'out' }) {
  return (
    <svg viewBox="0 0 16 16" aria-hidden="true">
      {kind === 'ok' && (
        <>
          <circle cx="8" cy="8" r="6.6" />
          <path d="M4.8 8.2 7.2 10.6 11.4 5.8" />
        </>
      )}
      {kind === 'monitor' && (
        <>
          <path d="M8 1.4 15 14H1z" />
          <path d="M8 5.6v4.2" />
          <circle className="d" cx="8" cy="11.7" r=".9" />
        </>
      )}
      {kind === 'out' && (
        <>
          <path className="b" d="M5 1h6l4 4v6l-4 4H5l-4-4V5z" />
          <path className="x" d="M5.2 5.2l5.6 5.6M10.8 5.2l-5.6 5.6" />
        </>
      )}
    </svg>
  )
}
