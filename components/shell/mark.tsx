/** The product's mark: a web with its counterweight. */
export function Mark() {
  return (
    <svg viewBox="0 0 22 22" aria-hidden="true">
      <g transform="rotate(38 11 11)">
        <path d="M1.6 12.2A9.4 9.4 0 0 0 20.4 12.2L14.4 10H7.6Z" fill="currentColor" />
        <path d="M7.4 10 8.4 4.2A3 3 0 0 1 13.6 4.2L14.6 10Z" fill="currentColor" />
        <circle cx="11" cy="5" r="1.7" fill="var(--paper)" />
        <circle cx="11" cy="12" r="2.5" fill="var(--paper)" />
      </g>
    </svg>
  )
}
