import { defineRuns, type PlanRuns } from './run'

/** Where the figures of this file come from; each run names one by its letter. */
const SOURCES = {
  a: 'public encyclopedia',
  b: '47 CFR 73.603(a), 73.682(a)(1)-(3); Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables',
  c: 'Debian xawtv 3.107 frequency lists; BSD TV-card driver channel tables',
  d: 'CTA/EIA-542-B plan via open tables; Debian dtv-scan-tables; Debian xawtv 3.107 frequency lists',
  e: 'two published cable channel charts (7.00, 13.00 .. 49.00 MHz)',
  f: 'CTA/EIA-542-B IRC plan via open tables; Debian dtv-scan-tables',
  g: 'CTA/EIA-542-B IRC plan via open tables; Debian dtv-scan-tables; a head-end equipment manual (79.25/85.25); terminal TV-viewer channel macro',
  h: '47 CFR 76.612(a)(2); CTA/EIA-542-B HRC plan via Debian dtv-scan-tables; a head-end equipment manual',
} as const

// prettier-ignore
export const US_BROADCAST: PlanRuns = defineRuns('us-broadcast', SOURCES, [
  { names: '1', lowerMhz: 44, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low (historical)', allocated: 'no', source: 'a', confidence: 'one', note: 'withdrawn 1948; never used for home equipment' },
  { names: '2', lowerMhz: 54, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'yes', source: 'b', confidence: 'two' },
  { names: '3', lowerMhz: 60, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'yes', source: 'b', confidence: 'two', note: 'usual output channels of consumer modulators in this region (common practice)' },
  { names: '4', lowerMhz: 66, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'yes', source: 'b', confidence: 'two', note: 'usual output channels of consumer modulators in this region (common practice); 4 MHz gap between 4 and 5: 4 and 5 are NOT adjacent' },
  { names: '5', lowerMhz: 76, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'yes', source: 'b', confidence: 'two', note: 'not adjacent to 4 (72-76 MHz gap)' },
  { names: '6', lowerMhz: 82, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'yes', source: 'b', confidence: 'two', note: 'sound carrier 87.75 MHz lies just below the FM band; 6 and 7 are not adjacent' },
  { names: '7..12', lowerMhz: 174, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'yes', source: 'b', confidence: 'two' },
  { names: '13', lowerMhz: 210, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'yes', source: 'b', confidence: 'two', note: '13 and 14 are not adjacent' },
  { names: '14..16', lowerMhz: 470, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'yes', source: 'b', confidence: 'two', note: 'shared with land mobile in some cities (47 CFR 73.623(e))' },
  { names: '17', lowerMhz: 488, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'yes', source: 'b', confidence: 'two', note: 'shared with land mobile in some cities (47 CFR 73.623(e)); not assigned to television in Hawaii (47 CFR 73.603(d))' },
  { names: '18..20', lowerMhz: 494, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'yes', source: 'b', confidence: 'two', note: 'shared with land mobile in some cities (47 CFR 73.623(e))' },
  { names: '21..36', lowerMhz: 512, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'yes', source: 'b', confidence: 'two' },
  { names: '37', lowerMhz: 608, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'reserved', source: 'b', confidence: 'two', note: '608-614 MHz reserved for radio astronomy (47 CFR 73.603(c)); also medical telemetry; never use for a private channel that could leak' },
  { names: '38..51', lowerMhz: 614, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'no', source: 'b', confidence: 'two', note: '614-698 MHz reallocated after the incentive-auction repack completed July 2020' },
  { names: '52..69', lowerMhz: 698, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'no', source: 'b', confidence: 'two', note: '698-806 MHz reallocated; full-power analogue ended June 2009' },
  { names: '70..83', lowerMhz: 806, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'UHF', allocated: 'no', source: 'c', confidence: 'two', note: '806-890 MHz reallocated to land mobile (1970s-1983); old UHF dials still show 70-83' },
])

// prettier-ignore
export const US_CABLE_STD: PlanRuns = defineRuns('us-cable-std', SOURCES, [
  { names: '2..4', lowerMhz: 54, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'also broadcast channel of same number', source: 'd', confidence: 'two' },
  { names: '5,6', lowerMhz: 76, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'also broadcast channel of same number', source: 'd', confidence: 'two', note: 'STD 5 and 6 sit 2 MHz BELOW the IRC raster and are not interchangeable with IRC/HRC 5 and 6' },
  { names: '7..13', lowerMhz: 174, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'also broadcast channel of same number', source: 'd', confidence: 'two' },
  { names: '14..16', lowerMhz: 120.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'mid-band', allocated: 'cable only', source: 'd', confidence: 'two', note: 'analogue sets do not care' },
  { names: '17..22', lowerMhz: 138, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'mid-band', allocated: 'cable only', source: 'd', confidence: 'two' },
  { names: '23,24', lowerMhz: 216, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'd', confidence: 'two' },
  { names: '25..36', lowerMhz: 228.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'd', confidence: 'two', note: 'analogue sets do not care' },
  { names: '37..41', lowerMhz: 300.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'd', confidence: 'two', note: 'analogue sets do not care' },
  { names: '42,43', lowerMhz: 330.025, stepMhz: 5.9875, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'd', confidence: 'two', note: 'analogue sets do not care' },
  { names: '44..53', lowerMhz: 342.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'd', confidence: 'two', note: 'analogue sets do not care' },
  { names: '54..64', lowerMhz: 402, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'd', confidence: 'two' },
  { names: '65..94', lowerMhz: 468, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'ultra-band', allocated: 'cable only', source: 'd', confidence: 'two' },
  { names: '95..97', lowerMhz: 90, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'FM/mid-band (A-5..A-1)', allocated: 'cable only', source: 'd', confidence: 'two', note: 'shares 88-108 MHz with FM radio' },
  { names: '98,99', lowerMhz: 108.025, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'FM/mid-band (A-5..A-1)', allocated: 'cable only', source: 'd', confidence: 'two', note: 'analogue sets do not care' },
  { names: '100..158', lowerMhz: 648, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'ultra-band (100+)', allocated: 'cable only', source: 'd', confidence: 'two' },
  { names: 'T-7..T-14', lowerMhz: 5.75, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'sub-band (T, return path)', allocated: 'cable only', source: 'e', confidence: 'two', note: 'used for the return path, below 54 MHz; not tunable on a normal set. Several open tables give 8.25, 14.25.. (1.25 MHz too high) because they mistake 7.0 for the lower edge' },
])

// prettier-ignore
export const US_CABLE_IRC: PlanRuns = defineRuns('us-cable-irc', SOURCES, [
  { names: '1', lowerMhz: 72.0125, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'low band (A-8 / 4+)', allocated: 'cable only', source: 'f', confidence: 'one', note: '72-78 MHz; overlaps STD 4/5, exists only in IRC and HRC' },
  { names: '2', lowerMhz: 54.0125, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz; one open table prints 55.275 (misprint)' },
  { names: '3,4', lowerMhz: 60.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '5', lowerMhz: 78.0125, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'cable only', source: 'g', confidence: 'two', note: 'IRC 5 is 2 MHz above STD 5' },
  { names: '6', lowerMhz: 84.0125, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'cable only', source: 'g', confidence: 'two', note: 'IRC 6 is 2 MHz above STD 6' },
  { names: '7..13', lowerMhz: 174.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '14..22', lowerMhz: 120.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'mid-band', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '23..36', lowerMhz: 216.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '37..41', lowerMhz: 300.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '42,43', lowerMhz: 330.025, stepMhz: 5.9875, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '44..64', lowerMhz: 342.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '65..94', lowerMhz: 468.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'ultra-band', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '95..97', lowerMhz: 90.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'FM/mid-band (A-5..A-1)', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
  { names: '98,99', lowerMhz: 108.025, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'FM/mid-band (A-5..A-1)', allocated: 'cable only', source: 'f', confidence: 'regulation', note: '+25 kHz forced by 47 CFR 76.612(b) (108-118 MHz); one open table says +12.5 kHz' },
  { names: '100..125', lowerMhz: 648.0125, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'ultra-band (100+)', allocated: 'cable only', source: 'f', confidence: 'one', note: 'all IRC carriers sit 12.5 kHz above 6n+1.25 MHz' },
])

// prettier-ignore
export const US_CABLE_HRC: PlanRuns = defineRuns('us-cable-hrc', SOURCES, [
  { names: '1', lowerMhz: 70.7536, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'low band (A-8 / 4+)', allocated: 'cable only', source: 'h', confidence: 'two', note: '72.0036; exists only in IRC and HRC' },
  { names: '2..4', lowerMhz: 52.7527, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
  { names: '5', lowerMhz: 76.7539, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'cable only', source: 'h', confidence: 'two', note: '0.75 MHz ABOVE STD 5 (every other HRC channel is 1.25 MHz below STD). One open table wrongly prints 2 MHz lower' },
  { names: '6', lowerMhz: 82.7542, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-low', allocated: 'cable only', source: 'h', confidence: 'two', note: '0.75 MHz ABOVE STD 6 (every other HRC channel is 1.25 MHz below STD). One open table wrongly prints 2 MHz lower' },
  { names: '7..13', lowerMhz: 172.7587, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'VHF-high', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
  { names: '14..22', lowerMhz: 118.756, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'mid-band', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
  { names: '23..36', lowerMhz: 214.7608, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'super-band', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
  { names: '37..64', lowerMhz: 298.765, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'hyper-band', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
  { names: '65..94', lowerMhz: 466.7734, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'ultra-band', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
  { names: '95..97', lowerMhz: 88.7545, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'FM/mid-band (A-5..A-1)', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
  { names: '98,99', lowerMhz: 106.775, stepMhz: 6, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'FM/mid-band (A-5..A-1)', allocated: 'cable only', source: 'h', confidence: 'two', note: 'not on the comb: the 25 kHz rule of 47 CFR 76.612(b) forces .0250' },
  { names: '100..125', lowerMhz: 646.7824, stepMhz: 6.0003, widthMhz: 6, soundAboveMhz: 5.75, system: 'M', band: 'ultra-band (100+)', allocated: 'cable only', source: 'h', confidence: 'two', note: '1.25 MHz BELOW the STD carrier' },
])
