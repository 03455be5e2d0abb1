import { readdirSync, readFileSync } from 'node:fs'
import { fileURLToPath } from 'node:url'
import { gzipSync } from 'node:zlib'
import { demoUid } from '@coaxwain/demo'
import { ORDINARY_PARTS } from '@coaxwain/patterns'
import type { Question } from '@coaxwain/shelf'
import type { Browser, Page, Request } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { tell } from '../support/long'
import { ALDER_LANE, EXAMPLE_ANSWER, PAGES, UNITS } from './addresses'
import { launchBrowser, PEOPLE, visit, type Visit, type VisitOptions } from './browser'

const MOST_BYTES = 60_000
const assets = fileURLToPath(new URL('../../apps/catalogue/dist/assets/', import.meta.url))

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

/** The worker's own file and everything that it names, however far down. */
function chunksOf(entry: string): string[] {
  const known = new Set([entry])
  for (const file of known) {
    const text = readFileSync(`${assets}${file}`, 'utf8')
    for (const name of readdirSync(assets)) {
      if (name.endsWith('.js') && text.includes(name)) known.add(name)
    }
  }
  return [...known]
}

const engineFile = (): string => {
  const [name, ...others] = readdirSync(assets).filter((f) => /^engine-.*\.js$/.test(f))
  if (name === undefined || others.length > 0) throw new Error('there must be one engine')
  return name
}

interface Heard {
  readonly workers: Worker[]
  readonly heard: { readonly kind: string; readonly id: number; readonly reply?: unknown }[]
}

/** Keeps what every worker of a page says. */
async function overhear({ page }: Visit): Promise<void> {
  await page.addInitScript(() => {
    const kept: Heard['heard'] = []
    const workers: Worker[] = []
    Object.assign(window, { heard: kept, workers })
    window.Worker = class extends Worker {
      constructor(address: string | URL, options?: WorkerOptions) {
        super(address, options)
        workers.push(this)
        this.addEventListener('message', (e) => kept.push(e.data as Heard['heard'][number]))
      }
    }
  })
}

const answersHeard = (page: Page): Promise<string[]> =>
  page.evaluate(() =>
    (window as unknown as Heard).heard
      .filter((m) => m.kind === 'answer')
      .map((m) => JSON.stringify(m.reply)),
  )

const TRIES = 6

/** The server's answer to a question that a page asked, once it does not run out of patience with it. */
async function servedInFull({ context, address }: Visit, asked: Request): Promise<string> {
  for (let tries = 0; tries < TRIES; tries += 1) {
    const reply = await context.request.post(asked.url(), {
      data: asked.postDataJSON() as unknown,
      headers: { origin: address },
    })
    const text = await reply.text()
    if ((JSON.parse(text) as { answer: { complete: boolean } }).answer.complete) return text
  }
  throw new Error('the server never got to the end of it')
}

const questionFor = (source: string, display: string): Question => ({
  format: 1,
  source: { unit: source, playing: 'disc' },
  material: { protection: 'none' },
  display: { unit: display },
  demands: { aim: 'watch' },
  avoid: [],
  offAir: [],
  assumedLeads: [],
})

interface Bench {
  readonly engine: string
  readonly shelf: string
  readonly parts: typeof ORDINARY_PARTS
  readonly long: Question
  readonly short: Question
}

/** Runs in the page: a long question answered as far as it gets, then called off at its first sign of life. */
async function askAndCallOff({ engine, shelf, parts, long, short }: Bench) {
  const worker = new Worker(engine, { type: 'module' })
  const said: { kind: string; id: number }[] = []
  const until = (id: number, kind: string): Promise<void> =>
    new Promise((resolve) => {
      const hear = ({ data }: MessageEvent<{ kind: string; id: number }>): void => {
        if (data.id !== id || data.kind !== kind) return
        worker.removeEventListener('message', hear)
        resolve()
      }
      worker.addEventListener('message', hear)
    })
  const saidOf = (id: number): string[] => said.filter((m) => m.id === id).map((m) => m.kind)
  worker.addEventListener('message', ({ data }) => said.push(data as (typeof said)[number]))
  const snapshot: unknown = await (await fetch(shelf)).json()
  worker.postMessage({ kind: 'shelf', snapshot, parts })
  const ask = (id: number, question: Question, patienceMs: number): void =>
    worker.postMessage({ kind: 'ask', id, question, patienceMs })

  const whole = until(1, 'answer')
  ask(1, long, 400)
  await whole

  const begun = until(2, 'progress')
  ask(2, long, 60_000)
  await begun
  const calledOffAt = performance.now()
  const next = until(3, 'answer')
  worker.postMessage({ kind: 'cancel', id: 2 })
  ask(3, short, 60_000)
  await next
  const stoppedAfterMs = performance.now() - calledOffAt
  const quiet = said.filter((m) => m.id === 2).length
  await new Promise((resolve) => setTimeout(resolve, 1000))
  return {
    whole: saidOf(1),
    calledOff: saidOf(2),
    saidLater: saidOf(2).length - quiet,
    next: saidOf(3),
    stoppedAfterMs,
  }
}

/** Runs in the page: how long after a click the sign comes, and whether it moves then. */
function signAfter(): Promise<{ ms: number; moves: boolean }> {
  return new Promise((resolve) => {
    let start = 0
    const look = (): void => {
      const mark = document.querySelector('.busy-sign .busy-mark')
      if (!mark) return void requestAnimationFrame(look)
      const ms = performance.now() - start
      const turn = (): string => getComputedStyle(mark).transform
      const first = turn()
      setTimeout(() => resolve({ ms, moves: turn() !== first }), 130)
    }
    const begin = (): void => {
      start = performance.now()
      look()
    }
    document.addEventListener('click', begin, { capture: true, once: true })
  })
}

describe('the engine beside the page', () => {
  it(`loads less than ${MOST_BYTES / 1000} kB, gzipped, with all the facts that it uses`, () => {
    const chunks = chunksOf(engineFile())
    const bytes = chunks.reduce((sum, f) => sum + gzipSync(readFileSync(assets + f)).length, 0)
    tell(`the worker loads ${bytes} bytes gzipped, in ${chunks.length} file(s)`)
    expect(bytes).toBeGreaterThan(20_000)
    expect(bytes).toBeLessThan(MOST_BYTES)
  })

  it.each([
    ['a hookup', EXAMPLE_ANSWER],
    ['no hookup', PAGES['no answer'] ?? ''],
    ['what would harm', PAGES['harmful wiring refused'] ?? ''],
  ])('gives %s without the network, letter for letter as the server did', async (_, address) => {
    const visitor = await visit(browser, { as: PEOPLE.owner })
    const { page, context } = visitor
    await overhear(visitor)
    const asked = page.waitForRequest((r) => r.url().endsWith('/answers'))
    await visitor.go(address)
    const expected = await servedInFull(visitor, await asked)
    await visitor.go(address.replace('/hookups/answer', '/hookups'))
    await page.waitForFunction(() => (window as unknown as Heard).workers.length === 1)
    await page.workers()[0]?.evaluate(() => true)
    await context.setOffline(true)
    await page.getByRole('button', { name: /^Find/ }).filter({ visible: true }).first().click()
    await page.locator('.away-note').waitFor()
    expect(await page.locator('.away-note').innerText()).toMatch(/on this device.*\d{1,2}:\d\d/)
    const [found, ...others] = await answersHeard(page)
    expect(others).toEqual([])
    expect(JSON.parse(found ?? 'null')).toEqual(JSON.parse(expected))
    expect(found).toBe(expected)
    await context.close()
  })

  it('gives up a long question as soon as it is called off, and answers the next', async () => {
    const visitor = await visit(browser, { as: PEOPLE.owner })
    await visitor.go(PAGES['help'] ?? '')
    const told = await visitor.page.evaluate(askAndCallOff, {
      engine: `/assets/${engineFile()}`,
      shelf: `/api/v1/collections/${ALDER_LANE}/snapshot`,
      parts: ORDINARY_PARTS,
      long: questionFor(demoUid('u-a-116'), demoUid('u-a-110')),
      short: questionFor(UNITS.player, UNITS.set),
    })
    expect(told.whole).toContain('progress')
    expect(told.whole.at(-1)).toBe('answer')
    expect(told.calledOff).toContain('progress')
    expect(told.calledOff).not.toContain('answer')
    expect(told.saidLater).toBe(0)
    expect(told.next).toContain('answer')
    expect(told.stoppedAfterMs).toBeLessThan(2000)
    await visitor.context.close()
  })
})

describe('the sign that something goes on', () => {
  const openAnswer = async (options: VisitOptions): Promise<Visit> => {
    const visitor = await visit(browser, { as: PEOPLE.owner, ...options })
    await visitor.page.emulateMedia({ reducedMotion: 'no-preference' })
    // An engine that never comes is the longest that a question can take.
    await visitor.page.route('**/assets/engine-*.js', async () => {
      await new Promise(() => undefined)
    })
    await visitor.page.goto(EXAMPLE_ANSWER)
    await visitor.page.locator('.step-item').first().waitFor()
    return visitor
  }

  it('comes after a while, moves, and can be stopped with the answer left as it was', async () => {
    const { page, context } = await openAnswer({ size: 'phone' })
    const waited = page.evaluate(signAfter)
    await page.getByRole('switch', { name: 'stereo matters' }).click()
    const { ms, moves } = await waited
    expect(ms).toBeGreaterThan(250)
    expect(ms).toBeLessThan(1500)
    expect(moves).toBe(true)
    await page.locator('.busy-sign').getByRole('button', { name: 'Stop' }).click()
    await page.locator('.busy-sign').waitFor({ state: 'detached' })
    expect(page.url()).not.toMatch(/stereo/)
    expect(await page.getByRole('switch', { name: 'stereo matters' }).isChecked()).toBe(false)
    expect(await page.locator('.step-item').count()).toBeGreaterThan(4)
    await context.close()
  })
})
