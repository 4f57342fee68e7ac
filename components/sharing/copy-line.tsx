'use client'

import { useId, useState } from 'react'

/** A text to take away: it can be selected, and copied with one press. */
export function CopyLine({ label, what, text }: { label: string; what: string; text: string }) {
  const id = useId()
  const [copied, setCopied] = useState(false)
  return (
    <div className="lf">
      <label htmlFor={id}>{label}</label>
      <div className="box">
        <input id={id} className="fig" readOnly value={text} onFocus={(event) => event.target.select()} />
        <button
          type="button"
          className="btn sm"
          aria-label={`Copy ${what}`}
          onClick={async () => {
            await navigator.clipboard.writeText(text)
            setCopied(true)
          }}
        >
          {copied ? 'Copied' : 'Copy'}
        </button>
      </div>
    </div>
  )
}
