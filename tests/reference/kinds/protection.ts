import { mhz, type Db } from '@coaxwain/quantities'
import {
  CABLE_PRODUCT_RATIO,
  DVB_MODES,
  protectionRatio,
  singleCarrierRatio,
  SOUND_RATIO,
  type Hearing,
  RF_SYSTEM_IDS,
  type DvbMode,
  type Encounter,
  type Service,
} from '@coaxwain/signal'
import { got, passOrFail, type Inputs } from '../inputs'

/** Names without a system letter stand for the usual one. */
const GENERIC: readonly (readonly [RegExp, Service])[] = [
  [/8-?vsb|atsc/iu, 'atsc'],
  [/dvb-?t/iu, 'dvb-t'],
  [/625-line|pal\/secam|analogue pal|^pal$/iu, 'G'],
]

/** `M analogue`, `PAL G`, `SECAM L`, `ATSC 8-VSB`, `DVB-T 64-QAM 2/3`. */
function serviceOf(text: string): Service {
  const generic = GENERIC.find(([pattern]) => pattern.test(text))
  if (generic) return generic[1]
  const letter = text.split(/[\s(),]+/u).find((word) => RF_SYSTEM_IDS.some((id) => id === word))
  if (letter === undefined) throw new Error(`no television system is called ${text}`)
  return letter as Service
}

const modeOf = (text: string): DvbMode | undefined =>
  DVB_MODES.find((mode) => text.toUpperCase().includes(mode))

const bandOf = (text: string): Encounter['band'] =>
  text === 'VHF' || text === 'UHF' ? text : undefined

function offsetOf(relation: string): Encounter['offset'] {
  if (/10 kHz/u.test(relation)) return '10-khz'
  if (/8\/12/u.test(relation)) return '8/12-line'
  return /4\/12/u.test(relation) ? '4/12-line' : 'none'
}

/** What has a figure of its own: a single carrier within a channel, sound on sound, a product on a cable. */
function ownRatio(i: Inputs, hearing: Hearing): Db | null {
  const unwanted = i.text('unwanted')
  if (/single carrier/iu.test(unwanted)) {
    return got(singleCarrierRatio(mhz(i.number('offset_mhz')), hearing))
  }
  if (/discrete carrier|product/iu.test(unwanted)) return CABLE_PRODUCT_RATIO
  return /FM sound/iu.test(unwanted) ? SOUND_RATIO[hearing] : null
}

function tabledRatio(i: Inputs, hearing: Hearing): Db {
  const relation = i.textOr('relation', '')
  return got(
    protectionRatio({
      wanted: serviceOf(i.text('wanted')),
      mode: modeOf(i.text('wanted')),
      unwanted: serviceOf(i.text('unwanted')),
      channels: i.number('offset_channels'),
      band: bandOf(i.textOr('band', 'any')),
      offset: offsetOf(relation),
      medium: /cable/iu.test(`${i.text('wanted')} ${relation}`) ? 'cable' : 'air',
      hearing,
    }),
  )
}

/** Whether a level difference is enough, by the tables of protection ratios. */
export function protectionCheck(i: Inputs) {
  const hearing = /continuous/iu.test(i.textOr('relation', '')) ? 'continuous' : 'planning'
  const required = ownRatio(i, hearing) ?? tabledRatio(i, hearing)
  const margin = i.number('wanted_minus_unwanted_db') - required
  return { required_db: required, margin_db: margin, result: passOrFail(margin >= 0) }
}
