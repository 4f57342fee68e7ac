/** The server draws it from the scene in both papers; the style sheet shows the one that fits. */
export function Thumbnail({ src }: { src: string }) {
  const other = `${src}${src.includes('?') ? '&' : '?'}theme=dark`
  return (
    <>
      {/* a picture of the row it stands in: the title beside it says the same */}
      <img className="only-light" src={src} alt="" loading="lazy" width={72} height={48} />
      <img className="only-dark" src={other} alt="" loading="lazy" width={72} height={48} />
    </>
  )
}
