/**
 * When to draw: after every change, once more when it has been quiet for a while so that the picture can be refined, and
 * then not at all. A picture may be on its way for some frames; nothing is filled anew until it is on the sheet.
 */
export interface Loop {
  /** Something has changed. */
  touch(): void
  /** Once a frame; true asks for another. */
  tick(now: number): boolean
  /** The renderer has put the picture on its canvas. */
  painted(): void
}

export interface LoopWork {
  /** Fills the frame and hands it to the renderer; false where it is still busy. */
  draw(still: boolean): boolean
  /** The picture is on the sheet: paint and write over it. */
  finish(still: boolean): void
}

/** Without a change for so long, ms, the engine stands still. */
export const quiet = 100
/** A picture that has not come by then will not, ms. */
const patience = 1000

export function createLoop(work: LoopWork): Loop {
  let dirty = false
  let settled = true
  let awaiting = false
  let awaitedStill = false
  let sent = 0
  let changed = 0

  const send = (now: number, still: boolean) => {
    awaiting = true
    awaitedStill = still
    sent = now
    if (work.draw(still)) return true
    awaiting = false
    return false
  }

  return {
    touch() {
      dirty = true
      settled = false
    },
    tick(now) {
      if (awaiting && now - sent < patience) return true
      if (dirty) {
        dirty = false
        changed = now
        if (!send(now, false)) dirty = true
        return true
      }
      if (settled) return false
      if (now - changed < quiet || !send(now, true)) return true
      settled = !dirty
      return dirty
    },
    painted() {
      if (!awaiting) return
      awaiting = false
      work.finish(awaitedStill)
    },
  }
}
