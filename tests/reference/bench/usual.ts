import { DEFLECTION_60 } from '@coaxwain/models/build'
import type { DeviceModel } from '@coaxwain/models'
import type { AnalogueCarrier, Colour, Form, PlanPart, Receiver, Screen } from '@coaxwain/signal'
import { aerialSet, lead, sender, type AerialSocket, type Plays, type Sockets } from './devices'

/** A screen that takes whatever a 525-line picture may come as. */
export const SCREEN: Screen = {
  deflection: DEFLECTION_60,
  colours: ['ntsc-m', 'ypbpr', 'rgb', 'rgbi', 'digital'],
}

const COLOUR_OF: Partial<Record<Form, Colour>> = {
  component: 'ypbpr',
  rgbs: 'rgb',
  rgsb: 'rgb',
  rgbhv: 'rgb',
  rgbi: 'rgbi',
  hdmi: 'digital',
}

/** A 525-line picture in the colour that its form carries as it is. */
export const pictureIn = (form: Form): Plays => ({
  scan: '525i60',
  colour: COLOUR_OF[form] ?? 'ntsc-m',
})

/** A way for the picture where only the sound is in question. */
export const BESIDE: Sockets = { connector: 'bnc-socket', form: 'composite' }
export const BESIDE_LEAD = lead('bnc-plug', 'bnc-plug')

export const CHANNEL_3: PlanPart = { plan: 'us-broadcast', names: '3' }

export const CARRIER: AnalogueCarrier = {
  kind: 'analogue',
  system: 'M',
  scan: '525i60',
  colour: 'ntsc-m',
  visionMhz: 61.25,
  sound: 'mono',
}

const RECEIVER: Receiver = {
  ...SCREEN,
  systems: ['M'],
  digital: [],
  reaches: [CHANNEL_3],
  pullInMhz: 0.5,
}

/** Sends on channel 3. */
export const sending = (at: AerialSocket): DeviceModel => sender(CARRIER, CHANNEL_3, at)

/** A set that is tuned to it. */
export const receiving = (at: AerialSocket): DeviceModel => aerialSet(RECEIVER, at)
