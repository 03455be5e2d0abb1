import type {
  Chain,
  ChainChecked,
  ChainFinding,
  ChainVerdict,
  Question,
  Snapshot,
  Uid,
} from '@coaxwain/shelf'
import type { Finding } from '../finding'
import type { Said } from './codes'
import { linkFindings } from './link-findings'
import { unitFindings } from './unit-findings'
import { weigh } from './weigh'
import { isClaim, wireChain, type Wired } from './wire'

/**
 * Judges what a person wired by hand: each link by itself, each unit with its controls, and the whole. What
 * is seen and heard is told with every control that nobody named set as it must be.
 */
export function checkChain(snapshot: Snapshot, question: Question, chain: Chain): ChainChecked {
  const wired = wireChain(snapshot, question, chain)
  const found = wired.checked.findings.filter((f) => !isClaim(f))
  const placed = new Placed(chain, wired, found)
  const links = chain.links.map((_, i) => judged(placed.ofLink(i)))
  const units = placed.units().map((unit) => ({ unit, ...judged(placed.ofUnit(unit)) }))
  const whole = placed.ofWhole()
  const { picture } = wired.checked
  const all = [...links, ...units].flatMap((x) => x.findings)
  return {
    verdict: verdictOf([...all, ...whole]),
    links,
    units,
    whole,
    picture,
    sound: wired.hookup.sound,
    hookup: wired.hookup,
  }
}

const judged = (findings: readonly ChainFinding[]) => ({
  verdict: verdictOf(findings),
  findings,
})

function verdictOf(findings: readonly ChainFinding[]): ChainVerdict {
  if (findings.some((f) => f.weight === 'harm' || f.weight === 'wrong')) return 'wrong'
  return findings.length > 0 ? 'doubtful' : 'right'
}

/** Sorts findings to where a person looks for them: at a link, at a unit, or over the whole. */
class Placed {
  private readonly atLinks = new Map<Finding, readonly number[]>()

  constructor(
    private readonly chain: Chain,
    private readonly wired: Wired,
    private readonly found: readonly Finding[],
  ) {
    for (const finding of found) this.atLinks.set(finding, this.linksOf(finding))
  }

  ofLink(index: number): ChainFinding[] {
    const here = this.found.filter((f) => this.atLinks.get(f)?.includes(index))
    const own = this.wired.tangled ? [] : linkFindings(index, this.wired)
    return weigh([...here, ...own], this.wired)
  }

  units(): Uid[] {
    const { chain, wired } = this
    const named = chain.settings.map((s) => s.unit)
    const linked = chain.links.flatMap((l) => [l.from.unit, l.to.unit])
    return [...new Set([...wired.path.halts.map((h) => h.unit), ...linked, ...named])]
  }

  ofUnit(unit: Uid): ChainFinding[] {
    const here = this.found.filter(
      (f) => f.details['unit'] === unit && this.atLinks.get(f)?.length === 0,
    )
    return weigh(unitFindings(unit, here, this.wired), this.wired)
  }

  ofWhole(): ChainFinding[] {
    const { path, tangled, checked } = this.wired
    const known = new Set(this.units())
    const here = this.found.filter(
      (f) => this.atLinks.get(f)?.length === 0 && !known.has(String(f.details['unit'] ?? '')),
    )
    if (tangled) return weigh([{ code: 'tangled', details: {} }], this.wired)
    const last = path.halts.at(-1)
    const stops: Said[] =
      last && !path.arrives ? [{ code: 'picture-ends', details: { unit: last.unit } }] : []
    const silent: Said[] =
      path.arrives && checked.picture && checked.sound === 'none'
        ? [{ code: 'silent', details: {} }]
        : []
    return weigh([...here, ...stops, ...silent], this.wired)
  }

  private linksOf({ code, details }: Finding): number[] {
    const links = this.wired.hookup.links
    const where = (is: (link: (typeof links)[number]) => boolean): number[] =>
      links.flatMap((link, i) => (is(link) ? [i] : []))
    if (typeof details['link'] === 'number') return [details['link']]
    if (details['piece'] !== undefined)
      return where((l) => l.pieces.some((p) => p.model === details['piece']))
    if (details['end'] !== undefined) return this.pluggedTwice(String(details['end']))
    if (details['port'] === undefined || code === 'terminator-misplaced') return []
    const { unit, port } = details
    return where((l) => [l.from, l.to].some((e) => e.unit === unit && e.port === port))
  }

  private pluggedTwice(end: string): number[] {
    const [kind, of, which] = end.split(' ')
    return this.wired.hookup.links.flatMap((l, i) =>
      (kind === 'port' && [l.from, l.to].some((e) => e.unit === of && e.port === which)) ||
      (kind === 'plug' && l.pieces.some((p) => p.model === of && String(p.copy) === which))
        ? [i]
        : [],
    )
  }
}
