import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ALDER_LANE, at, EXAMPLE_ANSWER, PAGES, UNITS } from './addresses'
import { launchBrowser, PEOPLE, visit, type Visit } from './browser'

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

interface Stop {
  readonly id: string
  readonly ring: boolean
  readonly covered: boolean
}

const MOST_STOPS = 260

/** Presses Tab from the top of a page until the focus leaves it. */
async function walk(page: Page): Promise<Stop[]> {
  const stops: Stop[] = []
  await page.evaluate(() => {
    ;(document.activeElement as HTMLElement | null)?.blur()
    let n = 0
    for (const e of document.querySelectorAll<HTMLElement>('*')) e.dataset['stop'] = String(n++)
  })
  for (let i = 0; i < MOST_STOPS; i++) {
    await page.keyboard.press('Tab')
    const stop = await page.evaluate(() => {
      const e = document.activeElement as HTMLElement | null
      if (!e || e === document.body) return null
      const ringed = (node: Element | null): boolean => {
        if (!node) return false
        const s = getComputedStyle(node)
        return s.outlineStyle !== 'none' && parseFloat(s.outlineWidth) >= 2
      }
      const near = [
        e,
        e.parentElement,
        e.nextElementSibling,
        e.closest('label'),
        e.closest('.el-input__wrapper'),
      ]
      const box = (
        e.matches('input[type=checkbox], input[type=radio]') ? (e.parentElement ?? e) : e
      ).getBoundingClientRect()
      const inside = box.top >= 0 && box.bottom <= innerHeight
      const points = [
        [box.left + 2, box.top + 2],
        [box.left + box.width / 2, box.top + box.height / 2],
        [box.right - 2, box.bottom - 2],
      ]
      const seen = points.some(([x = 0, y = 0]) => {
        const top = document.elementFromPoint(x, y)
        return (
          top !== null &&
          (top === e ||
            e.contains(top) ||
            top.contains(e) ||
            (e.closest('label')?.contains(top) ?? false) ||
            (e.parentElement?.contains(top) ?? false))
        )
      })
      e.dataset['stop'] ??= `later ${document.querySelectorAll('[data-stop]').length}`
      return { id: e.dataset['stop'] ?? '', ring: near.some(ringed), covered: inside && !seen }
    })
    if (stop === null || stops.some((s) => s.id === stop.id)) break
    stops.push(stop)
  }
  return stops
}

/** Everything on a page that a keyboard must reach, one radio of a group standing for all. */
const reachable = (page: Page): Promise<string[]> =>
  page.evaluate(() => {
    const groups = new Set<string>()
    return [
      ...document.querySelectorAll<HTMLElement>(
        'a[href], button, input, select, textarea, [tabindex="0"]',
      ),
    ]
      .filter((e) => {
        const shown = e.getClientRects().length > 0 && getComputedStyle(e).visibility !== 'hidden'
        const enabled = !(e as HTMLButtonElement).disabled && e.tabIndex >= 0
        if (e instanceof HTMLInputElement && e.type === 'radio') {
          if (groups.has(e.name)) return false
          groups.add(e.name)
          return true
        }
        return shown && enabled
      })
      .map((e) => e.dataset['stop'] ?? '')
  })

const open = async (size: 'desk' | 'phone', path: string): Promise<Visit> => {
  const visitor = await visit(browser, { size, as: PEOPLE.owner })
  await visitor.go(path)
  return visitor
}

describe('by keyboard alone', () => {
  it.each(['answer', 'hookups', 'shelf', 'unit', 'add model', 'models'])(
    'every control of the page "%s" is reached, shows where it is and is not covered',
    async (name) => {
      const visitor = await open('desk', PAGES[name] ?? '')
      const stops = await walk(visitor.page)
      const wanted = await reachable(visitor.page)
      const met = new Set(stops.map((s) => s.id))
      const missing = wanted.slice(0, MOST_STOPS - 20).filter((id) => !met.has(id))
      expect(missing).toEqual([])
      expect(stops.filter((s) => !s.ring).length).toBe(0)
      expect(stops.filter((s) => s.covered).length).toBe(0)
      await visitor.context.close()
    },
  )

  it('nothing with the focus lies under the dock or the bar of a phone', async () => {
    const visitor = await open('phone', EXAMPLE_ANSWER)
    const stops = await walk(visitor.page)
    expect(stops.length).toBeGreaterThan(10)
    expect(stops.filter((s) => s.covered)).toEqual([])
    await visitor.context.close()
  })

  it('the first stop skips to the page, and a new page puts the focus on its heading', async () => {
    const visitor = await open('desk', at(ALDER_LANE, 'shelf'))
    const { page } = visitor
    await page.keyboard.press('Tab')
    expect(await page.evaluate(() => document.activeElement?.textContent)).toBe('Skip to the page')
    await page.keyboard.press('Enter')
    expect(await page.evaluate(() => document.activeElement?.tagName)).toBe('H1')
    await page.getByRole('link', { name: 'Models', exact: true }).click()
    await page.getByRole('heading', { name: 'Models', level: 1 }).waitFor()
    await page.waitForFunction(() => document.activeElement?.tagName === 'H1')
    expect(await page.title()).toMatch(/^Models/)
    await visitor.context.close()
  })

  it('a search box is worked by arrows, Enter and Escape', async () => {
    const visitor = await open('desk', at(ALDER_LANE, 'hookups'))
    const { page } = visitor
    const box = page.getByRole('combobox', { name: 'Source' })
    await box.focus()
    await page.keyboard.type('dp-62')
    expect(await box.getAttribute('aria-expanded')).toBe('true')
    await page.keyboard.press('Escape')
    expect(await box.getAttribute('aria-expanded')).toBe('false')
    await page.keyboard.type('ld-8')
    await page.keyboard.press('ArrowDown')
    await page.keyboard.press('ArrowUp')
    await page.keyboard.press('Enter')
    expect(await box.inputValue()).toBe('Tarnbeck LD-8')
    await visitor.context.close()
  })

  it('the slash key leads to the search, and the search to a unit', async () => {
    const visitor = await open('desk', at(ALDER_LANE, 'models'))
    const { page } = visitor
    await page.keyboard.press('/')
    await page.keyboard.type('tarnbek dp62')
    await page.getByRole('option').first().waitFor()
    await page.keyboard.press('Enter')
    await page.waitForURL(/\/shelf\//)
    await page.getByRole('heading', { level: 1, name: 'Tarnbeck DP-62' }).waitFor()
    await visitor.context.close()
  })
})

describe('the drawing', () => {
  it('says no more than the list: every join and setting of it is a step', async () => {
    const visitor = await open('desk', EXAMPLE_ANSWER)
    const { page } = visitor
    await page.locator('.drawing-scroll .step-number').first().waitFor()
    const drawn = await page
      .locator('.drawing-scroll .step-number text')
      .evaluateAll((texts) =>
        [...new Set(texts.map((t) => Number(t.textContent)))].sort((a, b) => a - b),
      )
    const listed = await page
      .locator('.step-item')
      .evaluateAll((items) => items.map((_, i) => i + 1))
    expect(drawn.length).toBeGreaterThan(4)
    expect(drawn.filter((n) => !listed.includes(n))).toEqual([])
    expect(listed.slice(1).filter((n) => !drawn.includes(n))).toEqual([])
    await visitor.context.close()
  })

  it('has words that do not overlap as they are really set', async () => {
    const visitor = await open('desk', EXAMPLE_ANSWER)
    const clashes = await visitor.page.evaluate(() => {
      const boxes = [...document.querySelectorAll<SVGTextElement>('.drawing-scroll text')].map(
        (t) => ({
          words: t.textContent ?? '',
          box: t.getBoundingClientRect(),
        }),
      )
      return boxes.flatMap((a, i) =>
        boxes.slice(i + 1).flatMap((b) => {
          const dx = Math.min(a.box.right, b.box.right) - Math.max(a.box.left, b.box.left)
          const dy = Math.min(a.box.bottom, b.box.bottom) - Math.max(a.box.top, b.box.top)
          return dx > 1 && dy > 6 ? [`${a.words} / ${b.words}`] : []
        }),
      )
    })
    expect(clashes).toEqual([])
    await visitor.context.close()
  })

  it('prints on the sheet with every setting, in black', async () => {
    const visitor = await open('desk', EXAMPLE_ANSWER)
    const { page } = visitor
    await page.emulateMedia({ media: 'print' })
    const colours = await page.evaluate(() => {
      const probe = document.createElement('span')
      document.body.append(probe)
      return ['--ink', '--amber', '--cable-v', '--panel'].map((token) => {
        probe.style.color = `var(${token})`
        return getComputedStyle(probe).color
      })
    })
    const [black, white] = ['rgb(0, 0, 0)', 'rgb(255, 255, 255)']
    expect(colours).toEqual([black, black, white, white])
    expect(await page.locator('.print-only .drawing').isVisible()).toBe(true)
    expect(await page.locator('.bottom-bar').isVisible()).toBe(false)
    await visitor.context.close()
  })
})

describe('what is typed', () => {
  it('outlives a reload and a session that has ended', async () => {
    const visitor = await open('desk', at(ALDER_LANE, `shelf/${UNITS.monitor}/edit`))
    const { page } = visitor
    await page.getByLabel('Note').fill('hums when cold')
    await page.reload({ waitUntil: 'networkidle' })
    expect(await page.getByLabel('Note').inputValue()).toBe('hums when cold')
    await page.context().clearCookies()
    await page
      .getByRole('button', { name: 'Save', exact: true })
      .filter({ visible: true })
      .first()
      .click()
    await page.waitForURL(/sign-in/)
    await page.getByText('You were signed out').waitFor()
    await visitor.context.close()
  })
})
