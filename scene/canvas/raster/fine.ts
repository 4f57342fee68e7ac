import { hangHatch, hatchRow } from './hatch'
import { addSample, allSamples, firstSamples, showSamples } from './refine'
import { inkSeams } from './seams'
import type { Fine } from './types'

export const fine: Fine = { inkSeams, hangHatch, hatchRow, addSample, showSamples, firstSamples, allSamples }
