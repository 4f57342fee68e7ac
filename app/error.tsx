'use client'

/** What is left of a sheet that could not be drawn; as bare as can be, for every page carries it. */
export default function ErrorSheet({ reset }: { error: Error; reset: () => void }) {
  return (
    <div className="sheet sheet-gone">
      <main className="frame gone" id="main">
        <div className="state" role="alert">
          <h1>This sheet could not be drawn.</h1>
          <p>Nothing saved is lost. Try again; if it stays so, the server needs a look.</p>
          <button className="btn pri" onClick={reset}>
            Draw it again
          </button>
        </div>
      </main>
    </div>
  )
}
