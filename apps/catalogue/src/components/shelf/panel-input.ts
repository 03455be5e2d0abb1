import type { DeviceModel } from '@coaxwain/models'
import type { Speak } from '../../format/words'
import type { PanelInput } from '../drawing/layout/panel-layout'
import { controlSpec } from '../hookup/control-spec'
import { isMoulded, portInputs } from '../hookup/unit-ports'

/** A device's panel with its controls where they stand, as far as noted. */
export const panelInput = (
  device: DeviceModel,
  stands: Readonly<Record<string, string>>,
  say: Speak,
): PanelInput => ({
  ports: portInputs(device, new Set()),
  controls: device.controls.flatMap((control) =>
    control.access === 'menu' || control.access === 'remote' || control.kind === 'auto'
      ? []
      : [
          {
            key: control.key,
            face: control.access === 'front' ? ('front' as const) : ('back' as const),
            number: null,
            spec: controlSpec(control, stands[control.key] ?? null, say),
          },
        ],
  ),
  captions: {
    back: say('drawing.back'),
    front: say('drawing.front'),
    side: say('drawing.side'),
  },
  moulded: isMoulded(device),
})

const FACES = ['back', 'lead', 'side', 'front'] as const

/** Sockets numbered as the eye goes over the panel. */
export function socketNumbers(device: DeviceModel): Map<string, number> {
  const ordered = device.ports
    .filter((p) => !p.retired)
    .sort(
      (a, b) =>
        FACES.indexOf(a.at.face) - FACES.indexOf(b.at.face) ||
        a.at.row - b.at.row ||
        a.at.column - b.at.column,
    )
  return new Map(ordered.map((p, i) => [p.key, i + 1]))
}
