import type { DeviceModel, Jack, Mains, Port, PortFace, PortGroup, PowerPack } from '../model'
import type { Fitting } from './fittings'

/** Fittings under one bracketed heading. */
export interface Grouped {
  readonly heading: string
  readonly fittings: readonly Fitting[]
}

export const group = (heading: string, ...fittings: readonly Fitting[]): Grouped => ({
  heading,
  fittings,
})

/** A row of a panel, from left to right. */
export type Row = readonly (Fitting | Grouped)[]

interface Panel {
  readonly ports: readonly Port[]
  readonly jacks: readonly Jack[]
  readonly groups: readonly PortGroup[]
}

const slug = (text: string): string =>
  text
    .toLowerCase()
    .replaceAll(/[^a-z0-9]+/g, '-')
    .replaceAll(/^-|-$/g, '')

/** Places every port: rows from the top, columns from the left, both counted from 0. */
function layOut(face: PortFace, rows: readonly Row[]): Panel {
  const ports: Port[] = []
  const jacks: Jack[] = []
  const groups: PortGroup[] = []
  rows.forEach((row, rowIndex) => {
    let column = 0
    for (const item of row) {
      const heading = 'heading' in item ? item.heading : undefined
      const group = heading === undefined ? undefined : `${face}-${slug(heading)}`
      if (heading !== undefined && group !== undefined) groups.push({ key: group, label: heading })
      for (const fitting of 'heading' in item ? item.fittings : [item]) {
        for (const port of fitting.ports) {
          ports.push({ ...port, group, at: { face, row: rowIndex, column } })
          column += 1
        }
        jacks.push(...fitting.jacks)
      }
    }
  })
  return { ports, jacks, groups }
}

type Stated = Pick<DeviceModel, 'maker' | 'name' | 'kind' | 'market' | 'functions'>
type Assumed = Pick<
  DeviceModel,
  'aliases' | 'factSource' | 'controls' | 'leaks' | 'chassis' | 'remote'
>
type Left = Pick<DeviceModel, 'year' | 'mains' | 'pack' | 'display' | 'weightGrams'>

export interface DeviceDraft extends Stated, Partial<Assumed>, Left {
  readonly back?: readonly Row[] | undefined
  readonly side?: readonly Row[] | undefined
  readonly front?: readonly Row[] | undefined
}

/** A whole description from a draft: ports placed, and the ordinary assumptions filled in. */
export function device(draft: DeviceDraft): DeviceModel {
  const { back = [], side = [], front = [], ...rest } = draft
  const panels = [layOut('back', back), layOut('side', side), layOut('front', front)]
  return {
    format: 1,
    type: 'device',
    aliases: [],
    factSource: 'panel-photo',
    controls: [],
    leaks: [],
    chassis: 'isolated',
    remote: 'none',
    ...rest,
    ports: panels.flatMap((p) => p.ports),
    jacks: panels.flatMap((p) => p.jacks),
    groups: panels.flatMap((p) => p.groups),
  }
}

export const mains120 = (watts: number): Mains => ({ volts: [110, 127], hz: [60], watts })
export const mains230 = (watts: number): Mains => ({ volts: [220, 240], hz: [50], watts })

/** Equipment that was sold everywhere. */
export const mainsAny = (watts: number): Mains => ({ volts: [100, 240], hz: [50, 60], watts })

export const dcPack = (
  volts: number,
  milliamps: number,
  polarity: PowerPack['polarity'] = 'centre-positive',
): PowerPack => ({ current: 'dc', volts, milliamps, polarity, plug: '5.5 x 2.1 mm' })
