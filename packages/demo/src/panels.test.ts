import type { DeviceModel, Port } from '@coaxwain/models'
import { describe, expect, it } from 'vitest'
import { DEMO, modelUid, type ModelSlug } from './index'

function deviceOf(slug: ModelSlug): DeviceModel {
  const model = DEMO.models[modelUid(slug)]
  if (model?.type !== 'device') throw new Error(`${slug} is not a device`)
  return model
}

const inOrder = (a: Port, b: Port): number => a.at.row - b.at.row || a.at.column - b.at.column

/** Labels of a face as they are read: rows from the top, groups in square brackets. */
function faceOf(slug: ModelSlug, face: Port['at']['face'] = 'back'): string[] {
  const model = deviceOf(slug)
  const rows = new Map<number, Port[]>()
  for (const port of model.ports.filter((p) => p.at.face === face).sort(inOrder)) {
    rows.set(port.at.row, [...(rows.get(port.at.row) ?? []), port])
  }
  const heading = (p: Port) => model.groups.find((g) => g.key === p.group)?.label ?? ''
  return [...rows.values()].map((ports) => {
    const runs: { heading: string; labels: string[] }[] = []
    for (const p of ports) {
      const last = runs.at(-1)
      if (last && p.group !== undefined && last.heading === heading(p)) last.labels.push(p.label)
      else runs.push({ heading: heading(p), labels: [p.label] })
    }
    return runs
      .map((r) => (r.heading ? `[${r.heading}: ${r.labels.join(' ')}]` : r.labels.join(' ')))
      .join(' ')
  })
}

const connectorsOf = (slug: ModelSlug): string[] =>
  [...deviceOf(slug).ports].sort(inOrder).map((p) => p.connector)

describe('panels', () => {
  it('lays the disc player out in two rows of groups', () => {
    expect(faceOf('tarnbeck-dp-62')).toEqual([
      '[DIGITAL OUT: OPTICAL COAXIAL] [COMPONENT OUT: Y PB PR]',
      '[AUDIO OUT: L R] [VIDEO OUT: VIDEO S-VIDEO]',
    ])
  })

  it('lays the small modulator out in one row, its pack first and TO TV last', () => {
    expect(faceOf('pellmere-vm-2')).toEqual(['12 V [IN: VIDEO L R] ANT IN TO TV'])
  })

  it('gives the set with two pairs of screws UHF on the left', () => {
    expect(faceOf('ostrel-14-c')).toEqual(['[300 Ω AERIAL: UHF VHF]'])
    expect(deviceOf('ostrel-14-c').controls.every((c) => c.access === 'front')).toBe(true)
  })

  it('gives the tape recorder inputs, outputs and aerial sockets from left to right', () => {
    expect(faceOf('quillmark-vr-90')).toEqual(['[IN: VIDEO L R] [OUT: VIDEO L R] RF IN RF OUT'])
  })

  it.each([
    ['belloway-pv-9', ['whip', 'jack35-socket', 'dc-socket']],
    ['corbray-hm-60', ['f-socket', 'f-socket', 'f-socket']],
    ['jorvane-m-21', [...Array<string>(5).fill('bnc-socket'), 'hd15-socket', 'scart-socket']],
    ['jorvane-tc-5', ['iec-socket', 'iec-plug', 'scart-socket', 'scart-socket', 'hdmi-socket']],
    ['mistrand-mc-8', ['din5-socket', 'phono-socket', 'jack35-socket', 'dc-socket']],
    ['quillmark-qb-5', ['whip', 'iec-socket', 'jack35-socket', 'dc-socket']],
    ['varnhope-gx', ['phono-plug', 'jack35-socket', 'dc-socket']],
    ['varnhope-rm-1', ['phono-socket', 'phono-socket', 'f-plug']],
  ] satisfies [ModelSlug, string[]][])('draws the strip of %s in its order', (slug, connectors) => {
    expect(connectorsOf(slug)).toEqual(connectors)
  })

  it('keeps the front sockets of a set apart from those on its back', () => {
    expect(faceOf('quillmark-ct-20', 'front')).toEqual(['[VIDEO 2: VIDEO AUDIO]'])
    expect(faceOf('quillmark-ct-20')).toEqual(['VHF/UHF [VIDEO 1: S-VIDEO VIDEO L/MONO R]'])
  })
})
