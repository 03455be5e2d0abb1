import type { DeviceModel } from '@coaxwain/models'
import { stereoIn, turns } from '@coaxwain/models/build'
import { box } from './box'

/** Sound alone. */
export const SOUND_BOXES = {
  loudspeakers: box({
    name: 'powered loudspeakers',
    kind: 'loudspeakers',
    back: [[stereoIn('line-in')]],
    functions: [turns('speak', 'makes-sound', 'line-in', {})],
  }),
} satisfies Record<string, DeviceModel>
