'use client'

import { createContext, useContext, useId, type ReactNode } from 'react'

/** Turns to another leaf of the bench. */
export const LeafContext = createContext<(id: string) => void>(() => undefined)
export const useOpenLeaf = () => useContext(LeafContext)

interface Props {
  title: string
  /** What the figures say, in a sentence or two. */
  sentence?: ReactNode
  children: ReactNode
}

/** A page of the bench: its title, what it comes to, and sections in as many columns as there is room for. */
export function Leaf({ title, sentence, children }: Props) {
  return (
    <article className="leaf" aria-label={title}>
      <header className="leaf-head">
        <h2>{title}</h2>
        {sentence ? <p className="read">{sentence}</p> : null}
      </header>
      {children}
    </article>
  )
}

interface SectionProps {
  title: string
  /** Under which condition: a speed, a cylinder. */
  at?: ReactNode
  /** Takes the whole width of the leaf. */
  wide?: boolean
  children: ReactNode
}

export function LeafSection({ title, at, wide, children }: SectionProps) {
  const id = useId()
  return (
    <section className={wide ? 'leaf-section wide' : 'leaf-section'} aria-labelledby={id}>
      <h3 id={id}>
        {title} {at ? <span className="at">{at}</span> : null}
      </h3>
      {children}
    </section>
  )
}
