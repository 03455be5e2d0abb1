import { defineRuns, type PlanRuns } from './run'

/** Where the figures of this file come from; each run names one by its letter. */
const SOURCES = {
  a: 'Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables',
  b: 'operating-system vendor analogue tuning tables; Debian xawtv 3.107 frequency lists',
  c: 'Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables; operating-system vendor analogue tuning tables',
  d: 'Debian xawtv 3.107 frequency lists; operating-system vendor analogue tuning tables',
  e: 'operating-system vendor analogue tuning tables; Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables',
  f: 'Debian dtv-scan-tables (Australia)',
  g: 'Debian xawtv 3.107 frequency lists; a published Chinese channel table',
  h: 'Debian xawtv 3.107 frequency lists',
} as const

// prettier-ignore
export const JAPAN_BROADCAST: PlanRuns = defineRuns('japan-broadcast', SOURCES, [
  { names: '1,2', lowerMhz: 90, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'no (VHF ended 2012)', source: 'c', confidence: 'two', note: 'usual output channels of consumer modulators in this region (common practice); NTSC-J: no set-up pedestal' },
  { names: '3', lowerMhz: 102, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'no (VHF ended 2012)', source: 'c', confidence: 'two', note: 'NTSC-J: no set-up pedestal' },
  { names: '4..6', lowerMhz: 170, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'no (VHF ended 2012)', source: 'c', confidence: 'two', note: 'NTSC-J: no set-up pedestal' },
  { names: '7,8', lowerMhz: 188, stepMhz: 4, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'no (VHF ended 2012)', source: 'c', confidence: 'two', note: '7 (188-194) and 8 (192-198) OVERLAP by 2 MHz: never use both; NTSC-J: no set-up pedestal' },
  { names: '9..12', lowerMhz: 198, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'no (VHF ended 2012)', source: 'c', confidence: 'two', note: 'NTSC-J: no set-up pedestal' },
  { names: '13', lowerMhz: 470, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'yes (470-710 MHz)', source: 'c', confidence: 'two', note: 'one text table prints 417.25 (misprint); NTSC-J: no set-up pedestal' },
  { names: '14..52', lowerMhz: 476, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'yes (470-710 MHz)', source: 'c', confidence: 'two', note: 'NTSC-J: no set-up pedestal' },
  { names: '53..62', lowerMhz: 710, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'no (710-770 MHz reallocated)', source: 'c', confidence: 'two', note: 'NTSC-J: no set-up pedestal' },
])

// prettier-ignore
export const JAPAN_CABLE: PlanRuns = defineRuns('japan-cable', SOURCES, [
  { names: 'C13..C21', lowerMhz: 108, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'mid-band', allocated: 'cable only', source: 'd', confidence: 'two' },
  { names: 'C22', lowerMhz: 164, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'mid-band', allocated: 'cable only', source: 'd', confidence: 'two', note: 'gap: 21 ends at 162, 22 starts at 164' },
  { names: 'C23', lowerMhz: 222, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'd', confidence: 'two', note: 'gap of 2 MHz before 24' },
  { names: 'C24..C26', lowerMhz: 230, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'd', confidence: 'two' },
  { names: 'C27,C28', lowerMhz: 248, stepMhz: 4, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'd', confidence: 'two', note: '27 (248-254) and 28 (252-258) OVERLAP by 2 MHz' },
  { names: 'C29..C63', lowerMhz: 258, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'd', confidence: 'two' },
])

// prettier-ignore
export const AUSTRALIA: PlanRuns = defineRuns('australia', SOURCES, [
  { names: '0,1', lowerMhz: 45, stepMhz: 11, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no', source: 'e', confidence: 'two', note: 'usual output channels of early consumer modulators here (common practice)' },
  { names: '2', lowerMhz: 63, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no', source: 'e', confidence: 'two' },
  { names: '3,4', lowerMhz: 85, stepMhz: 9, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-II', allocated: 'no', source: 'e', confidence: 'two', note: 'in the FM radio band' },
  { names: '5', lowerMhz: 101, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-II', allocated: 'no', source: 'e', confidence: 'two', note: 'in the FM radio band' },
  { names: '5A', lowerMhz: 137, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-II/III', allocated: 'no', source: 'e', confidence: 'two' },
  { names: '6..9', lowerMhz: 174, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'yes (digital)', source: 'e', confidence: 'two' },
  { names: '10,11', lowerMhz: 208, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'yes, on a raster 1 MHz higher (digital)', source: 'e', confidence: 'two', note: 'historical analogue raster (208-215, 215-222, 222-229). Digital services use 9A 202-209, 10 209-216, 11 216-223, 12 223-230 (Debian dtv-scan-tables show 205.5, 212.5, 219.5, 226.5 centres)' },
  { names: '12', lowerMhz: 222, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'yes, on a raster 1 MHz higher (digital)', source: 'e', confidence: 'one', note: 'historical analogue raster (208-215, 215-222, 222-229). Digital services use 9A 202-209, 10 209-216, 11 216-223, 12 223-230 (Debian dtv-scan-tables show 205.5, 212.5, 219.5, 226.5 centres); analogue 12 itself is barely documented' },
  { names: '28..35', lowerMhz: 526, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'UHF-IV', allocated: 'yes (526-694 MHz)', source: 'e', confidence: 'two', note: '7 MHz raster at UHF too (system B, not G)' },
  { names: '39..51', lowerMhz: 603, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'UHF-V', allocated: 'yes (526-694 MHz)', source: 'e', confidence: 'two', note: '7 MHz raster at UHF too (system B, not G)' },
  { names: '52..69', lowerMhz: 694, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'UHF-V', allocated: 'no (694-820 MHz reallocated)', source: 'e', confidence: 'two', note: '7 MHz raster at UHF too (system B, not G)' },
  { names: '36..38', lowerMhz: 582, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'UHF (between bands IV and V)', allocated: 'yes (digital)', source: 'a', confidence: 'two', note: 'omitted from the operating-system table' },
])

// prettier-ignore
export const AUSTRALIA_DIGITAL: PlanRuns = defineRuns('australia-digital', SOURCES, [
  { names: '6,7,8,9,9A,10,11,12', lowerMhz: 174, stepMhz: 7, widthMhz: 7, visionAboveMhz: null, soundAboveMhz: null, system: 'DVB-T', band: 'VHF-III', allocated: 'yes', source: 'f', confidence: 'one', note: 'digital raster; centre = lower + 3.5 MHz (some sites +0.125). 9A-12 do not line up with analogue 10-12' },
  { names: '28..51', lowerMhz: 526, stepMhz: 7, widthMhz: 7, visionAboveMhz: null, soundAboveMhz: null, system: 'DVB-T', band: 'UHF', allocated: 'yes', source: 'f', confidence: 'one', note: 'digital raster; centre = lower + 3.5 MHz (some sites +0.125). 9A-12 do not line up with analogue 10-12' },
])

// prettier-ignore
export const NEW_ZEALAND: PlanRuns = defineRuns('new-zealand', SOURCES, [
  { names: '1,2', lowerMhz: 44, stepMhz: 10, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no (analogue ended 2013)', source: 'b', confidence: 'two', note: 'channel numbers differ from both Europe and Australia' },
  { names: '3', lowerMhz: 61, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-I', allocated: 'no (analogue ended 2013)', source: 'b', confidence: 'two', note: 'channel numbers differ from both Europe and Australia' },
  { names: '4..11', lowerMhz: 174, stepMhz: 7, widthMhz: 7, soundAboveMhz: 6.75, system: 'B', band: 'VHF-III', allocated: 'no (analogue ended 2013)', source: 'b', confidence: 'two', note: 'channel numbers differ from both Europe and Australia' },
  { names: '27..47', lowerMhz: 518, stepMhz: 8, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF', allocated: 'yes (to 686 MHz)', source: 'b', confidence: 'two', note: 'upper UHF limit of the digital service: from memory' },
  { names: '48..62', lowerMhz: 686, stepMhz: 8, widthMhz: 8, soundAboveMhz: 6.75, system: 'G', band: 'UHF', allocated: 'no', source: 'b', confidence: 'two', note: 'upper UHF limit of the digital service: from memory' },
])

// prettier-ignore
export const CHINA_BROADCAST: PlanRuns = defineRuns('china-broadcast', SOURCES, [
  { names: 'DS-1..DS-3', lowerMhz: 48.5, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-I', allocated: 'not checked', source: 'g', confidence: 'two' },
  { names: 'DS-4,DS-5', lowerMhz: 76, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-I', allocated: 'not checked', source: 'g', confidence: 'two' },
  { names: 'DS-6..DS-12', lowerMhz: 167, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'VHF-III', allocated: 'not checked', source: 'h', confidence: 'two' },
  { names: 'DS-13..DS-15', lowerMhz: 470, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'UHF', allocated: 'not checked', source: 'h', confidence: 'two' },
  { names: 'DS-16', lowerMhz: 494, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'UHF', allocated: 'not checked', source: 'h', confidence: 'one' },
  { names: 'DS-17..DS-23', lowerMhz: 502, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'UHF', allocated: 'not checked', source: 'h', confidence: 'two' },
  { names: 'DS-24,DS-25', lowerMhz: 558, stepMhz: 48, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'UHF', allocated: 'not checked', source: 'h', confidence: 'two', note: '24 and 25 are not adjacent' },
  { names: 'DS-26..DS-57', lowerMhz: 614, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'UHF', allocated: 'not checked', source: 'h', confidence: 'two' },
  { names: 'DS-58..DS-68', lowerMhz: 870, stepMhz: 8, widthMhz: 8, soundAboveMhz: 7.75, system: 'D', band: 'UHF', allocated: 'not checked', source: 'h', confidence: 'one' },
])
