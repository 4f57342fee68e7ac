import { createStore, type StoreApi } from 'zustand/vanilla'
import type { System } from '@/lib/units/quantities'
import type { Scene } from '@/scene/model/scene'
import type { Field, Mend } from './field'
import { applyChanges, inTrain, type Change } from './path'
import { judge, type Issue } from './judge'
import { noLocks, withFollowers, type Locks } from './locks'
import { mendsFor } from './mends'
import { doubtBrought } from './standing'
import type { Mend as Standing } from '@/scene/model/doubts/doubt'

/** Typed text that the document did not take, beside the last good document. */
export interface Refusal {
  key: string
  label: string
  text: string
  head: string
  message: string
  mends: Mend[]
  /** What the text would change, where it could be read: tried again with every later edit. */
  changes: Change[] | null
  /** Set where the value may be kept as it is: the words on the button. */
  keep: string | null
}

/** What a document was set out from: tells `preset` from `typed` in the parts list. */
export interface Base {
  train: Scene['train']
  word: 'preset' | 'version' | 'file' | 'set out'
}

/** The stored scene that this draft belongs to. */
export interface Saved {
  sceneId: string
  version: number
  /** The document of that version: the draft has changes when it differs. */
  scene: Scene
}

interface Step {
  scene: Scene
  base: Base
  saved: Saved | null
}

export interface SessionState {
  scene: Scene
  base: Base
  saved: Saved | null
  refused: Record<string, Refusal>
  past: Step[]
  future: Step[]
  /** Consecutive edits under one gesture are one step; `seal` ends it. */
  gesture: string | null
  system: System
  locks: Locks
  /** What was understood of the text being typed, where that is not plain from the text. */
  understood: { key: string; text: string } | null
  /** Part picked on the drawing, and the field whose row is lit. */
  picked: string | null
  lit: string | null
  /** Parts that something else on the page is about, lit until a part is picked. */
  pointed: readonly string[]
}

export interface Session extends StoreApi<SessionState> {
  /** The only writer of the document. False when the document would be refused; nothing has changed then. */
  edit(changes: Change[], gesture?: string): boolean
  /** Typed text on its way into the document; what cannot go in is kept in `refused`. `force` passes over a doubt. */
  enter(field: Field, text: string, force?: boolean): void
  /** Ends a gesture: the next edit is a step of its own. */
  seal(): void
  /** Drops a refused value: the last good one stands. */
  drop(key: string): void
  undo(): void
  redo(): void
  /** Another document altogether; one step back brings the old one again. */
  open(scene: Scene, word: Base['word'], saved?: Saved | null): void
  /** Takes up work that was left, as if it had never been put down. */
  takeUp(left: Pick<SessionState, 'scene' | 'base' | 'saved'>): void
  markSaved(saved: Saved | null): void
  setSystem(system: System): void
  setLock(lock: keyof Locks, on: boolean): void
  pick(part: string | null): void
  light(key: string | null): void
  point(parts: readonly string[]): void
}

const STEPS = 200

export interface SessionStart {
  scene: Scene
  base?: Base
  saved?: Saved | null
  system?: System
}

export function createSession(start: SessionStart): Session {
  const store = createStore<SessionState>(() => ({
    scene: start.scene,
    base: start.base ?? { train: start.scene.train, word: 'preset' },
    saved: start.saved ?? null,
    refused: {},
    past: [],
    future: [],
    gesture: null,
    system: start.system ?? 'si',
    locks: noLocks,
    understood: null,
    picked: null,
    lit: null,
    pointed: [],
  }))
  const { getState: get, setState: set } = store

  /** Takes a judged scene in. A change of the view alone is no step: nobody wants to undo an orbit. */
  const commit = (scene: Scene, gesture: string | null, refused: Record<string, Refusal>) => {
    const state = get()
    if (scene.train === state.scene.train) return set({ scene, refused })
    const merges = gesture !== null && gesture === state.gesture
    const step: Step = { scene: state.scene, base: state.base, saved: state.saved }
    set({
      scene,
      refused,
      gesture,
      past: merges ? state.past : [...state.past.slice(1 - STEPS), step],
      future: [],
    })
  }

  const restore = (from: 'past' | 'future', to: 'past' | 'future') => {
    const state = get()
    const step = state[from].at(-1)
    if (!step) return
    const here: Step = { scene: state.scene, base: state.base, saved: state.saved }
    // How it is looked at stays, unless the step goes back to another document altogether.
    const same = step.base === state.base
    set({
      scene: same ? { ...step.scene, view: state.scene.view } : step.scene,
      base: step.base,
      saved: same ? state.saved : step.saved,
      refused: {},
      gesture: null,
      [from]: state[from].slice(0, -1),
      [to]: [...state[to], here],
    })
  }

  return {
    ...store,
    edit(changes, gesture) {
      const state = get()
      const scene = applyChanges(state.scene, changes)
      if (scene.train !== state.scene.train && judge(scene.train).length > 0) return false
      commit(scene, gesture ?? null, state.refused)
      return true
    },
    enter(field, text, force = false) {
      const state = get()
      const { [field.key]: _mine, ...others } = state.refused
      const refuse = (what: Partial<Refusal>) =>
        set({
          refused: {
            ...others,
            [field.key]: {
              key: field.key,
              label: field.label,
              text,
              head: '',
              message: '',
              mends: [],
              changes: null,
              keep: null,
              ...what,
            },
          },
        })
      const reading = field.read(text, state.scene, state.system)
      if (!reading.ok)
        return refuse({ head: 'Not understood.', message: reading.message, mends: reading.mends })
      const { doubt } = reading
      const changes = withFollowers(state.scene, reading.changes, state.locks)
      if (doubt && !force) return refuse({ ...doubt, changes, keep: doubt.keep })
      const taken = tryTogether(state.scene, changes, others)
      if (taken.issues) {
        const attempt = { key: field.key, changes, scene: state.scene, system: state.system }
        return refuse({ ...wordsOf(taken.issues), mends: mendsFor(taken.issues, attempt), changes })
      }
      const brought = force ? undefined : doubtBrought(state.scene.train, taken.scene.train, state.system)
      if (brought)
        return refuse({
          head: brought.head,
          message: brought.message,
          mends: brought.mend ? [withMend(brought.mend, changes)] : [],
          changes,
          keep: `Keep ${text.trim()}`,
        })
      commit(taken.scene, field.key, taken.refused)
      set({ understood: reading.understood ? { key: field.key, text: reading.understood } : null })
    },
    seal: () => set({ gesture: null, understood: null }),
    drop(key) {
      const { [key]: _dropped, ...refused } = get().refused
      set({ refused })
    },
    undo() {
      if (Object.keys(get().refused).length > 0) set({ refused: {}, gesture: null })
      else restore('past', 'future')
    },
    redo: () => restore('future', 'past'),
    open(scene, word, saved = null) {
      const state = get()
      const step: Step = { scene: state.scene, base: state.base, saved: state.saved }
      set({
        scene,
        base: { train: scene.train, word },
        saved,
        refused: {},
        gesture: null,
        past: [...state.past.slice(1 - STEPS), step],
        future: [],
        picked: null,
        lit: null,
        pointed: [],
      })
    },
    takeUp: (left) => set({ ...left, refused: {}, past: [], future: [], gesture: null }),
    markSaved: (saved) => set({ saved }),
    setSystem: (system) => set({ system }),
    setLock: (lock, on) => set({ locks: { ...get().locks, [lock]: on } }),
    pick: (picked) => set({ picked, pointed: [] }),
    light: (lit) => set({ lit }),
    point: (pointed) => set({ pointed, picked: null }),
  }
}

/** What a doubt offers comes after what was typed: throws and the order that fits them go in together. */
const withMend = ({ label, changes: more }: Standing, typed: Change[]): Mend => ({
  label,
  changes: [...typed, ...inTrain(more)],
})

type Taken = { issues: Issue[] } | { issues?: undefined; scene: Scene; refused: Record<string, Refusal> }

/**
 * A value that was refused alone may be right together with the next one (new throws, then the order that fits
 * them): so an edit is tried with everything that waits, and then by itself.
 */
function tryTogether(scene: Scene, changes: Change[], waiting: Record<string, Refusal>): Taken {
  const held = Object.values(waiting).filter((refusal) => refusal.changes && !refusal.keep)
  if (held.length > 0) {
    const all = applyChanges(scene, [...held.flatMap((refusal) => refusal.changes!), ...changes])
    if (judge(all.train).length === 0) {
      const keys = new Set(held.map((refusal) => refusal.key))
      const refused = Object.fromEntries(Object.entries(waiting).filter(([key]) => !keys.has(key)))
      return { scene: all, refused }
    }
  }
  const alone = applyChanges(scene, changes)
  const issues = alone.train === scene.train ? [] : judge(alone.train)
  return issues.length > 0 ? { issues } : { scene: alone, refused: waiting }
}

/** The first reason, its opening words as the head; other reasons of another kind follow. */
function wordsOf(issues: Issue[]): Pick<Refusal, 'head' | 'message'> {
  const [first] = issues
  const end = first.message.search(/[:.]\s/) + 1
  const others = issues.filter(
    (issue, i) => issue.code !== first.code && issues.findIndex(({ code }) => code === issue.code) === i,
  )
  const said = [
    first.message.slice(end).trim(),
    first.fix,
    ...others.map((issue) => `${issue.message} ${issue.fix}`),
  ]
  return { head: first.message.slice(0, end), message: said.filter(Boolean).join(' ') }
}
