/** What is kept of a visit, said to the visitor. */
export const KeptNotice = ({ days, what }: { days: number; what: 'page' | 'frame' }) => (
  <p className="cap kept-notice">
    It is kept for {days} days when this {what} was opened, on what kind of device and how long each part was
    in view. No address, place or name is taken.
  </p>
)
