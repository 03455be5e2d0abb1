import type { AcceptRow, Condition, Give, Jack, ModelFunction, RfGive } from '@coaxwain/models'
import {
  at,
  carrier,
  gives,
  heardOn,
  MONO_SET,
  passes,
  picture,
  plainColour,
  plays,
  SAME,
  shows,
  sounds,
  turns,
} from '@coaxwain/models/build'
import type { Colour } from '@coaxwain/signal'
import { MARKET_FACTS, type MarketFacts } from './market-facts'
import type { DoesForm, ModelForm } from './model-form'

/** Output level of small boxes: a little above what a set needs (common practice, no source). */
const SMALL_BOX_DBMV = 6

interface Context {
  readonly form: ModelForm
  readonly facts: MarketFacts
  readonly jacks: ReadonlyMap<string, Jack>
}

/** Functions in the order of the form, so that a fault of the one is a fault of the other. */
export function buildFunctions(form: ModelForm, jacks: readonly Jack[]): ModelFunction[] {
  const context = {
    form,
    facts: MARKET_FACTS[form.market],
    jacks: new Map(jacks.map((j) => [j.key, j])),
  }
  return form.does.map((does) => {
    switch (does.kind) {
      case 'plays':
        return playing(does, context)
      case 'modulates':
        return modulating(does, context)
      case 'shows':
        return showing(does, context)
      case 'loop-through':
        return passing(does)
    }
  })
}

const condition = (does: DoesForm): Condition | undefined =>
  does.whileControl !== '' && does.whilePosition !== ''
    ? at(does.whileControl, does.whilePosition)
    : undefined

const label = (does: DoesForm): string | undefined => does.label.trim() || undefined

const rfOf = (does: DoesForm, { facts }: Context): RfGive => ({
  ...carrier(facts.system, { levelDbmv: SMALL_BOX_DBMV }),
  ...(does.channel === '' ? {} : { channel: { control: does.channel } }),
})

const PLAIN: Partial<Record<Jack['form'], Colour>> = {
  component: 'ypbpr',
  rgbs: 'rgb',
  rgsb: 'rgb',
  rgbhv: 'rgb',
  hdmi: 'digital',
  dvi: 'digital',
}

function output(key: string, does: DoesForm, context: Context): Give {
  const jack = context.jacks.get(key)
  if (jack?.form === 'sound') {
    const one = jack.contacts.length === 1
    return sounds(key, one ? 'mono' : 'stereo')
  }
  if (jack?.form === 'digital-sound') return sounds(key, 'stereo')
  const { scan, colour } = context.facts
  const rows = [picture(scan, (jack && PLAIN[jack.form]) ?? colour)]
  return jack?.form === 'rf'
    ? gives(key, rows, { sound: 'mono', rf: [rfOf(does, context)] })
    : gives(key, rows, jack?.form === 'hdmi' ? { sound: 'stereo' } : {})
}

const playing = (does: DoesForm, context: Context): ModelFunction =>
  plays(
    does.key,
    label(does) ?? '',
    does.outputs.map((key) => output(key, does, context)),
    { while: condition(does) },
  )

const modulating = (does: DoesForm, context: Context): ModelFunction =>
  turns(does.key, 'modulates', does.input, {
    label: label(does),
    while: condition(does),
    sound: does.sound || undefined,
    accepts: context.facts.lineInput,
    gives: does.outputs.map((key) =>
      gives(key, SAME, { sound: 'same', rf: [rfOf(does, context)] }),
    ),
  })

function accepted(does: DoesForm, { form, facts, jacks }: Context): readonly AcceptRow[] {
  const input = jacks.get(does.input)?.form
  const encoded = form.screen === 'tube-mono' ? MONO_SET(facts.scans) : facts.setInput
  switch (input) {
    case 'rf':
      return heardOn(encoded, facts.heard)
    case 'component':
      return plainColour('ypbpr', facts.scans)
    case 'rgbs':
    case 'rgsb':
    case 'rgbhv':
      return plainColour('rgb', facts.scans)
    case 'hdmi':
    case 'dvi':
      return plainColour('digital', facts.scans)
    default:
      return encoded
  }
}

const showing = (does: DoesForm, context: Context): ModelFunction =>
  shows(does.key, label(does) ?? '', does.input, {
    accepts: accepted(does, context),
    while: condition(does),
    tunedBy: does.channel || undefined,
    sound: does.sound || undefined,
  })

const passing = (does: DoesForm): ModelFunction =>
  passes(does.key, 'loop-through', does.input, {
    to: does.outputs,
    label: label(does),
    while: condition(does),
  })
