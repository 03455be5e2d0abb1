import { channelScrew } from '@coaxwain/models/build'
import { describe, expect, it } from 'vitest'
import { check, codes, deviceIn, functionIn, modulated, straight, unitIn, use } from './test-rig'

describe('what is seen and heard', () => {
  it('is colour by composite and stereo where three phonos are joined', () => {
    expect(check(straight())).toMatchObject({
      picture: { colour: true, quality: 'composite', lumaMhz: 4.2 },
      sound: 'stereo',
    })
  })

  it('is half of the sound where one of two wires is left out', () => {
    const rig = straight()
    rig.hookup.links.pop()
    expect(check(rig).sound).toBe('half')
  })

  it('is mono by a modulator, out of one loudspeaker or two', () => {
    expect(check(modulated()).sound).toBe('mono')
  })

  it('is nothing where the hookup names what does not exist', () => {
    const rig = straight()
    rig.hookup.legs[0]!.stops[1]!.unit = 'nobody'
    expect(check(rig)).toMatchObject({ ok: false, picture: null })
  })
})

describe('the drawer', () => {
  it('never runs out of leads that the question takes as being there', () => {
    const rig = straight()
    unitIn(rig, 'phonos').quantity = 0
    rig.question.assumedLeads = ['phonos']
    expect(codes(rig)).toEqual([])
  })

  it.each(['sold', 'gone'] as const)('has no lead that is %s', (holding) => {
    const rig = straight()
    unitIn(rig, 'phonos').holding = holding
    expect(codes(rig)).toEqual(['piece-short'])
  })

  it('has no lead that is to be left where it is', () => {
    const rig = straight()
    rig.question.avoid = ['phonos']
    expect(codes(rig)).toEqual(['piece-short'])
  })
})

describe('wires that meet', () => {
  it('are right where a piece is made to mix them', () => {
    const rig = straight()
    for (const [i, link] of rig.hookup.links.slice(1).entries()) {
      link.pieces.push({ ...use('y'), inPlug: i })
      link.to.port = 'sound-in-l'
      link.circuits[0]!.to = 'audio-mono'
    }
    rig.hookup.sound.sound = 'mono'
    rig.hookup.axes.pieces = 2
    expect(codes(rig)).toEqual([])
  })
})

describe('a modulator that is turned by a screw', () => {
  /** Channel 3 is sent at 61.25 MHz, 4 at 67.25 MHz: 47 CFR 73.603 and 73.682. */
  const screwed = (lowMhz: number, highMhz: number) => {
    const rig = modulated()
    const part = { plan: 'us-broadcast', names: '2..6' } as const
    deviceIn(rig, 'modulator').controls = [channelScrew(part, lowMhz, highMhz)]
    return rig
  }

  it('offers a channel within its span', () => {
    expect(codes(screwed(60, 68))).toEqual([])
  })

  it('offers none outside it, though its plan has more', () => {
    expect(codes(screwed(65, 68))).toContain('channel-not-offered')
  })
})

describe('sockets and functions that nobody has tried', () => {
  it('count one each, as the hookup says', () => {
    const rig = straight()
    unitIn(rig, 'set').functions = []
    unitIn(rig, 'player').forms = []
    rig.hookup.axes.doubt = 4
    expect(codes(rig)).toEqual([])
  })

  it('names the socket that is dead', () => {
    const rig = straight()
    unitIn(rig, 'set').forms.find((f) => f.port === 'video-in')!.state = 'dead'
    expect(check(rig).findings).toEqual([
      { code: 'socket-dead', details: { unit: 'set', jack: 'video-in', port: 'video-in' } },
    ])
  })
})

describe('copies that must not be made', () => {
  it.each([
    [false, ['protection']],
    [true, []],
  ] as const)('go into a digital input that completes the handshake only: %s', (hdcp, expected) => {
    const rig = straight()
    rig.question.material.protection = 'hdcp'
    for (const uid of ['player', 'set']) {
      const digital = deviceIn(rig, uid).jacks.find((j) => j.key.startsWith('video'))!
      digital.form = 'hdmi'
      digital.contacts[0]!.circuit = 'tmds'
    }
    functionIn(rig, 'set', 'line').hdcp = hdcp
    expect(codes(rig).filter((c) => c === 'protection')).toEqual(expected)
  })
})
