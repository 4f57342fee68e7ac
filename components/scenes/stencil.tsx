import Link from 'next/link'
import { CrankStar } from '@/components/drawing/crank-star'
import type { CrankTrain } from '@/scene/model/crank-train'

/** Layouts to start from, each by its crank star. */
export function Stencil({ layouts }: { layouts: readonly { id: string; train: CrankTrain }[] }) {
  return (
    <section className="stencil" aria-label="Start from a layout">
      <h2>Start from a layout</h2>
      <ul>
        {layouts.map(({ id, train }) => (
          <li key={id}>
            <Link href={`/bench?preset=${id}`} prefetch={false}>
              <CrankStar train={train} />
              <span>{train.title}</span>
            </Link>
          </li>
        ))}
      </ul>
    </section>
  )
}
