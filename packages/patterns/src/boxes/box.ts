import type { AcceptRow, DeviceModel, PictureGive } from '@coaxwain/models'
import {
  at,
  choice,
  dcPack,
  device,
  LINES_15K,
  picture,
  type DeviceDraft,
} from '@coaxwain/models/build'
import type { Colour } from '@coaxwain/signal'

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

/** A picture made afresh in the standard that is chosen. */
export const madeAnew = (colour?: Colour): readonly PictureGive[] => [
  { ...picture('525i60', colour ?? 'ntsc-m', at('standard', 'ntsc')), converts: true },
  { ...picture('625i50', colour ?? 'pal', at('standard', 'pal')), converts: true },
]
