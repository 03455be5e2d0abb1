import type { AcceptRow, DeviceModel, PictureGive } from '@coaxwain/models'
import {
  at,
  choice,
  dcPack,
  device,
  jack,
  LINES_15K,
  LINES_525,
  LINES_625,
  one,
  picture,
  port,
  type DeviceDraft,
  type Fitting,
} from '@coaxwain/models/build'
import type { Circuit, Colour, Connector, ScanId } from '@coaxwain/signal'

/** A box in words of its own; nobody asks who made it. */
export const box = (draft: Omit<DeviceDraft, 'maker' | 'market'>): DeviceModel =>
  device({ maker: 'ordinary part', market: 'any', pack: dcPack(9, 500), ...draft })

export const ENCODED: readonly Colour[] = [
  'ntsc-m',
  'ntsc-j',
  'ntsc-443',
  'pal',
  'pal-60',
  'pal-m',
  'pal-n',
  'secam',
  'mono',
]

/** Composite or S-Video of any colour standard. */
export const ANY_ENCODED: readonly AcceptRow[] = [{ scans: LINES_15K, colours: ENCODED }]

export const outStandard = choice('standard', 'OUTPUT', 'standard', {
  positions: { ntsc: 'NTSC', pal: 'PAL' },
  access: 'back',
})

/** Colour standards that a box may be told to give, by position, with the raster that each belongs to (ITU-R BT.470). */
const STANDARDS: Readonly<
  Record<string, { readonly label: string; readonly colour: Colour; readonly lines: 525 | 625 }>
> = {
  ntsc: { label: 'NTSC', colour: 'ntsc-m', lines: 525 },
  'pal-m': { label: 'PAL-M', colour: 'pal-m', lines: 525 },
  'pal-60': { label: 'PAL 60', colour: 'pal-60', lines: 525 },
  pal: { label: 'PAL', colour: 'pal', lines: 625 },
  'pal-n': { label: 'PAL-N', colour: 'pal-n', lines: 625 },
  secam: { label: 'SECAM', colour: 'secam', lines: 625 },
}

export const everyStandard = choice('standard', 'OUTPUT', 'standard', {
  positions: Object.fromEntries(Object.entries(STANDARDS).map(([key, s]) => [key, s.label])),
  access: 'back',
})

const linesOf = (lines: 525 | 625): readonly ScanId[] => (lines === 525 ? LINES_525 : LINES_625)

/** The colour is made anew in the standard that is chosen, and the lines stay what they are. */
export const recoloured: readonly PictureGive[] = Object.entries(STANDARDS).flatMap(
  ([key, { colour, lines }]) =>
    linesOf(lines).map((scan) => picture(scan, colour, at('standard', key))),
)

/** Inputs of a box that keeps the lines: each position takes the raster that it gives. */
export const inOwnRaster = (colours: readonly Colour[]): readonly AcceptRow[] =>
  Object.entries(STANDARDS).map(([key, { lines }]) => ({
    scans: linesOf(lines),
    colours,
    while: at('standard', key),
  }))

/** A picture made afresh, lines and colour, in any standard that is chosen. */
export const convertedTo: readonly PictureGive[] = Object.entries(STANDARDS)
  .filter(([key]) => key !== 'pal-60')
  .map(([key, { colour, lines }]) => ({
    ...picture(lines === 525 ? '525i60' : '625i50', colour, at('standard', key)),
    converts: true,
  }))

/** Red, green, blue and sync on four single sockets or plugs. Ports are `KEY-r` and so on, the sync `KEY-sync`. */
export function fourWires(key: string, dir: 'in' | 'out', connector: Connector): Fitting {
  const wires: Readonly<Record<string, Circuit>> = { r: 'r', g: 'g', b: 'b', sync: 'csync' }
  const mount = connector.endsWith('-plug') ? 'lead' : 'chassis'
  return {
    ports: Object.entries(wires).map(([name, circuit]) =>
      port(`${key}-${name}`, name.toUpperCase(), [one(circuit, dir)], {
        connector,
        mount,
        impedanceOhm: 75,
        ...(dir === 'in' ? { load: { kind: '75' } as const } : {}),
      }),
    ),
    jacks: [
      jack(
        key,
        'rgbs',
        dir,
        Object.entries(wires).map(([name, circuit]) => ({ circuit, port: `${key}-${name}` })),
      ),
    ],
  }
}

/** A picture made afresh in the standard that is chosen. */
export const madeAnew = (colour?: Colour): readonly PictureGive[] => [
  { ...picture('525i60', colour ?? 'ntsc-m', at('standard', 'ntsc')), converts: true },
  { ...picture('625i50', colour ?? 'pal', at('standard', 'pal')), converts: true },
]
