/**
 * The most a counterweight can be: a half disc of radius R and thickness t (m) of density ρ (kg/m³) about the crank's
 * axis holds (2/3)·ρ·t·R³, kg m: area πR²/2 with its centre of gravity at 4R/3π (elementary).
 */
export const halfDiscMoment = (radius: number, thickness: number, density: number): number =>
  (2 / 3) * density * thickness * radius ** 3

/** Steel, cast iron and tungsten alloys, kg/m³ (common practice; tungsten alloy is sold from 17,000 to 18,500). */
export const densities = {
  steel: 7850,
  'cast iron': 7100,
  'tungsten alloy, light': 17_000,
  'tungsten alloy': 18_000,
  'tungsten alloy, heavy': 18_500,
} as const

export interface Slug {
  /** m³, of the hole and of the slug. */
  volume: number
  /** Of the slug alone, kg. */
  mass: number
  /** Of a round slug right through the web, m. */
  diameter: number
}

/**
 * A slug of heavier metal set into the web at radius `at`: it adds (ρ_slug − ρ)·V·at for what it displaces, so V =
 * lacking/((ρ_slug − ρ)·at). `lacking` kg m; lengths m; densities kg/m³. Throws RangeError unless the slug is denser and
 * `at` above 0.
 */
export function slugFor(lacking: number, at: number, thickness: number, density: number, web: number): Slug {
  if (!(density > web))
    throw new RangeError(`A slug of ${density} kg/m³ adds nothing to a web of ${web} kg/m³.`)
  if (!(at > 0)) throw new RangeError('A slug at the crank’s axis adds nothing.')
  const volume = lacking / ((density - web) * at)
  return { volume, mass: density * volume, diameter: Math.sqrt((4 * volume) / (Math.PI * thickness)) }
}

/** What a web can be cut to, and of what: m, m, kg/m³. */
export interface WebRoom {
  radius: number
  thickness: number
  density: number
}

export interface WebLoad {
  /** mass × radius, kg m, and what the half disc holds. */
  moment: number
  capacity: number
  /** The slug that closes it where the moment is beyond the capacity. */
  slug: Slug | null
}

/** A web filled to this share beyond its capacity is full, not beyond. */
const ROUNDING = 1e-9

/** A slug's centre lies at this share of the web's radius where nothing else is said (common practice). */
export const SLUG_AT = 0.8

/** A counterweight against what its web can hold. Throws RangeError as `slugFor` does. */
export function webLoad(
  { mass, radius }: { mass: number; radius: number },
  web: WebRoom,
  slug: { density: number; at?: number },
): WebLoad {
  const moment = mass * radius
  const capacity = halfDiscMoment(web.radius, web.thickness, web.density)
  const lacking = moment - capacity
  const at = slug.at ?? SLUG_AT * web.radius
  return {
    moment,
    capacity,
    slug:
      lacking > ROUNDING * capacity ? slugFor(lacking, at, web.thickness, slug.density, web.density) : null,
  }
}
