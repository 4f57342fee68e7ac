/** What stands on every print, whatever the figures are. */
export const printCautions: readonly string[] = [
  'For planning. It takes the place of no maker’s manual, no stress, fatigue or torsional approval and no qualified engineer; it calls nothing airworthy, approved or safe to run. Class, aviation and emissions work needs the people and papers that their rules name.',
  'Never run past the limit of the weakest part. Forces grow with the square of speed: 10 % over is 21 % more. Flywheels and dampers can burst; use guards and rated parts.',
  'Balancing machines and turning parts: guard closed, bob-weights tight, no loose clothing, eyes protected, drill chips cleared. Heavy-metal slugs lie in an axial hole and are retained, never only pressed in from outside.',
  'The crank is rigid and turns at constant speed. Loads leave out oil film, bending and torsional response: size no part from this sheet alone.',
  'The engine maker’s data, the machine shop’s and the local rules, and a qualified person come first. Rotating parts are not to be run on an unproved balance; fasteners follow the maker’s torque procedure.',
]
