import type { Train } from '../train'
import { firstTerm, inertiaScale, type InertiaScale } from './inertia-scale'
import { complex, scaled } from './phasor'
import { reciprocatingAlone, textbookOrders } from './textbook-orders'
import { exactOrders, turning, type OrderTurning, type Turning } from './turning'

export interface LayoutOrders {
  scale: InertiaScale
  exact: OrderTurning[]
  textbook: OrderTurning[]
}

/**
 * What the layout itself leaves: the reciprocating masses alone, each order in units of one mean cylinder's first term of
 * that order (F1, F2 = λ·F1, λ³/4·F1, 9λ⁵/128·F1), couples in these times the throw spacing, or the bore where all throws
 * stand at one place. With equal cylinders these are the coefficients of balancing tables.
 */
export function layoutOrders(train: Train): LayoutOrders {
  const alone = reciprocatingAlone(train)
  const scale = inertiaScale(train)
  const arm = scale.spacing ?? train.cylinders[0].bore
  const inUnits = (one: OrderTurning): OrderTurning => {
    const unit = scale.force * Math.abs(firstTerm(one.order, scale.ratio))
    return { order: one.order, force: divided(one.force, unit), couple: divided(one.couple, unit * arm) }
  }
  return {
    scale,
    exact: exactOrders(alone).map(inUnits),
    textbook: textbookOrders(alone).map(inUnits),
  }
}

const divided = ({ forward, backward }: Turning, by: number) =>
  turning(scaled(complex(forward), 1 / by), scaled(complex(backward), 1 / by))
