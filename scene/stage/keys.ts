import { namedViews, type NamedView } from './types'

export type KeyIntent =
  | { kind: 'orbit'; yaw: number; pitch: number }
  | { kind: 'zoom'; factor: number }
  | { kind: 'home' }
  | { kind: 'step'; angle: number }
  | { kind: 'play' }
  | { kind: 'view'; name: NamedView }

const degree = Math.PI / 180
const orbitStep = 15 * degree
const zoomStep = 1.2

/** As with the hand: the engine follows the arrow. */
const orbits: Record<string, [yaw: number, pitch: number]> = {
  ArrowLeft: [-orbitStep, 0],
  ArrowRight: [orbitStep, 0],
  ArrowUp: [0, -orbitStep],
  ArrowDown: [0, orbitStep],
}

/** What a key means to a stage in focus; null leaves it to the browser, Tab above all. */
export function readKey(
  event: Pick<KeyboardEvent, 'key' | 'code' | 'shiftKey' | 'ctrlKey' | 'altKey' | 'metaKey'>,
): KeyIntent | null {
  if (event.ctrlKey || event.altKey || event.metaKey) return null
  const { key, code } = event
  if (key in orbits) return { kind: 'orbit', yaw: orbits[key][0], pitch: orbits[key][1] }
  if (key === '+' || key === '=') return { kind: 'zoom', factor: 1 / zoomStep }
  if (key === '-' || key === '_' || key === '−') return { kind: 'zoom', factor: zoomStep }
  if (key === 'Home') return { kind: 'home' }
  if (key === ' ') return { kind: 'play' }
  if (key === ',' || key === '.') return { kind: 'step', angle: (key === ',' ? -0.1 : 0.1) * degree }
  const step = (event.shiftKey ? 10 : 1) * degree
  if (key === '[' || key === '{' || (key !== ']' && code === 'BracketLeft'))
    return { kind: 'step', angle: -step }
  if (key === ']' || key === '}' || code === 'BracketRight') return { kind: 'step', angle: step }
  const view = key.length === 1 ? namedViews[Number(key) - 1] : undefined
  return view ? { kind: 'view', name: view } : null
}

/** Keys count while the stage itself has the focus, not what stands on it. */
export function listenToKeys(host: HTMLElement, perform: (intent: KeyIntent) => void): () => void {
  const down = (event: KeyboardEvent) => {
    if (event.target !== host) return
    const intent = readKey(event)
    if (!intent) return
    event.preventDefault()
    perform(intent)
  }
  host.addEventListener('keydown', down)
  return () => host.removeEventListener('keydown', down)
}
