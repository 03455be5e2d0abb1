import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { OPEN_PAGES, PAGES } from './addresses'
import { axeViolations, launchBrowser, PEOPLE, visit, type Visit } from './browser'

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

type Check = (page: Page) => Promise<string[]>

/** Visits every page once and names the pages on which some check found something. */
async function onEveryPage(
  visitor: Visit,
  pages: Readonly<Record<string, string>>,
  checks: readonly Check[],
): Promise<string[]> {
  const found: string[] = []
  for (const [name, path] of Object.entries(pages)) {
    await visitor.go(path)
    for (const check of checks) {
      found.push(...(await check(visitor.page)).map((text) => `${name}: ${text}`))
    }
  }
  return found
}

/** One heading of the first level, one main part, a language, and a title that says where one is. */
const headings: Check = (page) =>
  page.evaluate(() => {
    const count = (selector: string): number => document.querySelectorAll(selector).length
    const { title, documentElement } = document
    return [
      ...(count('h1') === 1 ? [] : [`${count('h1')} first headings`]),
      ...(count('main') === 1 ? [] : [`${count('main')} main parts`]),
      ...(documentElement.lang === 'en-GB' ? [] : [`language ${documentElement.lang}`]),
      ...(/\S+ · Coaxwain$/.test(title) ? [] : [`title ${title}`]),
    ]
  })

/** Buttons and fields of at least 24 by 24 pixels. */
const targets: Check = (page) =>
  page.evaluate(() =>
    [...document.querySelectorAll<HTMLElement>('button, select, input')].flatMap((e) => {
      const { width, height } = e.getBoundingClientRect()
      const shown = width > 1 && height > 1
      const inLabel = e.closest('label') !== null && e.matches('input')
      return shown && !inLabel && (width < 24 || height < 24)
        ? [`${e.className || e.tagName} ${width} x ${height}`]
        : []
    }),
  )

/** Nothing is cut under the text spacing of WCAG 1.4.12. */
const spacing: Check = (page) =>
  page.evaluate(() => {
    const sheet = new CSSStyleSheet()
    sheet.replaceSync(
      '* { line-height: 1.5 !important; letter-spacing: .12em !important; word-spacing: .16em !important }',
    )
    document.adoptedStyleSheets = [sheet]
    const words = document.querySelectorAll<HTMLElement>(
      'h1, h2, h3, p, li, dt, dd, td, label, button, strong',
    )
    const cut = [...words].filter((e) => {
      const aside = e.closest('.unseen, svg, [aria-hidden=true], .drawing-box, .panel-drawing')
      const hides = getComputedStyle(e).overflow === 'hidden'
      return aside === null && hides && e.scrollHeight > e.clientHeight + 2
    })
    document.adoptedStyleSheets = []
    return cut.map((e) => `cut: ${e.className} ${e.innerText.slice(0, 30)}`)
  })

/** At 320 pixels, as at a zoom of 400 %, nothing scrolls sideways. */
const reflow: Check = async (page) => {
  const before = page.viewportSize()
  await page.setViewportSize({ width: 320, height: 800 })
  const width = await page.evaluate(() => document.documentElement.scrollWidth)
  if (before) await page.setViewportSize(before)
  return width <= 320 ? [] : [`${width} wide at 320`]
}

/** The same page on the night bench, which must look different, and back again. */
const night: Check = async (page) => {
  const ground = (): Promise<string> =>
    page.evaluate(() => getComputedStyle(document.body).backgroundColor)
  const byDay = await ground()
  await page.emulateMedia({ colorScheme: 'dark' })
  await page.evaluate(() => Promise.allSettled(document.getAnimations().map((a) => a.finished)))
  const found = (await ground()) === byDay ? ['no night'] : await axeViolations(page)
  await page.emulateMedia({ colorScheme: 'light' })
  return found.map((text) => `by night: ${text}`)
}

describe.each([
  { size: 'desk', checks: [axeViolations, night, headings, spacing] },
  { size: 'phone', checks: [axeViolations, night, targets, reflow] },
] as const)('every page at $size size', ({ size, checks }) => {
  it('is found sound by day and by night, and breaks no content policy', async () => {
    const visitor = await visit(browser, { size, as: PEOPLE.owner })
    const stranger = await visit(browser, { size })
    expect(await onEveryPage(visitor, PAGES, checks)).toEqual([])
    expect(await onEveryPage(stranger, OPEN_PAGES, checks)).toEqual([])
    expect([visitor.complaints, stranger.complaints]).toEqual([
      { policy: [], errors: [] },
      { policy: [], errors: [] },
    ])
    await visitor.context.close()
    await stranger.context.close()
  })
})

interface State {
  readonly name: string
  readonly size: 'desk' | 'phone'
  readonly page: string
  readonly reach: (page: Page) => Promise<void>
}

const click = (page: Page, name: string): Promise<void> =>
  page.getByRole('button', { name }).filter({ visible: true }).first().click()

/** Pages as they look after something was done on them. */
const STATES: readonly State[] = [
  {
    name: 'a question without its two ends',
    size: 'desk',
    page: PAGES['hookups'] ?? '',
    reach: (page) => click(page, 'Find a hookup'),
  },
  {
    name: 'a search box with its list',
    size: 'phone',
    page: PAGES['hookups'] ?? '',
    reach: async (page) => {
      await page.getByRole('combobox', { name: 'Source' }).click()
      await page.getByRole('option').first().waitFor()
    },
  },
  {
    name: 'a model with gaps',
    size: 'phone',
    page: PAGES['add model'] ?? '',
    reach: async (page) => {
      await click(page, 'Add a socket')
      await click(page, 'It shows a picture')
      await click(page, 'Save the model')
    },
  },
  {
    name: 'the drawer of the bottom bar',
    size: 'phone',
    page: PAGES['shelf'] ?? '',
    reach: async (page) => {
      await page.getByRole('button', { name: 'More', exact: true }).click()
      await page.getByRole('dialog').waitFor()
    },
  },
  {
    name: 'a state that is being noted',
    size: 'desk',
    page: PAGES['unit'] ?? '',
    reach: (page) => click(page, 'Test the next socket'),
  },
  {
    name: 'all answers side by side',
    size: 'desk',
    page: PAGES['answer'] ?? '',
    reach: (page) => click(page, 'answers'),
  },
]

describe.each(STATES)('$name', ({ size, page: path, reach }) => {
  it.each([{ night: false }, { night: true }])(
    'is found sound, night bench $night',
    async ({ night }) => {
      const visitor = await visit(browser, { size, night, as: PEOPLE.owner })
      await visitor.go(path)
      await reach(visitor.page)
      expect(await axeViolations(visitor.page)).toEqual([])
      expect(visitor.complaints).toEqual({ policy: [], errors: [] })
      await visitor.context.close()
    },
  )
})

describe('a form with errors', () => {
  it('puts the focus on the first field that needs another look, and says why', async () => {
    const visitor = await visit(browser, { as: PEOPLE.owner })
    const { page } = visitor
    await visitor.go(PAGES['add model'] ?? '')
    await click(page, 'Save the model')
    const field = page.getByLabel('Maker')
    expect(await field.evaluate((e) => e === document.activeElement)).toBe(true)
    const words = await field.getAttribute('aria-describedby')
    expect(await page.locator(`#${words ?? ''}`).innerText()).toBe('This is needed.')
    await visitor.context.close()
  })
})

describe('titles', () => {
  it('tell pages apart', async () => {
    const visitor = await visit(browser, { as: PEOPLE.owner })
    const titles: string[] = []
    const some = ['hookups', 'answer', 'shelf', 'unit', 'models', 'model', 'add unit', 'help']
    for (const name of some) {
      await visitor.go(PAGES[name] ?? '')
      titles.push(await visitor.page.title())
    }
    expect(new Set(titles).size).toBe(some.length)
    await visitor.context.close()
  })
})
