import { defineRuns, type PlanRuns } from './run'

/** Where the figures of this file come from; each run names one by its letter. */
const SOURCES = {
  a: 'Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables',
  b: 'Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables; Debian xawtv OIRT/CCIR channel table (reader contribution)',
  c: 'terminal TV-viewer channel list; operating-system vendor analogue tuning tables',
  d: 'Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables; operating-system vendor analogue tuning tables; Debian xawtv OIRT/CCIR channel table (reader contribution)',
  e: 'Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables; ITU-R BT.470 (carrier spacing, edge -1.25 MHz)',
  f: 'operating-system vendor analogue tuning tables; Debian xawtv 3.107 frequency lists',
  g: 'public encyclopedia, CCIR System L channel table; Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables; operating-system vendor analogue tuning tables',
  h: 'operating-system vendor analogue tuning tables; Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables',
} as const

// prettier-ignore
export const CCIR_WEST_EUROPE: PlanRuns = defineRuns('ccir-west-europe', SOURCES, [
  { names: 'E2..E4', lowerMhz: 47, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no (Band I released)', source: 'b', confidence: 'two', note: 'early consumer modulators in this area used E3 or E4 (common practice)' },
  { names: 'S01..S03', lowerMhz: 68, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'S lower (VHF-I/II)', allocated: 'cable only', source: 'b', confidence: 'two', note: 'cable only; S02/S03 overlap some national Band II use' },
  { names: 'E5..E12', lowerMhz: 174, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'shared (digital radio/DVB-T)', source: 'b', confidence: 'two' },
  { names: 'E2A', lowerMhz: 48.5, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no (Band I released)', source: 'c', confidence: 'two', note: 'national variant' },
  { names: 'S1', lowerMhz: 104, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'S lower (mid-band)', allocated: 'cable only', source: 'a', confidence: 'two', note: 'S1 overlaps FM radio (104-111 MHz)' },
  { names: 'S2..S10', lowerMhz: 111, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'S lower (mid-band)', allocated: 'cable only', source: 'a', confidence: 'two' },
  { names: 'S11..S20', lowerMhz: 230, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'S upper (super-band)', allocated: 'cable only', source: 'a', confidence: 'two' },
  { names: 'S21..S41', lowerMhz: 302, stepMhz: 8, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'hyper-band (S21-S41)', allocated: 'cable only', source: 'b', confidence: 'two', note: '8 MHz raster: NOT a continuation of the 7 MHz S1-S20 raster' },
  { names: '21..35', lowerMhz: 470, stepMhz: 8, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'd', confidence: 'two' },
  { names: '36', lowerMhz: 590, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'd', confidence: 'two', note: 'usual default output channel of consumer modulators (common practice)' },
  { names: '37', lowerMhz: 598, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'd', confidence: 'two' },
  { names: '38', lowerMhz: 606, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF-V', allocated: 'yes (470-694 MHz)', source: 'd', confidence: 'two', note: 'radio astronomy in several countries' },
  { names: '39..48', lowerMhz: 614, stepMhz: 8, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF-V', allocated: 'yes (470-694 MHz)', source: 'd', confidence: 'two' },
  { names: '49..69', lowerMhz: 694, stepMhz: 8, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF-V', allocated: 'no (694-862 MHz reallocated to mobile)', source: 'd', confidence: 'two' },
])

// prettier-ignore
export const UK_UHF: PlanRuns = defineRuns('uk-uhf', SOURCES, [
  { names: '21..34', lowerMhz: 470, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'e', confidence: 'two', note: 'exact sound spacing 5.9996 MHz' },
  { names: '35', lowerMhz: 582, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'e', confidence: 'two', note: '35-38 were long kept clear of main stations, so home equipment lives there; 35 and 37 were taken into use late in the 1990s (from memory); exact sound spacing 5.9996 MHz' },
  { names: '36', lowerMhz: 590, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'e', confidence: 'two', note: 'usual default of consumer modulators, tunable about 30-40 (common practice); channel not used for main broadcasting; exact sound spacing 5.9996 MHz' },
  { names: '37', lowerMhz: 598, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'e', confidence: 'two', note: '35-38 were long kept clear of main stations, so home equipment lives there; 35 and 37 were taken into use late in the 1990s (from memory); exact sound spacing 5.9996 MHz' },
  { names: '38', lowerMhz: 606, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'UHF-V', allocated: 'yes (470-694 MHz)', source: 'e', confidence: 'two', note: 'radio astronomy; exact sound spacing 5.9996 MHz' },
  { names: '39..48', lowerMhz: 614, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'UHF-V', allocated: 'yes (470-694 MHz)', source: 'e', confidence: 'two', note: 'exact sound spacing 5.9996 MHz' },
  { names: '49..69', lowerMhz: 694, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'UHF-V', allocated: 'no (694-862 MHz reallocated to mobile)', source: 'e', confidence: 'two', note: 'exact sound spacing 5.9996 MHz' },
])

// prettier-ignore
export const IRELAND: PlanRuns = defineRuns('ireland', SOURCES, [
  { names: 'IA,IB,IC', lowerMhz: 44.5, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'VHF-I', allocated: 'no', source: 'f', confidence: 'two' },
  { names: 'ID', lowerMhz: 174, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'VHF-III', allocated: 'no', source: 'f', confidence: 'two' },
  { names: 'IE', lowerMhz: 182, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'VHF-III', allocated: 'no', source: 'f', confidence: 'two', note: 'one older table prints 183.75 (misprint)' },
  { names: 'IF,IG,IH', lowerMhz: 190, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'VHF-III', allocated: 'no', source: 'f', confidence: 'two' },
  { names: 'II', lowerMhz: 214, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'VHF-III', allocated: 'no', source: 'f', confidence: 'two', note: 'letter I/J usage differs between sources; identify by frequency' },
  { names: 'IJ', lowerMhz: 222, widthMhz: 8, soundAboveMhz: 7.25, system: 'I', band: 'VHF-III', allocated: 'no', source: 'f', confidence: 'one', note: 'letter I/J usage differs between sources; identify by frequency' },
])

// prettier-ignore
export const FRANCE: PlanRuns = defineRuns('france', SOURCES, [
  { names: '1,2', lowerMhz: 41, stepMhz: 8, widthMhz: 8, visionAboveMhz: 6.75, soundAboveMhz: 0.25, system: "L'", band: 'VHF-I', allocated: 'no', source: 'g', confidence: 'two', note: "L': sound is 6.5 MHz BELOW vision (spectrum inverted), AM sound, positive vision" },
  { names: '3,4', lowerMhz: 53.75, stepMhz: 3.25, widthMhz: 8, visionAboveMhz: 6.75, soundAboveMhz: 0.25, system: "L'", band: 'VHF-I', allocated: 'no', source: 'g', confidence: 'two', note: "L': sound is 6.5 MHz BELOW vision (spectrum inverted), AM sound, positive vision" },
  { names: '5..10', lowerMhz: 174.75, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'L', band: 'VHF-III', allocated: 'no (analogue ended 2011)', source: 'g', confidence: 'two', note: 'vision on .00, not .25; AM sound, positive vision' },
  { names: '21..37', lowerMhz: 470, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'L', band: 'UHF-IV', allocated: 'yes (470-694 MHz)', source: 'g', confidence: 'two' },
  { names: '38..48', lowerMhz: 606, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'L', band: 'UHF-V', allocated: 'yes (470-694 MHz)', source: 'g', confidence: 'two' },
  { names: '49..69', lowerMhz: 694, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'L', band: 'UHF-V', allocated: 'no (694-862 MHz reallocated to mobile)', source: 'g', confidence: 'two' },
])

// prettier-ignore
export const OIRT_EAST_EUROPE: PlanRuns = defineRuns('oirt-east-europe', SOURCES, [
  { names: 'R1,R2', lowerMhz: 48.5, stepMhz: 9.5, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-I', allocated: 'no', source: 'b', confidence: 'two' },
  { names: 'R3', lowerMhz: 76, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-II', allocated: 'no', source: 'b', confidence: 'two', note: 'R3-R5 overlap the 76-100 MHz FM band' },
  { names: 'R4', lowerMhz: 84, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-II', allocated: 'no', source: 'b', confidence: 'two', note: 'one web table prints 84.25 (misprint)' },
  { names: 'R5', lowerMhz: 92, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-II', allocated: 'no', source: 'b', confidence: 'two', note: 'R3-R5 overlap the 76-100 MHz FM band' },
  { names: 'R6..R12', lowerMhz: 174, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-III', allocated: 'varies by country', source: 'b', confidence: 'two' },
  { names: 'SR1..SR8', lowerMhz: 110, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'S lower', allocated: 'cable only', source: 'b', confidence: 'two' },
  { names: 'SR11..SR18', lowerMhz: 230, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'S upper', allocated: 'cable only', source: 'b', confidence: 'two' },
  { names: '21..37', lowerMhz: 470, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'K', band: 'UHF-IV', allocated: 'varies by country', source: 'b', confidence: 'two' },
  { names: '38..69', lowerMhz: 606, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'K', band: 'UHF-V', allocated: 'varies by country', source: 'b', confidence: 'two' },
])

// prettier-ignore
export const ITALY_VHF: PlanRuns = defineRuns('italy-vhf', SOURCES, [
  { names: 'A', lowerMhz: 52.5, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no', source: 'h', confidence: 'two' },
  { names: 'B', lowerMhz: 61, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no', source: 'h', confidence: 'two', note: 'an older operating-system table printed 59.75 / 82.75 (later corrected)' },
  { names: 'C', lowerMhz: 81, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-II', allocated: 'no', source: 'h', confidence: 'two', note: 'an older operating-system table printed 59.75 / 82.75 (later corrected)' },
  { names: 'D', lowerMhz: 174, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'shared (digital)', source: 'h', confidence: 'two' },
  { names: 'E', lowerMhz: 182.5, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'shared (digital)', source: 'h', confidence: 'two', note: '183.75, not 183.25' },
  { names: 'F,G,H', lowerMhz: 191, stepMhz: 9, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'shared (digital)', source: 'h', confidence: 'two' },
  { names: 'H1,H2', lowerMhz: 216, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'shared (digital)', source: 'h', confidence: 'two' },
])
