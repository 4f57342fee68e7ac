/** Where formulas come from and what they assume, said once. */
export const geometry = 'Plane geometry of the offset slider-crank.'
export const newton = "Newton's and Euler's laws for a rigid body."
export const handbook = 'Common practice of machine-dynamics handbooks.'

export const steady = 'The crank is rigid and turns at constant speed.'
export const exact = 'Exact for the given rod and offset, not a series.'
export const massless = 'Friction and gravity are left out.'
export const twoMass = 'The rod is two masses, one at each end, about its centre of gravity.'
export const hinged =
  'Each load is shared by its two neighbouring mains, as if the crank were hinged at every main.'
export const sampledEachDegree = 'Taken from samples one degree apart over a whole cycle.'
export const degreesInside = 'Angles inside sin, cos, tan and asin are in degrees.'
