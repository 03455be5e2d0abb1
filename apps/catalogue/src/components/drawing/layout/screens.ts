import { box, type Box, type Label } from './boxes'
import type { UnitInput } from './drawing-input'
import { textWidth } from './text-width'
import { FACE_GAP, type SquareMark, type UnitStyle } from './unit-types'

export interface Screen extends Box {
  readonly labels: readonly Label[]
  /** Bars under the values, in the colour of where a control stands. */
  readonly bars: readonly Box[]
}

/** One number on the corner of a screen, or one beside each line. */
export function screenSquares(screen: Screen, unit: UnitInput): SquareMark[] {
  const lines = unit.screen?.lines ?? []
  const numbers = [...new Set(lines.flatMap((l) => (l.number === null ? [] : [l.number])))]
  if (numbers.length === 1)
    return [{ x: screen.x + screen.w, y: screen.y, number: numbers[0] ?? 0 }]
  return lines.flatMap((l, i) =>
    l.number === null
      ? []
      : [{ x: screen.x + screen.w, y: screen.y + 34 + SCREEN_LINE * i, number: l.number }],
  )
}

const SCREEN_LINE = 32

/** The screen of a unit's menu: beside its panels, or above them where width is short. */
export function layoutScreen(
  screen: NonNullable<UnitInput['screen']>,
  style: UnitStyle,
  facesRight: number,
  facesTop: number,
): Screen {
  return style.stacked
    ? screenAbove(screen, facesRight, facesTop)
    : screenBeside(screen, facesRight + FACE_GAP, facesTop)
}

const words = (text: string, x: number, y: number, sort: keyof typeof SCREEN_WORDS): Label => ({
  text,
  x,
  y,
  anchor: 'start',
  size: 12,
  ...SCREEN_WORDS[sort],
})

const SCREEN_WORDS = {
  caption: { weight: 400, tone: 'ink2' },
  name: { weight: 400, tone: 'ink' },
  value: { weight: 700, tone: 'ink' },
} as const

function screenBeside(
  { caption, lines }: NonNullable<UnitInput['screen']>,
  x: number,
  y: number,
): Screen {
  const widest = Math.max(
    textWidth(caption, 12, 400),
    ...lines.flatMap((l) => [textWidth(l.name, 12, 400), textWidth(l.value, 12, 700)]),
  )
  const labels = [
    words(caption, x + 12, y + 20, 'caption'),
    ...lines.flatMap((l, i) => [
      words(l.name, x + 12, y + 36 + SCREEN_LINE * i, 'name'),
      words(l.value, x + 12, y + 52 + SCREEN_LINE * i, 'value'),
    ]),
  ]
  return {
    ...box(x, y, Math.max(116, Math.ceil(widest) + 32), 30 + SCREEN_LINE * lines.length),
    labels,
    bars: lines.map((l, i) =>
      box(x + 12, y + 56 + SCREEN_LINE * i, textWidth(l.value, 12, 700), 2.5),
    ),
  }
}

/** Caption, name and value on one line each, over the width of the panel. */
function screenAbove(
  { caption, lines }: NonNullable<UnitInput['screen']>,
  facesRight: number,
  facesTop: number,
): Screen {
  const h = 16 + 20 * lines.length
  const y = facesTop - FACE_GAP + 2 - h
  const nameX = 12 + textWidth(caption, 12, 400) + 14
  const laid = lines.map((l, i) => {
    const baseline = y + 22 + 20 * i
    const valueX = nameX + textWidth(l.name, 12, 400) + 10
    return {
      labels: [words(l.name, nameX, baseline, 'name'), words(l.value, valueX, baseline, 'value')],
      bar: box(valueX, baseline + 4, textWidth(l.value, 12, 700), 2.5),
      right: valueX + textWidth(l.value, 12, 700),
    }
  })
  return {
    ...box(0, y, Math.max(facesRight, ...laid.map((l) => l.right + 16)), h),
    labels: [words(caption, 12, y + 22, 'caption'), ...laid.flatMap((l) => l.labels)],
    bars: laid.map((l) => l.bar),
  }
}
