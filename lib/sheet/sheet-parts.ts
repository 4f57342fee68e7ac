export const sheetParts = ['drawing', 'data', 'balance', 'counterweights', 'loads', 'completeness'] as const
export type SheetPart = (typeof sheetParts)[number]

export const sheetUnits = ['both', 'si', 'us'] as const
export type SheetUnits = (typeof sheetUnits)[number]

export const papers = ['A4', 'Letter'] as const
export type Paper = (typeof papers)[number]
