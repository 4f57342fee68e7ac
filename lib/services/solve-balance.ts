import type { solveBalance as contract } from '@/lib/contracts/balance'
import type { AnswerOf, BodyOf } from '@/lib/contracts/operation'
import { refused } from '@/lib/errors/problem'
import { residualAnswer } from '@/lib/mechanics/analysis/balance'
import { DEGREES, KG_MM, KG_MM2, MM } from '@/lib/mechanics/analysis/recorder'
import { residualUnbalance } from '@/lib/mechanics/balance'
import { halfDiscMoment, SLUG_AT, webLoad } from '@/lib/mechanics/balance/half-disc'
import { CannotBalance, solveCounterweights, type Plane } from '@/lib/mechanics/balance/solve-counterweights'
import { presentPlanes, webRoom } from '@/scene/frame/web-planes'
import { arrivingTrain } from './arriving-train'

type Body = BodyOf<typeof contract>

/** Counterweights that balance a crank, with what each web holds of its own. */
export function solveBalance(body: Body): AnswerOf<typeof contract> {
  const { document, train } = arrivingTrain(body.train)
  const own = webRoom(document, train)
  const web = {
    radius: body.web.outerRadiusMm === undefined ? own.radius : body.web.outerRadiusMm / MM,
    thickness: body.web.thicknessMm === undefined ? own.thickness : body.web.thicknessMm / MM,
    density: body.web.densityKgM3 ?? own.density,
  }
  const slug = {
    density: body.slug.densityKgM3,
    at: body.slug.radiusMm === undefined ? SLUG_AT * web.radius : body.slug.radiusMm / MM,
  }
  if (slug.density <= web.density)
    throw refused([
      {
        path: 'slug.densityKgM3',
        code: 'too-light',
        message: `A slug of ${slug.density} kg/m³ adds nothing to a web of ${web.density} kg/m³.`,
        fix: 'Give a denser metal: tungsten alloys have 17,000 to 18,500 kg/m³.',
      },
    ])
  const most = halfDiscMoment(web.radius, web.thickness, web.density)
  const planes = (body.planes?.map(inSi) ?? presentPlanes(document, train)).map((plane) =>
    body.withinCapacity ? { ...plane, most: most / plane.radius } : plane,
  )
  const { counterweights, mass, least } = solved(() => solveCounterweights(train, planes, body.rule), body)
  return {
    counterweights: counterweights.map((weight) => ({
      id: weight.id,
      axialMm: weight.axial * MM,
      angleDeg: weight.angle * DEGREES,
      massKg: weight.mass,
      radiusMm: weight.radius * MM,
    })),
    residual: residualAnswer(residualUnbalance({ ...train, counterweights })),
    totalMassKg: mass,
    leastMassKg: least,
    capacity: counterweights.map((weight) => {
      const load = webLoad(weight, web, slug)
      return {
        id: weight.id,
        momentKgMm: load.moment * KG_MM,
        capacityKgMm: load.capacity * KG_MM,
        share: load.moment / load.capacity,
        slug: load.slug && {
          densityKgM3: slug.density,
          radiusMm: slug.at * MM,
          volumeCm3: load.slug.volume * 1e6,
          massKg: load.slug.mass,
          diameterMm: load.slug.diameter * MM,
        },
      }
    }),
    web: {
      outerRadiusMm: web.radius * MM,
      thicknessMm: web.thickness * MM,
      densityKgM3: web.density,
      stated: own.stated || (body.web.outerRadiusMm !== undefined && body.web.thicknessMm !== undefined),
    },
  }
}

const inSi = ({ id, axialMm, radiusMm, fixed }: NonNullable<Body['planes']>[number]): Plane => ({
  id,
  axial: axialMm / MM,
  radius: radiusMm / MM,
  fixed: fixed && { mass: fixed.massKg, angle: fixed.angleDeg / DEGREES },
})

const fixes = {
  'no-plane': 'Give a plane whose weight is free.',
  'one-place': 'Give a second plane at another place along the crank.',
  full: 'Give more planes, larger or thicker webs, or solve without the limit and set slugs.',
}

/** Refusals of the solver as refusals of the request. */
function solved<T>(solve: () => T, { planes }: Body): T {
  try {
    return solve()
  } catch (error) {
    if (!(error instanceof CannotBalance)) throw error
    throw refused([
      {
        path: planes ? 'planes' : 'train.counterweights',
        code: error.reason,
        message: cannotBalanceWords(error),
        fix: fixes[error.reason],
      },
    ])
  }
}

const rounded = (value: number) => String(Number(value.toPrecision(4)))

function cannotBalanceWords({ reason, force, couple, throws }: CannotBalance): string {
  const left = `${rounded(force * KG_MM)} kg mm and a couple of ${rounded(couple * KG_MM2)} kg mm²`
  const where = throws ? ` by throw ${throws.join(', ')}` : ''
  switch (reason) {
    case 'no-plane':
      return `No plane${where} is free to answer ${left}.`
    case 'one-place':
      return `The planes${where} all stand at one place: they cannot answer ${left}.`
    case 'full':
      return `All planes${where} together hold too little to answer ${left}.`
  }
}
