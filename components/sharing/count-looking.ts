'use client'

import { useEffect } from 'react'
import { linkAddress, type LinkHeld } from './link-address'

/** Between two reports of how long the parts of a page have been in view. */
const reportMs = 15_000
const parts = ['drawing', 'figures', 'notes'] as const
type Part = (typeof parts)[number]

/**
 * Says once that the page is before somebody, and for how long each of its parts (`data-part`) has been in view. Nothing
 * on the page depends on the answers.
 */
export function CountLooking(held: LinkHeld) {
  const { token, pass } = held
  useEffect(() => countLooking({ token, pass }), [token, pass])
  return null
}

function countLooking(held: LinkHeld): () => void {
  const seen = new Set<Part>()
  const seconds: Record<Part, number> = { drawing: 0, figures: 0, notes: 0 }
  let opening: string | null = null
  let first = 0
  let told = ''
  let at = performance.now()

  const observer = new IntersectionObserver(
    (entries) => {
      for (const { target, isIntersecting } of entries) {
        const part = parts.find((one) => one === (target as HTMLElement).dataset.part)
        if (part) seen[isIntersecting ? 'add' : 'delete'](part)
      }
    },
    { threshold: 0.3 },
  )
  for (const element of document.querySelectorAll('[data-part]')) observer.observe(element)

  const visible = () => document.visibilityState === 'visible'
  const open = async () => {
    const answer = await fetch(linkAddress(held, '/openings'), { method: 'POST' }).catch(() => null)
    if (answer?.ok) opening = (await answer.json()).opening
  }
  const add = () => {
    const now = performance.now()
    if (visible()) for (const part of seen) seconds[part] += (now - at) / 1000
    at = now
  }
  const report = () => {
    const body = JSON.stringify({
      drawingSeconds: Math.round(seconds.drawing),
      figuresSeconds: Math.round(seconds.figures),
      notesSeconds: Math.round(seconds.notes),
    })
    if (opening === null || body === told) return
    told = body
    const address = linkAddress(held, `/openings/${opening}`)
    navigator.sendBeacon(address, new Blob([body], { type: 'application/json' }))
  }
  const turn = () => {
    if (visible()) {
      at = performance.now()
      first ||= requestAnimationFrame(open)
      return
    }
    // hidden just now: it was in view until here
    for (const part of seen) seconds[part] += (performance.now() - at) / 1000
    report()
  }
  const leave = () => {
    add()
    report()
  }
  const ticks = setInterval(add, 1000)
  const reports = setInterval(report, reportMs)
  document.addEventListener('visibilitychange', turn)
  window.addEventListener('pagehide', leave)
  if (visible()) first = requestAnimationFrame(open)
  return () => {
    cancelAnimationFrame(first)
    clearInterval(ticks)
    clearInterval(reports)
    observer.disconnect()
    document.removeEventListener('visibilitychange', turn)
    window.removeEventListener('pagehide', leave)
  }
}
