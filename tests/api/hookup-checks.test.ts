import { CHAIN_CODES, FINDINGS } from '@coaxwain/checker'
import type { HookupCheckReply } from '@coaxwain/contract'
import { chainOf, type Chain } from '@coaxwain/shelf'
import { hasSentence, LOCALES, sentence } from '@coaxwain/wording'
import { describe, expect, test } from 'vitest'
import { faultsOf, problemOf } from '../support/client'
import { checksum } from '../support/database'
import { hookup, question } from '../support/examples'
import { modulator, player } from '../support/models'
import { useRig } from '../support/rig'
import { COLLECTION, MODELS, UNITS } from '../support/world'

const rig = useRig()

const IN = `/collections/${COLLECTION}`
const CHECKS = `${IN}/hookup-checks`
const LEAD = [{ model: MODELS.lead }]

const at = (unit: string, port: string) => ({ unit, port })

type Loose = { links: Chain['links'][number][]; settings: Chain['settings'][number][] }

/** Player to monitor by three leads, as a person enters it. */
const chain = (): Loose => ({
  links: [
    { from: at(UNITS.player, 'video'), pieces: LEAD, to: at(UNITS.monitor, 'video-in') },
    { from: at(UNITS.player, 'left'), pieces: LEAD, to: at(UNITS.monitor, 'left-in') },
    { from: at(UNITS.player, 'right'), pieces: LEAD, to: at(UNITS.monitor, 'right-in') },
  ],
  settings: [],
})

const send = async (body: unknown) => (await rig.as('viewer')).post(CHECKS, body)

async function check(entered: unknown, asked = question()) {
  const { status, body, text } = await send({ question: asked, chain: entered })
  expect(status, text).toBe(200)
  return (body as unknown as HookupCheckReply).checked
}

const codesAt = (judged: { findings: readonly { code: string; weight: string }[] } | undefined) =>
  (judged?.findings ?? []).map((f) => `${f.weight} ${f.code}`)

describe('a chain wired by hand', () => {
  test('that is right is right in every link but for what nobody has tried', async () => {
    const { verdict, links, whole, picture, sound } = await check(chain())
    expect(verdict).toBe('doubtful')
    expect(links.flatMap((l) => l.findings.map((f) => f.code))).toEqual(
      Array.from({ length: 6 }, () => 'socket-untested'),
    )
    expect(whole).toEqual([])
    expect(picture).toMatchObject({ colour: true, quality: 'composite' })
    expect(sound).toEqual({ sound: 'stereo', from: UNITS.monitor })
  })

  test('that an answer gives comes to what the answer says, and can be saved', async () => {
    const found = hookup()
    const checked = await check(chainOf(found))
    expect(checked.picture).toEqual(found.picture)
    const owner = await rig.as('owner')
    const saved = await owner.post(`${IN}/hookups`, {
      title: 'By hand',
      question: question(),
      hookup: checked.hookup,
    })
    expect(saved.status, saved.text).toBe(201)
  })

  test('is wholly right once all of it has been tried', async () => {
    const owner = await rig.as('owner')
    const works = { state: 'works' }
    for (const [unit, forms, fn] of [
      [UNITS.player, ['composite video', 'sound left', 'sound right'], 'plays'],
      [UNITS.monitor, ['composite-in video-in', 'sound-in left-in', 'sound-in right-in'], 'shows'],
    ] as const) {
      const tried = await owner.patch(`${IN}/units/${unit}/states`, 1, {
        forms: forms.map((f) => ({ jack: f.split(' ')[0], port: f.split(' ')[1], ...works })),
        functions: [{ function: fn, ...works }],
      })
      expect(tried.status, tried.text).toBe(200)
    }
    expect(await check(chain())).toMatchObject({
      verdict: 'right',
      units: [{ verdict: 'right' }, { verdict: 'right' }],
    })
  })

  test('says at the link that it runs the wrong way', async () => {
    const entered = chain()
    const [first] = entered.links
    entered.links[0] = { from: first!.to, pieces: LEAD, to: first!.from }
    const { verdict, links, picture } = await check(entered)
    expect([verdict, picture]).toEqual(['wrong', null])
    expect(codesAt(links[0])).toContain('wrong wrong-direction')
    expect(links[1]?.verdict).toBe('doubtful')
  })

  test('says at the link that a lead is missing', async () => {
    const entered = chain()
    entered.links[0] = { ...entered.links[0]!, pieces: [] }
    expect(codesAt((await check(entered)).links[0])).toContain('wrong needs-a-lead')
  })

  test('says that plugs do not go together, and names both', async () => {
    const entered = chain()
    entered.links[0] = {
      from: at(UNITS.modulator, 'rf-out'),
      pieces: LEAD,
      to: at(UNITS.monitor, 'video-in'),
    }
    const [first] = (await check(entered)).links
    expect(first?.findings.find((f) => f.code === 'plugs-do-not-mate')?.details).toMatchObject({
      a: 'f-socket',
      b: 'phono-plug',
    })
  })

  test('says that a socket is dead', async () => {
    await (
      await rig.as('owner')
    ).patch(`${IN}/units/${UNITS.player}/states`, 1, {
      forms: [{ jack: 'composite', port: 'video', state: 'dead' }],
    })
    expect(codesAt((await check(chain())).links[0])).toContain('wrong socket-dead')
  })

  test('says that the drawer holds no such lead any more', async () => {
    await (await rig.as('owner')).delete(`${IN}/units/${UNITS.lead}`, 1)
    const { links } = await check(chain())
    expect(links.every((l) => l.verdict === 'wrong')).toBe(true)
    expect(codesAt(links[0])).toContain('wrong piece-short')
  })

  test('says that composite is not what a component input takes', async () => {
    const monitor = await component()
    const asked = question({ display: { unit: monitor } })
    const grey = await check({ links: [into(monitor, 'y-in')], settings: [] }, asked)
    expect(codesAt(grey.links[0])).toContain('doubt grey-only')
    expect(grey.picture).toMatchObject({ colour: false, quality: 'luma-only' })
    const nothing = await check({ links: [into(monitor, 'pb-in')], settings: [] }, asked)
    expect(codesAt(nothing.links[0])).toContain('wrong other-circuit')
    expect(nothing.picture).toBeNull()
  })

  test('that harms is found to harm before anything else', async () => {
    const amplifier = await unitOf(
      player({
        name: 'Loud',
        ports: player().ports.map((p) => ({
          ...p,
          circuits: p.circuits.map((c) =>
            c.circuit.startsWith('audio') ? { ...c, level: 'loudspeaker' } : c,
          ),
        })),
      }),
    )
    const entered = chain()
    entered.links = entered.links.map((l) => ({ ...l, from: { ...l.from, unit: amplifier } }))
    const asked = question({ source: { unit: amplifier, playing: 'plays' } })
    const { verdict, links } = await check(entered, asked)
    expect(verdict).toBe('wrong')
    expect(codesAt(links[1])[0]).toBe('harm loudspeaker-into-line')
  })

  test('shows where the picture ends, and what stands wrong on the way', async () => {
    const entered = {
      links: [
        { from: at(UNITS.player, 'video'), pieces: LEAD, to: at(UNITS.modulator, 'video-in') },
      ],
      settings: [{ unit: UNITS.modulator, control: 'power', position: 'unplugged' }],
    }
    const { whole, units } = await check(entered)
    expect(codesAt({ findings: whole })).toEqual(['wrong picture-ends'])
    expect(codesAt(units.find((u) => u.unit === UNITS.modulator))).toContain(
      'wrong stands-wrong-power',
    )
  })

  test('is judged and forgotten', async () => {
    const before = await checksum(rig.db)
    await check(chain())
    expect(await checksum(rig.db)).toBe(before)
  })
})

/** Puts a unit of a model of one's own on the shelf. */
async function unitOf(document: unknown): Promise<string> {
  const owner = await rig.as('owner')
  const model = await owner.post(`${IN}/models`, { document })
  expect(model.status, model.text).toBe(201)
  const unit = await owner.post(`${IN}/units`, { model: model.body['uid'] })
  expect(unit.status, unit.text).toBe(201)
  return unit.body['uid'] as string
}

const into = (unit: string, port: string) => ({
  from: at(UNITS.player, 'video'),
  pieces: LEAD,
  to: at(unit, port),
})

/** A monitor that takes component pictures only. */
async function component(): Promise<string> {
  const circuits = ['y', 'pb', 'pr'] as const
  const { monitor } = await import('../support/models')
  const plain = monitor()
  return unitOf({
    ...plain,
    name: 'CO-4',
    ports: circuits.map((circuit, i) => ({
      ...plain.ports[0],
      key: `${circuit}-in`,
      label: circuit.toUpperCase(),
      circuits: [{ circuit, dir: 'in' }],
      at: { face: 'back', row: 0, column: i },
    })),
    jacks: [
      {
        key: 'component-in',
        form: 'component',
        dir: 'in',
        contacts: circuits.map((circuit) => ({ circuit, port: `${circuit}-in` })),
      },
    ],
    functions: [
      {
        key: 'shows',
        kind: 'shows',
        needs: ['component-in'],
        accepts: [{ scans: 'any', colours: 'any' }],
        gives: [],
        power: 'on',
      },
    ],
  })
}

describe('what names something else', () => {
  const spoilt: [string, (c: Loose) => unknown, string[]][] = [
    [
      'a unit of another collection',
      (c) => (c.links[0] = { ...c.links[0]!, to: at(UNITS.foreign, 'video') }),
      ['chain.links.0.to.unit unknown-reference'],
    ],
    [
      'a socket that is not there',
      (c) => (c.links[1] = { ...c.links[1]!, from: at(UNITS.player, 'nowhere') }),
      ['chain.links.1.from.port unknown-port'],
    ],
    [
      'a lead of another collection',
      (c) => (c.links[2] = { ...c.links[2]!, pieces: [{ model: MODELS.foreign }] }),
      ['chain.links.2.pieces.0.model unknown-reference'],
    ],
    [
      'a device as a lead',
      (c) => (c.links[0] = { ...c.links[0]!, pieces: [{ model: MODELS.player }] }),
      ['chain.links.0.pieces.0.model unknown-reference'],
    ],
    [
      'a switch that is not there',
      (c) => c.settings.push({ unit: UNITS.monitor, control: 'nothing', position: 'a' }),
      ['chain.settings.0.control unknown-control'],
    ],
  ]

  test.each(spoilt)('%s is refused with its place', async (_, spoil, faults) => {
    const entered = chain()
    spoil(entered)
    const answer = await send({ question: question(), chain: entered })
    expect(answer.status).toBe(422)
    expect(problemOf(answer).code).toBe('unknown-reference')
    expect(faultsOf(answer)).toEqual(faults)
  })

  test('a source of another collection is refused like any that is not there', async () => {
    const asked = question({ source: { unit: UNITS.foreign, playing: 'plays' } })
    const answer = await send({ question: asked, chain: chain() })
    expect(answer.status).toBe(422)
    expect(faultsOf(answer)).toEqual(['question.source.unit unknown-reference'])
  })

  test('a position that is not there is a finding at its unit', async () => {
    const entered = chain()
    entered.settings.push({ unit: UNITS.monitor, control: 'input', position: 'zz' })
    const { units } = await check(entered)
    expect(codesAt(units.find((u) => u.unit === UNITS.monitor))).toContain('wrong position-unknown')
  })
})

describe('a body that is too much', () => {
  const many = (n: number) => Array.from({ length: n }, () => chain().links[0]!)

  test.each([
    ['no link', { links: [], settings: [] }, ['chain.links too-few']],
    ['more links than a chain has', { links: many(25), settings: [] }, ['chain.links too-many']],
    [
      'more pieces than a link holds',
      {
        links: [{ ...many(1)[0]!, pieces: Array.from({ length: 7 }, () => LEAD[0]!) }],
        settings: [],
      },
      ['chain.links.0.pieces too-many'],
    ],
    ['a field of its own', { ...chain(), verdict: 'right' }, ['chain.verdict unknown-field']],
    [
      'a key aimed at the prototype',
      {
        links: [{ ...many(1)[0]!, from: at(UNITS.player, '__proto__') }],
        settings: [],
      },
      ['chain.links.0.from.port bad-format', 'chain.links.0.from.port bad-format'],
    ],
  ])('%s is refused', async (_, entered, faults) => {
    const answer = await send({ question: question(), chain: entered })
    expect(answer.status, answer.text).toBe(400)
    expect(faultsOf(answer)).toEqual(faults)
  })

  test('knots of loops are answered within a second, and the next request as before', async () => {
    const port = { key: 'x', dir: 'either' as const }
    const knot = await unitOf(
      modulator({
        name: 'Knot',
        ports: Array.from({ length: 12 }, (_, i) => ({
          ...modulator().ports[0]!,
          key: `${port.key}${i}`,
          circuits: [
            { circuit: 'audio-l', dir: port.dir },
            { circuit: 'cvbs', dir: port.dir },
          ],
        })),
        jacks: [
          ...Array.from({ length: 12 }, (_, i) => ({
            key: `in${i}`,
            form: 'sound' as const,
            dir: 'in' as const,
            contacts: [{ circuit: 'audio-l' as const, port: `x${i}` }],
          })),
          ...Array.from({ length: 12 }, (_, i) => ({
            key: `out${i}`,
            form: 'sound' as const,
            dir: 'out' as const,
            contacts: [{ circuit: 'audio-l' as const, port: `x${i}` }],
          })),
        ],
        controls: [],
        functions: Array.from({ length: 12 }, (_, i) => ({
          key: `f${i}`,
          kind: 'mixes-sound' as const,
          needs: [],
          optional: Array.from({ length: 12 }, (_, j) => ({
            jack: `in${j}`,
            ifAbsent: 'silent' as const,
          })),
          accepts: [],
          gives: Array.from({ length: 12 }, (_, j) => ({
            jack: `out${j}`,
            sound: 'same' as const,
          })),
          power: 'none' as const,
        })),
      }),
    )
    const other = chain().links
    const links = [
      { from: at(UNITS.player, 'left'), pieces: LEAD, to: at(knot, 'x0') },
      ...Array.from({ length: 10 }, (_, i) => ({
        from: at(knot, `x${i}`),
        pieces: LEAD,
        to: at(knot, `x${i + 1}`),
      })),
      { from: at(knot, 'x11'), pieces: LEAD, to: at(UNITS.monitor, 'left-in') },
      other[0]!,
    ]
    const start = performance.now()
    await check({ links, settings: [] })
    expect(performance.now() - start).toBeLessThan(1000)
    expect((await check(chain())).picture).not.toBeNull()
  })
})

describe('every finding', () => {
  const codes = [...FINDINGS, ...CHAIN_CODES].filter(
    (c) => !c.startsWith('claims-') && c !== 'legs-and-links-differ',
  )

  test.each(codes)('%s has a sentence in both languages', (code) => {
    expect(hasSentence(`finding.${code}`)).toBe(true)
    for (const locale of LOCALES)
      expect(sentence(`finding.${code}`, {}, locale)).not.toMatch(/\[|\]/)
  })
})
