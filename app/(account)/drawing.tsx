/** The drawing beside every form: a preset as the server draws it. */
export function AccountDrawing() {
  const poster = '/api/v1/presets/v8x-5000/poster.png'
  return (
    <div className="poster">
      <img className="only-light" src={poster} alt="" loading="lazy" />
      <img className="only-dark" src={`${poster}?theme=dark`} alt="" loading="lazy" />
    </div>
  )
}
