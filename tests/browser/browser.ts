import { readFileSync } from 'node:fs'
import { createRequire } from 'node:module'
import {
  chromium,
  type Browser,
  type BrowserContext,
  type BrowserContextOptions,
  type Page,
} from 'playwright-core'
import { inject } from 'vitest'

export const SIZES = {
  desk: { width: 1440, height: 900 },
  phone: { width: 390, height: 844 },
} as const

export type Size = keyof typeof SIZES

export const SIZE_NAMES = ['desk', 'phone'] as const satisfies readonly Size[]

const FLAGS = [
  '--no-sandbox',
  '--disable-dev-shm-usage',
  '--disable-quic',
  '--disable-background-networking',
  '--disable-component-update',
  '--disable-sync',
]

export const launchBrowser = (): Promise<Browser> =>
  chromium.launch({ executablePath: '/usr/bin/chromium', args: FLAGS })

/** What a page must never do, gathered while a test drives it. */
export interface Complaints {
  readonly policy: string[]
  readonly errors: string[]
}

export interface Visit {
  readonly context: BrowserContext
  readonly page: Page
  readonly complaints: Complaints
  readonly address: string
  go(path: string): Promise<void>
}

export interface VisitOptions {
  readonly size?: Size
  readonly night?: boolean
  /** Address of a demonstration person; nobody signed in without it. */
  readonly as?: string
  readonly width?: number
}

/** People of the demonstration by what they may do. */
export const PEOPLE = {
  owner: 'maren.ashlow@example.org',
  viewer: 'wilma.orchardson@example.org',
  neighbour: 'rafe.lindell@example.com',
  both: 'ines.farrowby@example.org',
} as const

export function passPhraseOf(email: string): string {
  const person = inject('site').signIns.find((p) => p.email === email)
  if (!person) throw new Error(`nobody in the demonstration is ${email}`)
  return person.passPhrase
}

/** Gathers policy violations and errors of every page of a context. */
async function listen(context: BrowserContext): Promise<Complaints> {
  const complaints: Complaints = { policy: [], errors: [] }
  await context.exposeFunction('reportPolicy', (text: string) => {
    complaints.policy.push(text)
  })
  await context.addInitScript(() => {
    document.addEventListener('securitypolicyviolation', (e) => {
      const report = (window as unknown as { reportPolicy: (text: string) => void }).reportPolicy
      report(`${e.violatedDirective} ${e.blockedURI} ${e.sourceFile}:${e.lineNumber}`)
    })
  })
  context.on('weberror', (e) => complaints.errors.push(String(e.error())))
  return complaints
}

const QUIET_MS = 80

/** Waits until a page has asked for nothing for a little while, and its fonts are there. */
function createSettler(context: BrowserContext): (page: Page) => Promise<void> {
  let pending = 0
  let last = Date.now()
  const note = (by: number): void => {
    pending += by
    last = Date.now()
  }
  context.on('request', () => note(1))
  context.on('requestfinished', () => note(-1))
  context.on('requestfailed', () => note(-1))
  return async (page) => {
    await page.locator('h1').first().waitFor()
    while (pending > 0 || Date.now() - last < QUIET_MS) await page.waitForTimeout(20)
    await page.evaluate(() => document.fonts.ready)
  }
}

/** A person with a browser of their own. */
export async function visit(browser: Browser, options: VisitOptions = {}): Promise<Visit> {
  const { size = 'desk', night = false, width } = options
  const { address } = inject('site')
  const settings: BrowserContextOptions = {
    viewport: { ...SIZES[size], ...(width === undefined ? {} : { width }) },
    baseURL: address,
    locale: 'en-GB',
    colorScheme: night ? 'dark' : 'light',
    reducedMotion: 'reduce',
    hasTouch: size === 'phone',
  }
  const context = await browser.newContext(settings)
  context.setDefaultTimeout(15_000)
  const complaints = await listen(context)
  if (options.as !== undefined) {
    const reply = await context.request.post('/api/v1/session', {
      data: { email: options.as, password: passPhraseOf(options.as) },
      headers: { origin: address },
    })
    if (!reply.ok()) throw new Error(`${options.as} could not sign in: ${reply.status()}`)
  }
  const settle = createSettler(context)
  const page = await context.newPage()
  return {
    context,
    page,
    complaints,
    address,
    go: async (path) => {
      await page.goto(path)
      await settle(page)
    },
  }
}

const AXE = readFileSync(createRequire(import.meta.url).resolve('axe-core/axe.min.js'), 'utf8')

const RULES = ['wcag2a', 'wcag2aa', 'wcag21a', 'wcag21aa', 'wcag22aa', 'best-practice']

interface AxeWindow {
  axe: {
    run(
      root: Document,
      options: { runOnly: string[]; resultTypes: string[] },
    ): Promise<{
      violations: { id: string; nodes: { target: unknown[]; failureSummary?: string }[] }[]
    }>
  }
}

/** What axe finds wrong on a page, one line for every place. */
export async function axeViolations(page: Page): Promise<string[]> {
  await page.evaluate(AXE)
  return page.evaluate(async (rules) => {
    const { violations } = await (window as unknown as AxeWindow).axe.run(document, {
      runOnly: rules,
      // What passes is not gone into: it is never asked for.
      resultTypes: ['violations'],
    })
    return violations.flatMap((v) => v.nodes.map((n) => `${v.id}: ${n.target.join(' ')}`))
  }, RULES)
}
