import { measureHookups } from './hookups/measure'

/** `npm run speed -- NAME`: prints one JSON document with the ratios of this very run. Nothing is judged by a time. */
const MEASURES: Readonly<Record<string, () => Promise<unknown>>> = { hookups: measureHookups }

const [name = ''] = process.argv.slice(2)
const measure = MEASURES[name]
if (!measure) {
  process.stderr.write(`Name one of: ${Object.keys(MEASURES).join(', ')}\n`)
  process.exit(2)
}
process.stdout.write(`${JSON.stringify(await measure(), null, 2)}\n`)
