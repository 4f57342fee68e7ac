/** Name and number of the method that every figure comes from: a change of any figure is a new number. */
export const method = { name: 'rigid crank, constant speed', version: '1.0' } as const

/** What the figures leave out, on every sheet that shows them. */
export const methodLimits =
  'Rigid crank at constant speed. A rod whose own inertia is given is a rigid body, else two masses at its ends. Loads leave out oil film, bending and torsional response.'
