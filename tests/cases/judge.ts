import {
  stated,
  type CaseAnswer,
  type CaseControl,
  type CaseSetting,
  type CaseUnit,
  type Expected,
  type HookupAnswer,
  type HookupCase,
} from './form'
import { Bench, followed, standsOf, unitOf, type Stand } from './judging/bench'
import { bought } from './judging/bought'
import { aerialKept, channelClashes, privateClashes, radiation, supplies } from './judging/carriers'
import { contradicted } from './judging/contradicted'
import { Ears, HEARD, type Heard } from './judging/ears'
import { fieldHz, rankOf } from './judging/facts'
import { lineEnds } from './judging/line-ends'
import { Waves } from './judging/waves'
import { forbidden } from './must-not'
import { Rig } from './rig'

export interface Judgement {
  readonly id: string
  readonly failures: readonly string[]
  /** Warnings that give none of the expected ones. */
  readonly noise: number
}

const MOST_WARNINGS = 6

/** Compares an answer with a case, by the rules of the case form. */
export function judge(c: HookupCase, answer: HookupAnswer): Judgement {
  const { id, expected } = c
  const answers = answer.answers ?? []
  const warned = [...(answer.warnings ?? []), ...(answers[0]?.warnings ?? [])]
  const wanted = (expected.warnings ?? []).map((w) => w.code)
  const noise = warned.filter((w) => !w.code || !wanted.includes(w.code)).length
  if (answer.possible !== expected.possible) {
    const verdict = `verdict: ${answer.possible} instead of ${expected.possible}`
    return { id, failures: [verdict], noise }
  }
  const missing = wanted.filter((code) => !warned.some((w) => w.code === code))
  return {
    id,
    failures: [
      ...judgeAnswers(c, answers),
      ...missing.map((code) => `warning missing: ${code}`),
      ...warnedWrongly(c, answer),
      ...forbidden(c, answer),
    ],
    noise,
  }
}

/** Too many warnings on one answer, and those that the facts contradict. */
function warnedWrongly(c: HookupCase, answer: HookupAnswer): string[] {
  const none: CaseAnswer = {
    paths: [],
    settings: [],
    quality: { picture: 'none', form: 'none', sound: 'none' },
  }
  const all = answer.answers?.length ? answer.answers : [none]
  return all.flatMap((one) => {
    const codes = [...(answer.warnings ?? []), ...(one.warnings ?? [])].flatMap((w) => w.code ?? [])
    const many = (one.warnings ?? []).length > MOST_WARNINGS ? ['more than six warnings'] : []
    return [...many, ...contradicted(new Bench(c, one), codes)]
  })
}

function judgeAnswers(c: HookupCase, answers: readonly CaseAnswer[]): string[] {
  if (c.expected.possible === 'no') return answers.length === 0 ? [] : ['gives an answer to a no']
  if (answers.length === 0) return ['no answer is given']
  return answers.flatMap((one, i) =>
    judgeAnswer(c, one, i === 0).map((f) => (i === 0 ? f : `answer ${i + 1}: ${f}`)),
  )
}

function judgeAnswer(c: HookupCase, answer: CaseAnswer, first: boolean): string[] {
  const bench = new Bench(c, answer)
  const rig = new Rig(c, bench)
  const wiring = rig.wiring()
  const stands = standsOf(bench)
  return [
    ...wiring,
    ...oncePerControl(bench),
    ...(wiring.length === 0 ? works(c, bench, stands, first) : []),
    ...aerialKept(bench),
    ...radiation(bench),
    ...privateClashes(bench),
    ...supplies(bench),
    ...(first ? [...mustSettings(c, bench, rig), ...bought(bench, c.expected)] : []),
    ...(!first && answer.below === undefined ? ['does not say why it ranks below'] : []),
  ]
}

/** What is seen and heard, in the worst of the ways in which the controls may stand. */
function works(c: HookupCase, bench: Bench, stands: readonly Stand[], first: boolean): string[] {
  const results = stands.map((stand) => ({ stand, ...result(bench, stand) }))
  const found = results.flatMap(({ stand, picture, sound, names }) => [
    ...shortOf(c.expected, { picture, sound }, first),
    ...beyond(bench.answer, { picture, sound }),
    ...lineEnds(bench, stand),
    ...channelClashes(bench, stand),
    ...shapes(bench, picture),
    ...trimmers(bench, picture),
    ...tracks(bench, names),
    ...protectionStops(bench),
    ...gun(bench, picture),
  ])
  return [...new Set(found)]
}

type Picture = ReturnType<Waves['shown']>

interface Result {
  readonly picture: Picture
  readonly sound: Heard
  readonly names: ReadonlySet<string>
}

function result(bench: Bench, stand: Stand): Result {
  const waves = new Waves(bench, stand)
  const { heard, names } = new Ears(bench, stand, waves).best()
  return { picture: waves.shown(), sound: heard, names }
}

/** What arrives is less than what is expected. */
function shortOf(
  { quality }: Expected,
  { picture, sound }: Pick<Result, 'picture' | 'sound'>,
  first: boolean,
): string[] {
  if (!picture) return ['no picture is shown']
  if (!first) return []
  const seen = picture.colour ? 'colour' : 'monochrome'
  const found: string[] = []
  if (quality.picture === 'colour' && seen !== 'colour') found.push('the picture is grey')
  if (rankOf(picture.wave.poorest) < rankOf(quality.form))
    found.push(`form: ${picture.wave.poorest} arrives instead of ${quality.form}`)
  if (HEARD.indexOf(sound) < HEARD.indexOf(quality.sound))
    found.push(`sound: ${sound} arrives instead of ${quality.sound}`)
  return found
}

/** What the answer states is more than what arrives. */
function beyond(
  { quality }: CaseAnswer,
  { picture, sound }: Pick<Result, 'picture' | 'sound'>,
): string[] {
  if (!picture) return []
  const found: string[] = []
  if (quality.picture === 'colour' && !picture.colour) found.push('promises colour')
  if (rankOf(quality.form) > rankOf(picture.wave.poorest))
    found.push(`promises ${quality.form} where ${picture.wave.poorest} arrives`)
  if (HEARD.indexOf(quality.sound) > HEARD.indexOf(sound))
    found.push(`promises ${quality.sound} sound where ${sound} arrives`)
  return found
}

/** A wide picture must not arrive squeezed on a 4:3 tube. */
function shapes(bench: Bench, picture: Picture): string[] {
  const { aspect, kind } = bench.question.display
  const narrow = aspect === '4:3' || (aspect === undefined && kind !== 'flat')
  return narrow && picture?.wave.shape === 'squeezed' ? ['a squeezed picture on a 4:3 tube'] : []
}

/** A trimmer of which it is known how it stands must be moved, where it does not stand right. */
function trimmers(bench: Bench, picture: Picture): string[] {
  return bench.chain.flatMap((id) =>
    (bench.unit(id)?.settings ?? []).flatMap((control) => trimmer(bench, { id, control }, picture)),
  )
}

const DOWNWARDS = /down|left|less/i
const UPWARDS = /\bup\b|more/i

function trimmer(
  bench: Bench,
  { id, control }: { id: string; control: CaseControl },
  picture: Picture,
): string[] {
  const [measure] = Object.entries(control.now ?? {})
  if (!measure) return []
  const [aim] = Object.values(control.aim ?? {})
  const wanted = aim ?? ownRate(measure, picture)
  if (wanted === measure[1]) return []
  const [given] = bench.settingsFor(id, control.name)
  if (!given) return [`${id} ${control.name} is left as it stands`]
  const against = wanted > measure[1] ? DOWNWARDS : UPWARDS
  return aim !== undefined && against.test(given.to)
    ? [`${id} ${control.name} goes the wrong way`]
    : []
}

/** What a trimmer without an aim is to be moved to: the field rate of the picture, else where it stands. */
const ownRate = ([quantity, now]: [string, number], picture: Picture): number =>
  picture && /field|hz/i.test(quantity) ? Math.round(fieldHz(picture.wave.scan)) : now

/** Two programmes must not be mixed, and the wanted one must be heard. */
function tracks(bench: Bench, names: ReadonlySet<string>): string[] {
  const { content } = bench.question.source
  const inside = content?.tracks as { wanted?: unknown } | undefined
  const wanted = content?.wanted ?? inside?.wanted
  const playing = [...names].filter((n) => n.startsWith('track '))
  const has = bench.question.source.ports.some((p) => stated(p.tracks).length > 0)
  if (!has || typeof wanted !== 'string') return []
  if (playing.length > 1) return ['two programmes are mixed']
  return playing[0] === `track ${wanted}` ? [] : ['the wanted track is not heard']
}

/** Protected content does not pass what stops it, even on its way to the display. */
function protectionStops(bench: Bench): string[] {
  const protection = [bench.question.source.content?.protection ?? []].flat()
  return [
    ...(protection.includes('hdcp') ? handshakeRefused(bench) : []),
    ...(protection.includes('analogue-agc') ? levelControlUpset(bench) : []),
  ]
}

const handshakeRefused = (bench: Bench): string[] =>
  bench.watched
    .filter((h) => h.signal === 'hdmi' || h.signal === 'dvi')
    .filter((h) => {
      const box = unitOf(h.to) !== 'display'
      return bench.port(h.to)?.hdcp === false || (box && bench.unit(unitOf(h.to))?.hdcp !== true)
    })
    .map((h) => `${h.to} refuses the handshake`)

const levelControlUpset = (bench: Bench): string[] =>
  bench.watched
    .filter((h) => h.signal !== 'rf')
    .filter((h) => [bench.port(h.to), bench.unit(unitOf(h.to))].some((x) => x?.recorderInputAgc))
    .map((h) => `${h.to} is upset by protection pulses`)

function gun(bench: Bench, picture: Picture): string[] {
  const { source, display } = bench.question
  if (![source.needs ?? []].flat().includes('light-gun')) return []
  const suits = seesBeam(display) && picture?.wave.made !== true
  return suits ? [] : ['the light gun sees nothing']
}

/** A tube that is looked at directly and drawn as the signal comes. */
function seesBeam({ kind, tube, fieldStore, scanConversion }: CaseUnit): boolean {
  const direct = (tube?.view ?? 'direct') === 'direct'
  return /crt|tube|monitor/.test(kind ?? '') && direct && !fieldStore && !scanConversion
}

/** One position a control; only a tuner may be given several channels. */
function oncePerControl(bench: Bench): string[] {
  const seen = new Set<string>()
  return bench.answer.settings.flatMap((s) => {
    const control = bench.meant(s)
    if (!control || control.class === 'tuned-to') return []
    const key = `${s.on} ${control.name}`
    if (seen.has(key)) return [`two positions for ${key}`]
    seen.add(key)
    const known = ['trim', 'channel'].includes(control.class)
    return known || bench.choice(s.on, control, s.to) !== undefined
      ? []
      : [`${key} has no position ${s.to}`]
  })
}

/** Every must setting of a unit in the chain, where the same sockets of that unit are used as in the best answer. */
function mustSettings(c: HookupCase, bench: Bench, rig: Rig): string[] {
  return (
    (c.expected.settings ?? [])
      // A setting that follows another unit's holds only where that unit is in the chain.
      .filter((s) => s.need === 'must' && rig.sameSockets(s.on) && rig.has(s.to))
      .flatMap((s): string[] => {
        const [given, ...more] = matching(bench, s)
        if (!given) return [`setting missing: ${s.on} ${s.set}`]
        return [given, ...more].some((g) => isAsWanted(bench, rig, s, g.to))
          ? []
          : [`setting: ${s.on} ${s.set} to ${given.to} instead of ${s.to}`]
      })
  )
}

type WantedSetting = NonNullable<Expected['settings']>[number]

/** Words for a trimmer are free but for the way it goes. */
function isAsWanted(bench: Bench, rig: Rig, wanted: WantedSetting, given: string): boolean {
  const control = bench.unit(wanted.on)?.settings?.find((k) => k.name === wanted.set)
  if (control?.class === 'trim' && !['up', 'down'].includes(wanted.to)) return true
  const allowed = [wanted.to, ...(wanted.oneOf ?? [])]
  return allowed.some((a) => /any channel/.test(a) || rig.samePosition(a, given))
}

/** Answered settings of the control that an expected one names; where it follows a unit not here, none. */
function matching(bench: Bench, s: CaseSetting): readonly CaseSetting[] {
  const as = followed(s.to)
  if (as !== undefined && bench.unit(as) === undefined) return []
  return bench.settingsFor(s.on, s.set)
}
