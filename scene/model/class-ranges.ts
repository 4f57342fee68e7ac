/**
 * What is usual of the parts of an engine, by its class. Common practice: judgement of the trade, with no published
 * source; a value outside is asked about, never forbidden. Lengths mm, masses kg, speeds rpm, piston speeds m/s;
 * ratios and shares plain. The parallel twin and the in-line four of a motorcycle have no column.
 */
export const engineClasses = {
  'small-single': 'small single',
  car: 'car engine',
  'v-twin': 'motorcycle V-twin',
  racing: 'racing engine',
  'heavy-diesel': 'heavy diesel',
  marine: 'marine slow two-stroke',
  radial: 'radial aircraft engine',
} as const
export type EngineClass = keyof typeof engineClasses
export const engineClassNames = Object.keys(engineClasses) as [EngineClass, ...EngineClass[]]

export type Range = readonly [low: number, high: number]
type Column = Partial<Record<EngineClass, Range>>

const row = (
  single?: Range,
  car?: Range,
  twin?: Range,
  racing?: Range,
  diesel?: Range,
  marine?: Range,
  radial?: Range,
): Column => ({
  ...(single && { 'small-single': single }),
  ...(car && { car }),
  ...(twin && { 'v-twin': twin }),
  ...(racing && { racing }),
  ...(diesel && { 'heavy-diesel': diesel }),
  ...(marine && { marine }),
  ...(radial && { radial }),
})
const none = undefined

// prettier-ignore
export const classRanges = {
  //                          small single    car             V-twin          racing          heavy diesel    marine         radial
  bore:               row([36, 105],      [68, 105],      [65, 112],      [82, 98],       [95, 200],      [260, 1080],   [95, 160]),
  stroke:             row([35, 85],       [65, 105],      [50, 115],      [39, 80],       [105, 230],     [900, 4200],   [90, 180]),
  boreToStroke:       row([0.8, 1.6],     [0.8, 1.2],     [0.85, 1.6],    [1.12, 2.4],    [0.75, 0.95],   [0.22, 0.5],   [0.9, 1.1]),
  rodLength:          row([75, 160],      [125, 170],     [105, 205],     [100, 150],     [190, 420],     [1000, 4200],  [190, 350]),
  rodToStroke:        row([1.6, 2.1],     [1.5, 1.9],     [1.65, 2.1],    [1.7, 2.6],     [1.5, 1.8],     [0.95, 1.3],   [1.8, 2.2]),
  offset:             row([0, 8],         [0, 12],        [0, 6],         [0, 3],         [0, 5],         [0, 0],        [0, 0]),
  pitchToBore:        row(none,           [1.07, 1.28],   none,           [1.08, 1.17],   [1.22, 1.35],   [1.5, 1.8]),
  pinToBore:          row([0.36, 0.45],   [0.48, 0.64],   [0.36, 0.46],   [0.48, 0.56],   [0.62, 0.72],   [0.9, 1.2],    [0.45, 0.6]),
  mainToBore:         row([0.3, 0.5],     [0.58, 0.75],   [0.36, 0.48],   [0.6, 0.72],    [0.75, 0.9],    [1, 1.25],     [0.5, 0.65]),
  mainLengthToDia:    row([0.5, 0.8],     [0.32, 0.45],   [0.5, 0.8],     [0.33, 0.42],   [0.4, 0.5],     [0.3, 0.45],   [0.5, 0.8]),
  webToBore:          row([0.18, 0.3],    [0.17, 0.3],    [0.2, 0.36],    [0.18, 0.22],   [0.25, 0.32],   [0.38, 0.5],   [0.25, 0.32]),
  counterweight:      row([40, 65],       [62, 92],       [60, 115],      [55, 80],       [110, 170],     none,          [120, 180]),
  compressionHeight:  row([20, 30],       [27, 36],       [25, 40],       [22, 29],       [60, 95],       none,          [50, 75]),
  skirt:              row([12, 32],       [18, 30],       [18, 30],       [12, 22],       [35, 60],       [0, 0],        [35, 55]),
  piston:             row([0.04, 0.33],   [0.22, 0.48],   [0.2, 0.52],    [0.18, 0.33],   [1.5, 6],       [400, 3000],   [0.7, 1.8]),
  pinRingsLocks:      row([0.015, 0.08],  [0.075, 0.16],  [0.065, 0.15],  [0.06, 0.11],   [0.7, 2.5],     [500, 4000],   [0.3, 0.6]),
  rod:                row([0.08, 0.4],    [0.4, 0.75],    [0.33, 0.7],    [0.28, 0.54],   [2.5, 8],       [800, 8000],   [2, 4]),
  rodCentre:          row([0.29, 0.36],   [0.26, 0.32],   [0.28, 0.34],   [0.25, 0.3],    [0.27, 0.33],   [0.33, 0.42],  [0.3, 0.42]),
  bearing:            row([0.005, 0.025], [0.03, 0.055],  [0.025, 0.045], [0.03, 0.045],  [0.2, 0.4],     none,          [0.3, 0.6]),
  oil:                row([0, 0.003],     [0.003, 0.006], [0.003, 0.005], [0.002, 0.004], [0.01, 0.025],  [0, 0],        [0.015, 0.03]),
  idle:               row([1300, 2000],   [600, 900],     [800, 1300],    [800, 3000],    [550, 700],     [25, 35],      [450, 600]),
  rated:              row([6000, 11000],  [5000, 7500],   [4500, 10000],  [8000, 16000],  [1600, 2200],   [60, 180],     [1900, 2400]),
  most:               row([7000, 14000],  [6000, 9000],   [5500, 11500],  [9000, 18000],  [1900, 2500],   [60, 195],     [2200, 2800]),
  pistonSpeedRated:   row([11, 20],       [13, 20],       [13, 21],       [19, 25],       [8, 11.5],      [7, 9.5],      [8, 12]),
  pistonSpeedMost:    row([13, 26],       [15, 22],       [15, 24],       [21, 27],       [9, 13],        [7.5, 10],     [9, 13]),
  compressionRatio:   row([7, 14],        [9, 14],        [8.5, 13.5],    [11.5, 15],     [15, 19],       [12, 22],      [5.5, 8.5]),
} satisfies Record<string, Column>
export type RangeName = keyof typeof classRanges

/** What is usual whatever the class. */
export const always = {
  rodToStroke: [1.35, 2.7],
  rodCentre: [0.2, 0.45],
  balanceFactor: [0, 0.6],
  splitPinDeg: [0, 60],
  /** Share of the stroke. */
  offset: [0, 0.15],
} as const satisfies Record<string, Range>

/** Peak and mean pressure at rated speed, bar: what a gas model is held against. */
// prettier-ignore
export const pressureRanges = {
  mean: row([7, 14], [11, 24], [9, 14], [13, 16], [18, 26], [15, 21], [8, 13]),
  peak: row([40, 90], [60, 130], [50, 90], [70, 110], [150, 230], [120, 200], [35, 75]),
} satisfies Record<string, Column>
