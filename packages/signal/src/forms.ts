import type { Circuit } from './circuits'

/** A form is a named bundle of circuits over one port or one group of ports. */
export const PICTURE_FORMS = [
  'rf',
  'composite',
  's-video',
  'component',
  'rgbs',
  'rgsb',
  'rgbhv',
  'rgbi',
  'ttl-mono',
  'dvi',
  'hdmi',
] as const

export type PictureForm = (typeof PICTURE_FORMS)[number]

export const SOUND_FORMS = ['sound', 'digital-sound', 'ac3-rf'] as const
export type SoundForm = (typeof SOUND_FORMS)[number]

export const FORMS = [...PICTURE_FORMS, ...SOUND_FORMS] as const
export type Form = PictureForm | SoundForm

/**
 * The circuits of each form. Sync of `rgbs` may travel on a composite-sync wire or as composite video
 * (two published SCART pin tables); `sound` is one, two or a mono wire.
 */
export const FORM_CIRCUITS: Readonly<Record<Form, readonly Circuit[]>> = {
  rf: ['rf'],
  composite: ['cvbs'],
  's-video': ['y', 'c'],
  component: ['y', 'pb', 'pr'],
  rgbs: ['r', 'g', 'b', 'csync'],
  rgsb: ['r', 'g', 'b'],
  rgbhv: ['r', 'g', 'b', 'hsync', 'vsync'],
  rgbi: ['ttl-r', 'ttl-g', 'ttl-b', 'ttl-i', 'hsync', 'vsync'],
  'ttl-mono': ['ttl-mono', 'hsync', 'vsync'],
  dvi: ['tmds'],
  hdmi: ['tmds'],
  sound: ['audio-l', 'audio-r'],
  'digital-sound': ['spdif'],
  'ac3-rf': ['ac3-rf'],
}

export const isPictureForm = (form: Form): form is PictureForm =>
  (PICTURE_FORMS as readonly string[]).includes(form)

/** What has become of a picture on its way: the poorest encoding so far, never regained. */
export const QUALITIES = ['none', 'luma-only', ...PICTURE_FORMS] as const
export type Quality = 'none' | 'luma-only' | PictureForm

/**
 * The steps of the ladder. An ordering, not a measurement (common practice, no source);
 * bandwidths inside a step come from {@link FORM_MHZ}.
 */
export const TIER: Readonly<Record<Quality, number>> = {
  none: 0,
  'luma-only': 1,
  rf: 2,
  composite: 3,
  's-video': 4,
  component: 5,
  rgbs: 5,
  rgsb: 5,
  rgbhv: 5,
  rgbi: 5,
  'ttl-mono': 5,
  dvi: 5,
  hdmi: 5,
}

/**
 * Luma bandwidth in MHz that a form lets through at best. RF depends on the system and is taken from there.
 * Sources: 47 CFR 73.682(a)(20)(iii) for composite; ITU-R BT.601 filters, from memory, for component and RGB;
 * common practice, no source, for the rest.
 */
export const FORM_MHZ: Readonly<Record<Quality, number>> = {
  none: 0,
  'luma-only': 5,
  rf: 4.2,
  composite: 4.2,
  's-video': 5,
  component: 5.75,
  rgbs: 5.75,
  rgsb: 5.75,
  rgbhv: 5.75,
  rgbi: 5.75,
  'ttl-mono': 5.75,
  dvi: 5.75,
  hdmi: 5.75,
}

/** The poorer of two qualities; of equals the later one, so that an answer names an analogue step. */
export const poorer = (a: Quality, b: Quality): Quality => (TIER[b] <= TIER[a] ? b : a)
