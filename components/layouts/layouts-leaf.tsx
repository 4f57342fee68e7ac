'use client'

import { useEffect, useMemo, useRef, useState } from 'react'
import { Leaf, LeafSection } from '@/components/figures/leaf'
import { Caution } from '@/components/figures/note'
import type { LayoutSearch } from '@/lib/mechanics/layouts/find-layouts'
import type { Layout, LayoutRequest } from '@/lib/mechanics/layouts/layout'
import { formatNumber } from '@/lib/units/format'
import type { CrankTrain } from '@/scene/model/crank-train'
import { newScene } from '@/scene/model/default-scene'
import { layoutDocument } from '@/scene/session/layout-document'
import { useBench, useResults } from '@/scene/session/react'
import type { Session } from '@/scene/session/session'
import { formFor, readForm, type WishForm } from './form'
import { FoundLayouts } from './found-layouts'
import { LayoutFigures } from './layout-figures'
import { useLayoutSearch } from './use-layout-search'
import { EngineSection, WishSection } from './wish-form'
import { firstWords, missWords, searchedWords } from './words'

interface Answer {
  request: LayoutRequest
  found: LayoutSearch
  /** The document whose sizes and masses the rows take. */
  base: CrankTrain
  chosen: number
  /** The row that was opened last, and its document. */
  opened: { layout: Layout; document: CrankTrain } | null
}

interface Kept {
  form: WishForm
  answer: Answer | null
}

/** Form and answer outlive the leaf: a row is opened, looked at on the drawing, and the next one tried. */
const kept = new WeakMap<Session, Kept>()

/** The leaf where a layout is looked for by what is wished of it. */
export function LayoutsLeaf() {
  const { session } = useBench()
  const { document, train } = useResults()
  const [{ form, answer }, setState] = useState<Kept>(
    () => kept.get(session) ?? { form: formFor(document), answer: null },
  )
  const set = (part: Partial<Kept>) =>
    setState((state) => {
      const next = { ...state, ...part }
      kept.set(session, next)
      return next
    })
  const { request, problems } = useMemo(() => readForm(form, train), [form, train])
  const bar = useRef<HTMLDivElement>(null)
  const fresh = useRef(false)
  const { state, begin, cancel } = useLayoutSearch((asked, found) => {
    fresh.current = true
    set({ answer: { request: asked, found, base: document, chosen: 0, opened: null } })
  })
  // what was asked for is below the wishes: bring it into view once, when it has come
  useEffect(() => {
    if (fresh.current) bar.current?.scrollIntoView({ block: 'start' })
    fresh.current = false
  }, [answer])
  const running = state.kind === 'running'
  const onBench = answer?.opened?.document === document ? answer.opened.layout : null
  const open = (layout: Layout) => {
    if (!answer || onBench === layout) return
    const laid = layoutDocument(layout, answer.base)
    session.open(newScene(laid), 'set out')
    set({ answer: { ...answer, opened: { layout, document: laid } } })
  }
  const formProps = { form, problems, onChange: (next: WishForm) => set({ form: next }) }
  const nothing = answer?.found.layouts.length === 0
  return (
    <Leaf
      title="Layouts"
      sentence={
        answer
          ? nothing
            ? missWords(answer.found, answer.request)
            : firstWords(answer.found, answer.request)
          : 'Throw angles and firing orders are looked through for the layouts that come nearest to what is wished of them.'
      }
    >
      <EngineSection {...formProps} />
      <WishSection {...formProps} />
      <LeafSection title="Search" wide>
        <div className="layout-search" ref={bar}>
          {running ? (
            <button type="button" className="btn" onClick={cancel}>
              Cancel
            </button>
          ) : (
            <button
              type="button"
              className="btn pri"
              disabled={!request}
              onClick={() => request && begin(request)}
            >
              Search
            </button>
          )}
          {running ? (
            <progress value={state.seen.progress} max={1} aria-label="Search">
              {Math.round(100 * state.seen.progress)} %
            </progress>
          ) : null}
          <p className="cap" role="status">
            {stateWords(state, problems.length, answer)}
          </p>
        </div>
      </LeafSection>
      {answer && !nothing ? (
        <FoundLayouts
          request={answer.request}
          found={answer.found}
          chosen={answer.chosen}
          onBench={onBench}
          rotation={answer.base.rotation}
          onChoose={(chosen) => set({ answer: { ...answer, chosen } })}
          onOpen={open}
        />
      ) : null}
      {answer?.found.miss ? (
        <LayoutFigures
          layout={answer.found.miss.layout}
          request={answer.request}
          place={null}
          onBench={onBench === answer.found.miss.layout}
          rotation={answer.base.rotation}
          onOpen={() => open(answer.found.miss!.layout)}
        />
      ) : null}
      <Caution />
    </Leaf>
  )
}

function stateWords(
  state: ReturnType<typeof useLayoutSearch>['state'],
  refused: number,
  answer: Answer | null,
): string {
  const whole = (value: number) => formatNumber(value, { decimals: 0 })
  if (state.kind === 'running') return `Looked at ${whole(state.seen.phasings)} phasings.`
  if (refused > 0) return `Held: ${refused === 1 ? '1 value is' : `${refused} values are`} not taken.`
  if (state.kind === 'failed') return 'The search could not run. Try it again.'
  const before = state.kind === 'cancelled' ? 'Cancelled. ' : ''
  return answer ? `${before}${searchedWords(answer.found, answer.request)}` : before.trim()
}
