/** What stands against it, in pencil, beside what was typed. */
export const Refused = ({ id, text }: { id?: string; text: string | null }) =>
  text ? (
    <p className="refused" id={id} role="alert">
      {text}
    </p>
  ) : null
