/**
 * Flywheel by the turning-moment diagram: E energy fluctuation (J, 0 or more), I moment of inertia (kg m²), ω mean speed
 * (rad/s), C coefficient of speed fluctuation (ω_max − ω_min)/ω, with ω half-way between the two. The energy between the
 * extremes is ½I(ω_max² − ω_min²) = I·C·ω² exactly. All arguments positive, else the answer is Infinity or NaN.
 *
 * Source: R. S. Khurmi and J. K. Gupta, Theory of Machines, 14th ed., chapter 16, energy stored in a flywheel.
 */

/** I = E/(C ω²), kg m². */
export const flywheelInertia = (energy: number, fluctuation: number, speed: number): number =>
  energy / (fluctuation * speed ** 2)

/** C = E/(I ω²). */
export const speedFluctuation = (energy: number, inertia: number, speed: number): number =>
  energy / (inertia * speed ** 2)

/** ω(1 ± C/2): the greatest and the least speed, rad/s. */
export function speedRange(energy: number, inertia: number, speed: number): { most: number; least: number } {
  const half = (speed * speedFluctuation(energy, inertia, speed)) / 2
  return { most: speed + half, least: speed - half }
}
