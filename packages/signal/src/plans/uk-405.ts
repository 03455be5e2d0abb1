import { defineRuns, type PlanRuns } from './run'

const SOURCES = {
  a: 'from memory: British 405-line channel list, vision carrier 3.5 MHz above sound',
} as const

/** System A: sound below vision. Edges are taken 0.25 MHz below sound and 1.25 MHz above vision. */
const row = (names: string, soundMhz: number, band: string) => ({
  names,
  lowerMhz: soundMhz - 0.25,
  widthMhz: 5,
  stepMhz: 5,
  visionAboveMhz: 3.75,
  soundAboveMhz: 0.25,
  system: 'A' as const,
  band,
  allocated: 'no (405-line service ended 1985)',
  source: 'a',
  confidence: 'memory' as const,
})

export const UK_405: PlanRuns = defineRuns('uk-405', SOURCES, [
  row('B1', 41.5, 'VHF-I'),
  row('B2..B5', 48.25, 'VHF-I'),
  row('B6..B13', 176.25, 'VHF-III'),
])
