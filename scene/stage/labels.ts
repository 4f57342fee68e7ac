export type LabelKind = 'plain' | 'minor' | 'bank' | 'fire' | 'lit'

export interface LabelSpec {
  text: string
  kind: LabelKind
}

/** Words that hang on points of the drawing. Between `begin` and `end` each is put or left out; earlier ones go before later. */
export interface Labels {
  set(specs: LabelSpec[]): void
  begin(sheet: LabelSheet): void
  /** Its middle, CSS pixels. */
  put(index: number, x: number, y: number): void
  end(): void
}

/** CSS pixels; nothing is written in the legend's room in the top right corner. */
export interface LabelSheet {
  width: number
  height: number
  legend: { width: number; height: number }
}

/** A word that belongs this little outside the sheet is drawn in, CSS pixels. */
const drawIn = 40
/** Where two words may come to each other, CSS pixels. */
const air = 2

export function createLabels(layer: HTMLElement): Labels {
  let elements: HTMLElement[] = []
  let key = ''
  let sheet: LabelSheet = { width: 0, height: 0, legend: { width: 0, height: 0 } }
  // width, height, wanted x, wanted y, shown x, shown y
  let state = new Float64Array(0)
  let wanted = new Uint8Array(0)
  let shown = new Uint8Array(0)

  const collides = (i: number) => {
    const right = state[6 * i + 2] + state[6 * i] / 2
    if (right > sheet.width - sheet.legend.width && state[6 * i + 3] < sheet.legend.height) return true
    for (let j = 0; j < i; j++) {
      if (!shown[j]) continue
      const dx = Math.abs(state[6 * i + 2] - state[6 * j + 2])
      const dy = Math.abs(state[6 * i + 3] - state[6 * j + 3])
      if (
        2 * dx < state[6 * i] + state[6 * j] + 2 * air &&
        2 * dy < state[6 * i + 1] + state[6 * j + 1] - 2 * air
      )
        return true
    }
    return false
  }

  return {
    set(specs) {
      const next = JSON.stringify(specs)
      if (next === key) return
      key = next
      for (const element of elements) element.remove()
      elements = specs.map(({ text, kind }) => {
        const element = document.createElement('span')
        element.className = `stage-label ${kind}`
        element.textContent = text
        element.setAttribute('aria-hidden', 'true')
        return element
      })
      layer.prepend(...elements)
      state = new Float64Array(6 * specs.length).fill(NaN)
      wanted = new Uint8Array(specs.length)
      shown = new Uint8Array(specs.length)
      elements.forEach((element, i) => {
        state[6 * i] = element.offsetWidth
        state[6 * i + 1] = element.offsetHeight
      })
      // measured as they will stand, and out of sight until a picture says where that is
      for (const element of elements) element.hidden = true
    },
    begin(next) {
      wanted.fill(0)
      sheet = next
    },
    put(i, x, y) {
      wanted[i] = 1
      state[6 * i + 2] = drawnIn(x, state[6 * i] / 2, sheet.width)
      state[6 * i + 3] = drawnIn(y, state[6 * i + 1] / 2, sheet.height)
    },
    end() {
      for (let i = 0; i < elements.length; i++) {
        const show = wanted[i] === 1 && !collides(i)
        if (show !== (shown[i] === 1)) elements[i].hidden = !show
        shown[i] = show ? 1 : 0
        if (!show) continue
        const x = Math.round(state[6 * i + 2] - state[6 * i] / 2)
        const y = Math.round(state[6 * i + 3] - state[6 * i + 1] / 2)
        if (x === state[6 * i + 4] && y === state[6 * i + 5]) continue
        state[6 * i + 4] = x
        state[6 * i + 5] = y
        elements[i].style.transform = `translate(${x}px, ${y}px)`
      }
    },
  }
}

/** The middle of a word so placed that it is whole on the sheet, where it belongs near enough. */
function drawnIn(middle: number, half: number, size: number): number {
  if (middle < -drawIn || middle > size + drawIn) return middle
  return Math.max(half, Math.min(size - half, middle))
}
