/** Zone marks at the sides and the foot. */
export function Edges() {
  const side = (name: string) => (
    <div className={`edge ${name}`} aria-hidden="true">
      <span />
      <span />
      <span className="centre" />
      <span />
      <span />
    </div>
  )
  return (
    <>
      {side('edge-l')}
      {side('edge-r')}
      <div className="edge edge-b" aria-hidden="true">
        {[1, 2, 3, 4, 5, 6, 7, 8].map((zone) => (
          <span key={zone}>{zone}</span>
        ))}
      </div>
    </>
  )
}
