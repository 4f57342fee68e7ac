'use client'

export const PrintButton = () => (
  <button type="button" className="btn" onClick={() => window.print()}>
    Print sheet
  </button>
)
