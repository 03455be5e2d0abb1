import type { DeviceModel, PieceModel, Wire } from '@coaxwain/models'
import type { PieceDraft } from '@coaxwain/models/build'
import {
  FORM_CIRCUITS,
  isSingle,
  type AdapterEnd,
  type AdapterFact,
  type Circuit,
  type ConnectorFamily,
  type Form,
} from '@coaxwain/signal'
import { monitor, player, type Sockets } from '../bench/devices'
import { BESIDE, BESIDE_LEAD, pictureIn, receiving, SCREEN, sending } from '../bench/usual'
import type { World } from '../bench/world'
import { leadBy, socketOf, type Role } from './parts'

/** What must come across. */
export type Outcome = 'colour' | 'grey' | 'nothing' | 'stereo' | 'mono' | 'silence'

/** One question to the engine. */
export interface Trial {
  readonly title: string
  readonly world: World
  readonly outcome: Outcome
}

// ---------------------------------------------------------------- devices at the two ends

/** RGB leaves a 21-pin socket with composite as its sync. */
const givenBy = (fact: AdapterFact, form: Form): readonly Circuit[] =>
  form === 'rgbs' && !fact.carries.includes('csync') ? ['r', 'g', 'b', 'cvbs'] : FORM_CIRCUITS[form]

const sockets = (end: AdapterEnd, role: Role, fact: AdapterFact, form: Form): Sockets => ({
  connector: socketOf(end, role),
  form,
  circuits: role === 'gives' ? givenBy(fact, form) : FORM_CIRCUITS[form],
})

function giver(end: AdapterEnd, fact: AdapterFact, form: Form): DeviceModel {
  if (form === 'rf') return sending({ connector: socketOf(end, 'gives'), ohm: end.ohm ?? 75 })
  const out = sockets(end, 'gives', fact, form)
  return form === 'sound' ? player(pictureIn(form), BESIDE, out) : player(pictureIn(form), out)
}

function taker(end: AdapterEnd, fact: AdapterFact, form: Form): DeviceModel {
  if (form === 'rf') return receiving({ connector: socketOf(end, 'takes'), ohm: end.ohm ?? 75 })
  const into = sockets(end, 'takes', fact, form)
  return form === 'sound' ? monitor(SCREEN, BESIDE, { sound: into }) : monitor(SCREEN, into)
}

// ---------------------------------------------------------------- wires

const FORMS: readonly Form[] = [
  'rf',
  'composite',
  's-video',
  'component',
  'rgbs',
  'rgsb',
  'rgbhv',
  'sound',
]

const isMulti = ({ families: [family] }: AdapterEnd): boolean =>
  family !== undefined && !isSingle(`${family as ConnectorFamily}-plug`)

/** A multi-way plug has a contact for each circuit, single ones are as many as they are. */
const onPlugs = (end: AdapterEnd, carries: readonly Circuit[]): readonly Circuit[] =>
  isMulti(end) ? carries : carries.slice(0, end.count)

/** The forms that an adapter brings across whole; where both ends have one contact, several are laid side by side. */
export function formsOf(fact: AdapterFact): Form[] {
  const { a, b, carries } = fact
  const sideBySide = !isMulti(a) && !isMulti(b)
  const across = sideBySide
    ? carries
    : onPlugs(a, carries).filter((c) => onPlugs(b, carries).includes(c))
  const most = sideBySide && a.count > 1 ? a.count : Infinity
  return FORMS.filter((form) => {
    const circuits = givenBy(fact, form)
    return circuits.length <= most && circuits.every((c) => across.includes(c))
  })
}

const whole = (form: Form): Outcome => (form === 'sound' ? 'stereo' : 'colour')
const none = (form: Form): Outcome => (form === 'sound' ? 'silence' : 'nothing')

/** A giver at one end and a taker at the other, joined by a lead. */
const laid = (fact: AdapterFact, form: Form, part: PieceModel, turned: boolean): World => ({
  source: giver(turned ? fact.b : fact.a, fact, form),
  display: taker(turned ? fact.a : fact.b, fact, form),
  pieces: [part, BESIDE_LEAD],
})

/** What each way of wiring lets through, and how it is wired. */
const MADE: Readonly<Record<AdapterFact['way'], readonly Wire['way'][]>> = {
  both: ['both'],
  'a-to-b': ['a-to-b'],
  'b-to-a': ['b-to-a'],
  'as-made': ['a-to-b', 'b-to-a'],
  none: [],
}

/** Every form in both directions by leads that are made as the fact says. */
export const wired = (fact: AdapterFact, rest: Partial<PieceDraft> = {}): Trial[] =>
  formsOf(fact).flatMap((form) =>
    MADE[fact.way].flatMap((way) =>
      [false, true].map((turned): Trial => {
        const passes = way === 'both' || (way === 'b-to-a') === turned
        return {
          title: `${form} ${turned ? 'backwards' : 'forwards'}, wired ${way}`,
          world: laid(fact, form, leadBy(fact, way, { ...rest, turned }), turned),
          outcome: passes ? whole(form) : none(form),
        }
      }),
    ),
  )
