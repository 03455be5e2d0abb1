import type { CableInput, DrawingInput } from './drawing-input'
import type { RowCable, RowEnd } from './row'
import type { UnitBox } from './unit-box'

const RIBBON_FROM = 5

/** Circuits of one lead go together from five units on, and wherever they must pass through a flag. */
const isRibbon = (input: DrawingInput, rows: number): boolean =>
  input.units.length >= RIBBON_FROM || rows > 1

/** Where a unit stands: its row, and its place in the row. */
export interface Place {
  readonly row: number
  readonly unit: number
}

/** Cables that run together between the same two units. */
export interface Bundle {
  readonly key: string
  readonly cables: readonly Oriented[]
  readonly from: Place
  readonly to: Place
}

interface Oriented {
  readonly cable: CableInput
  readonly parts: CableInput['parts']
  readonly leftPort: string
  readonly rightPort: string
  readonly leftX: number
}

const before = (a: Place, b: Place): boolean =>
  a.row < b.row || (a.row === b.row && a.unit <= b.unit)

/** A cable from the unit that stands first to the one that stands later, whichever way its signal runs. */
function orient(
  cable: CableInput,
  places: ReadonlyMap<string, Place>,
  groups: readonly (readonly UnitBox[])[],
): { from: Place; to: Place; oriented: Oriented; units: string } {
  const source = places.get(cable.from.unit)
  const target = places.get(cable.to.unit)
  if (!source || !target) throw new Error(`cable ${cable.key} ends outside the drawing`)
  const ahead = before(source, target)
  const [from, to] = ahead ? [source, target] : [target, source]
  const [left, right] = ahead ? [cable.from, cable.to] : [cable.to, cable.from]
  const exit = groups[from.row]?.[from.unit]?.exits.get(left.port)
  return {
    from,
    to,
    units: `${left.unit} ${right.unit}`,
    oriented: {
      cable,
      parts: ahead ? cable.parts : [...cable.parts].reverse().map(turned),
      leftPort: left.port,
      rightPort: right.port,
      leftX: exit?.at(-1)?.x ?? 0,
    },
  }
}

/** Cables from left to right; from five units on, the circuits of one lead go together. */
export function bundle(
  input: DrawingInput,
  places: ReadonlyMap<string, Place>,
  groups: readonly (readonly UnitBox[])[],
): Bundle[] {
  const found = new Map<string, { cables: Oriented[]; from: Place; to: Place }>()
  for (const cable of input.cables) {
    const { from, to, oriented, units } = orient(cable, places, groups)
    const lead = wholeLead(cable)
    const together = lead && isRibbon(input, groups.length)
    const key = `${units} ${together ? `${lead.key} ${lead.numbers.join()}` : cable.key}`
    const entry = found.get(key) ?? { cables: [], from, to }
    entry.cables.push(oriented)
    found.set(key, entry)
  }
  return [...found]
    .map(([key, b]) => ({
      key,
      from: b.from,
      to: b.to,
      cables: [...b.cables].sort((p, q) => q.leftX - p.leftX),
    }))
    .sort((p, q) => (q.cables[0]?.leftX ?? 0) - (p.cables[0]?.leftX ?? 0))
}

/** The lead of a cable that is nothing but one lead, with the step that plugs it. */
function wholeLead({ parts }: CableInput): { key: string; numbers: readonly number[] } | null {
  const [run] = parts
  return parts.length === 1 && run?.kind === 'run' && run.lead
    ? { key: run.lead.key, numbers: run.numbers }
    : null
}

const turned = (part: CableInput['parts'][number]): CableInput['parts'][number] =>
  part.kind === 'piece' ? { ...part, ends: [part.ends[1], part.ends[0]] } : part

/** In a row that holds only one end, the cable is the run next to that end, up to its flag. */
export function rowCable(c: Oriented, b: Bundle, row: number): RowCable {
  const left: RowEnd = b.from.row === row ? { unit: b.from.unit, port: c.leftPort } : 'flag'
  const right: RowEnd = b.to.row === row ? { unit: b.to.unit, port: c.rightPort } : 'flag'
  const parts =
    left === 'flag'
      ? c.parts.slice(splitAt(c.parts))
      : right === 'flag'
        ? c.parts.slice(0, splitAt(c.parts) + 1)
        : c.parts
  return { cable: c.cable, parts, left, right }
}

/** The run in which a cable passes from row to row: the one after its first piece would crowd the end. */
const splitAt = (parts: CableInput['parts']): number => (parts.length > 2 ? 2 : 0)
