'use client'

interface Props {
  id: string
  head: string
  text: string
  mends: { label: string; run(): void }[]
  /** Leave the typed value as it is, where that is allowed. */
  keep?: { label: string; run(): void }
}

/** What was refused, why, and one way to mend it; joined by a line to the field above. */
export function FieldNote({ id, head, text, mends, keep }: Props) {
  return (
    <div className="errnote" id={id} role="alert">
      <b>{head}</b> {text}
      {mends.length > 0 || keep ? (
        <div className="row">
          {mends.map((mend) => (
            <button key={mend.label} type="button" className="btn sm" onClick={mend.run}>
              {mend.label}
            </button>
          ))}
          {keep ? (
            <button type="button" className="btn sm txt" onClick={keep.run}>
              {keep.label}
            </button>
          ) : null}
        </div>
      ) : null}
    </div>
  )
}
