import { at, choice } from '@coaxwain/models/build'
import { chainOf, type Chain, type ChainFinding } from '@coaxwain/shelf'
import { describe, expect, it } from 'vitest'
import { checkHookup } from '../check-hookup'
import {
  deviceIn,
  functionIn,
  laid,
  modulated,
  pieceIn,
  portIn,
  straight,
  unitIn,
  withAerial,
  type Loose,
  type Rig,
} from '../test-rig'
import { checkChain } from './check-chain'

type LooseChain = Loose<Chain>

/** What a person would enter: sockets and leads, without a word on plugs, copies and switches. */
const bare = (rig: Rig): LooseChain => ({
  links: rig.hookup.links.map((l) => ({
    from: l.from,
    pieces: l.pieces.map((p) => ({ model: p.model })),
    to: l.to,
  })),
  settings: [],
})

function judge(rig: Rig, chain: LooseChain | Chain = bare(rig)) {
  const [snapshot, question] = laid(rig)
  return checkChain(snapshot, question, chain)
}

const codesOf = (findings: readonly ChainFinding[]): string[] => findings.map((f) => f.code)

const linkCodes = (rig: Rig, chain?: LooseChain): string[][] =>
  judge(rig, chain).links.map((l) => codesOf(l.findings))

describe('a chain that is right', () => {
  it.each([
    ['straight', straight],
    ['modulated', modulated],
    ['beside an aerial', withAerial],
  ] as const)('%s: is right in every link, unit and as a whole', (_, build) => {
    const rig = build()
    const [, , hookup] = laid(rig)
    expect(judge(rig, chainOf(hookup))).toMatchObject({
      verdict: 'right',
      links: hookup.links.map(() => ({ verdict: 'right', findings: [] })),
      whole: [],
      picture: hookup.picture,
      sound: hookup.sound,
    })
  })

  it('gets its plugs, copies and circuits from what is possible', () => {
    const rig = straight()
    const { links } = judge(rig).hookup
    expect(links.map((l) => [l.pieces[0]!.copy, l.pieces[0]!.inPlug, l.circuits])).toEqual([
      [1, 0, [{ from: 'cvbs', to: 'cvbs' }]],
      [1, 1, [{ from: 'audio-l', to: 'audio-l' }]],
      [1, 2, [{ from: 'audio-r', to: 'audio-r' }]],
    ])
  })

  it('is a hookup that passes the check once its claims are put in', () => {
    const rig = modulated()
    const [snapshot, question] = laid(rig)
    const { hookup } = judge(rig)
    expect(checkHookup(snapshot, question, hookup).findings).toEqual([])
  })

  it('takes a second lead when the first has no plug left', () => {
    const rig = withAerial()
    const { links } = judge(rig).hookup
    const copies = links.flatMap((l) => l.pieces.filter((p) => p.model === 'coax'))
    expect(new Set(copies.map((p) => p.copy)).size).toBe(3)
  })
})

describe('controls', () => {
  it('that nobody named are set so that it works, and said', () => {
    const { verdict, units, picture } = judge(modulated())
    expect(verdict).toBe('doubtful')
    expect(picture).toMatchObject({ quality: 'rf', colour: true })
    expect(units.flatMap((u) => u.findings)).toMatchObject([
      { code: 'stands-unsaid', weight: 'choice', details: { control: 'channel', stands: '3' } },
      { code: 'stands-unsaid', weight: 'choice', details: { control: 'tuned-to', stands: '3' } },
    ])
  })

  it('follow one that was named', () => {
    const rig = modulated()
    const chain = bare(rig)
    chain.settings = [{ unit: 'modulator', control: 'channel', position: '4' }]
    const { hookup } = judge(rig, chain)
    expect(hookup.settings.map((s) => [s.control, s.position])).toEqual([
      ['channel', '4'],
      ['tuned-to', '4'],
    ])
  })

  it('that are on different channels are found, and no picture comes', () => {
    const rig = modulated()
    const chain = bare(rig)
    chain.settings = [
      { unit: 'modulator', control: 'channel', position: '4' },
      { unit: 'set', control: 'tuned-to', position: '3', plan: 'us-broadcast' },
    ]
    const { picture, units } = judge(rig, chain)
    expect(picture).toBeNull()
    expect(units.find((u) => u.unit === 'set')?.findings).toMatchObject([{ code: 'not-tuned' }])
  })

  it('that stand wrong are named with where they must stand', () => {
    const rig = straight()
    const control = choice('input', 'INPUT', 'input', {
      positions: { line: 'LINE', tv: 'TV' },
      access: 'front',
    })
    deviceIn(rig, 'set').controls.push(structuredClone(control) as never)
    functionIn(rig, 'set', 'line').while = structuredClone(at('input', 'line')) as never
    const chain = bare(rig)
    chain.settings = [{ unit: 'set', control: 'input', position: 'tv' }]
    const { units, picture } = judge(rig, chain)
    expect(picture).toBeNull()
    expect(units.find((u) => u.unit === 'set')?.findings).toMatchObject([
      { code: 'stands-wrong', details: { switch: 'INPUT', stands: 'TV', should: 'LINE' } },
    ])
  })

  it('that already stand as they must are not asked for', () => {
    const rig = modulated()
    unitIn(rig, 'modulator').stands = { channel: '3' }
    unitIn(rig, 'set').stands = { 'tuned-to': '3' }
    expect(judge(rig).verdict).toBe('right')
  })
})

describe('a link that is wrong', () => {
  it('the wrong way round says so', () => {
    const rig = straight()
    const chain = bare(rig)
    const [first] = chain.links
    chain.links[0] = { from: first!.to, pieces: first!.pieces, to: first!.from }
    const { links, picture } = judge(rig, chain)
    expect(picture).toBeNull()
    expect(links[0]).toMatchObject({ verdict: 'wrong', findings: [{ code: 'wrong-direction' }] })
    expect(links.slice(1).map((l) => l.verdict)).toEqual(['right', 'right'])
  })

  it('without a lead says what is missing', () => {
    const rig = straight()
    const chain = bare(rig)
    chain.links[0]!.pieces = []
    expect(linkCodes(rig, chain)[0]).toEqual(
      expect.arrayContaining(['needs-a-lead', 'plugs-do-not-mate']),
    )
  })

  it('with plugs that do not go together names both', () => {
    const rig = modulated()
    const chain = bare(rig)
    chain.links[3]!.pieces = [{ model: 'phonos' }]
    const { findings } = judge(rig, chain).links[3]!
    expect(findings.find((f) => f.code === 'plugs-do-not-mate')).toMatchObject({
      details: { a: 'f-socket', b: 'phono-plug' },
    })
  })

  it('into a dead socket names it', () => {
    const rig = straight()
    unitIn(rig, 'set').forms.find((f) => f.port === 'video-in')!.state = 'dead'
    expect(judge(rig).links[0]).toMatchObject({
      verdict: 'wrong',
      findings: [{ code: 'socket-dead', details: { label: 'VIDEO' } }],
    })
  })

  it('into a socket for something else says what goes in and what is wanted', () => {
    const rig = straight()
    const chain = bare(rig)
    chain.links[0]!.to = { unit: 'set', port: 'sound-in-l' }
    chain.links.splice(1, 1)
    const { links, picture } = judge(rig, chain)
    expect(picture).toBeNull()
    expect(links[0]!.findings).toMatchObject([
      { code: 'other-circuit', details: { circuit: 'cvbs' } },
    ])
  })

  it('composite into brightness is doubtful and grey', () => {
    const rig = straight()
    portIn(rig, 'set', 'video-in').circuits[0]!.circuit = 'y'
    const jack = deviceIn(rig, 'set').jacks.find((j) => j.key === 'video-in')!
    jack.form = 'component'
    jack.contacts[0]!.circuit = 'y'
    const { links, picture } = judge(rig)
    expect(links[0]).toMatchObject({ verdict: 'doubtful', findings: [{ code: 'grey-only' }] })
    expect(picture).toMatchObject({ colour: false, quality: 'luma-only' })
  })

  it('twice in one socket is said at both links', () => {
    const rig = straight()
    const chain = bare(rig)
    chain.links[2]!.to = { unit: 'set', port: 'sound-in-l' }
    const codes = linkCodes(rig, chain)
    expect(codes[1]).toContain('port-taken-twice')
    expect(codes[2]).toContain('port-taken-twice')
  })

  it('with more leads than the drawer holds says so', () => {
    const rig = straight()
    unitIn(rig, 'phonos').quantity = 0
    expect(linkCodes(rig).every((codes) => codes.includes('piece-short'))).toBe(true)
  })

  it('with a wire missing in the lead says which', () => {
    const rig = straight()
    pieceIn(rig, 'phonos').wires.shift()
    pieceIn(rig, 'phonos').a.length = 1
    pieceIn(rig, 'phonos').b.length = 1
    const chain = bare(rig)
    chain.links[0]!.pieces = [{ model: 'phonos', wayRound: 'forward', inPlug: 0, outPlug: 0 }]
    expect(linkCodes(rig, chain)[0]).toContain('wire-missing')
  })
})

describe('what harms', () => {
  it('is weighed as harm: a live socket', () => {
    const rig = straight()
    deviceIn(rig, 'set').chassis = 'live'
    portIn(rig, 'set', 'video-in').isolated = 'no'
    expect(judge(rig).links[0]!.findings).toMatchObject([{ code: 'live-socket', weight: 'harm' }])
  })

  it('is weighed as harm: a modulated output straight to the aerial', () => {
    const rig = withAerial()
    const chain = bare(rig)
    const link = {
      from: { unit: 'modulator', port: 'rf-out' },
      pieces: [{ model: 'coax' }],
      to: { unit: 'aerial', port: 'out' },
    }
    chain.links = [...chain.links.slice(0, 3), link]
    expect(judge(rig, chain).links[3]!.findings[0]).toMatchObject({
      code: 'onto-the-aerial',
      weight: 'harm',
    })
  })

  it('is weighed as harm: a switch that lets the signal up to the aerial', () => {
    const rig = withAerial()
    deviceIn(rig, 'switch').leaks = []
    const found = judge(rig)
    const all = [...found.whole, ...found.units.flatMap((u) => u.findings)]
    expect(all.find((f) => f.code === 'radiates')).toMatchObject({ weight: 'harm' })
    expect(found.verdict).toBe('wrong')
  })
})

describe('a chain that goes nowhere', () => {
  it('says how far the picture gets', () => {
    const rig = modulated()
    const chain = bare(rig)
    chain.links.pop()
    const { whole, picture } = judge(rig, chain)
    expect(picture).toBeNull()
    expect(whole).toMatchObject([{ code: 'picture-ends', details: { name: 'modulator' } }])
  })

  it('of picture alone says that no sound arrives', () => {
    const rig = straight()
    const chain = bare(rig)
    chain.links.length = 1
    expect(judge(rig, chain).whole).toMatchObject([{ code: 'silent', weight: 'doubt' }])
  })

  it('naming what is not there is answered without a fault of the check', () => {
    const rig = straight()
    const chain = bare(rig)
    chain.links[0]!.to = { unit: 'nobody', port: 'nowhere' }
    chain.links[1]!.pieces = [{ model: 'nothing' }]
    chain.settings = [{ unit: 'nobody', control: 'nothing', position: 'x' }]
    const [first, second] = linkCodes(rig, chain)
    expect(first).toContain('port-unknown')
    expect(second).toContain('piece-unknown')
  })

  it('in knots that cannot be followed ends, and says so', () => {
    const rig = modulated()
    const there = bare(rig).links[3]!
    const chain = bare(rig)
    chain.links = Array.from({ length: 24 }, (_, i) =>
      i % 2 === 0 ? there : { from: there.to, pieces: there.pieces, to: there.from },
    )
    expect(judge(rig, chain).whole).toMatchObject([{ code: 'tangled', weight: 'wrong' }])
  })
})
