'use client'

interface Props {
  label: string
  on: boolean
  onChange(on: boolean): void
}

export function Switch({ label, on, onChange }: Props) {
  return (
    <button type="button" className="sw-t" role="switch" aria-checked={on} onClick={() => onChange(!on)}>
      <span className={on ? 'sw-b on' : 'sw-b'} aria-hidden="true" />
      {label}
    </button>
  )
}
