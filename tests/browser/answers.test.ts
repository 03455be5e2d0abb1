import type { Browser, Request } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ALDER_LANE, at, EXAMPLE_ANSWER, UNITS } from './addresses'
import { launchBrowser, PEOPLE, visit, type Visit, type VisitOptions } from './browser'

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

async function openAnswer(options: VisitOptions = {}): Promise<Visit> {
  const visitor = await visit(browser, { as: PEOPLE.owner, ...options })
  await visitor.go(EXAMPLE_ANSWER)
  await visitor.page.locator('.step-item').first().waitFor()
  return visitor
}

describe('the what-if list', () => {
  it('says of each switch what it would change, and stays in its place when one is thrown', async () => {
    const { page, context } = await openAnswer()
    const item = page.locator('.what-if li', { hasText: 'VM-2' })
    await item.scrollIntoViewIfNeeded()
    await item.getByText(/^Through the (?!Pellmere)/).waitFor()
    await item.getByRole('switch').click()
    await page.waitForURL(new RegExp(`avoid=${UNITS.modulator}`))
    await page.locator('.step-item', { hasText: 'VM-2' }).first().waitFor({ state: 'detached' })
    expect(await item.getByRole('switch').isChecked()).toBe(true)
    expect(await item.getByRole('switch').evaluate((e) => e === document.activeElement)).toBe(true)
    const box = await item.boundingBox()
    expect(box && box.y > 0 && box.y < 900).toBe(true)
    await context.close()
  })
})

describe('the comparison', () => {
  it('names what differs, says once what does not, and its rows choose', async () => {
    const { page, context } = await openAnswer()
    await page
      .getByRole('button', { name: /Compare all \d answers/ })
      .first()
      .click()
    const table = page.locator('.answer-compare table')
    const heads = await table.locator('thead th').allInnerTexts()
    for (const head of heads.slice(1)) {
      const column = heads.indexOf(head)
      const cells = await table
        .locator('tbody tr')
        .evaluateAll((rows, i) => rows.map((row) => row.children[i]?.textContent ?? ''), column)
      expect(new Set(cells).size).toBeGreaterThan(1)
    }
    const last = table.locator('tbody tr').last()
    const boxes = await last.locator('.compare-through').innerText()
    await last.click()
    await page.waitForURL(/[?&]n=/)
    expect(await page.locator('.answer-tab.is-chosen').innerText()).toContain(boxes)
    await context.close()
  })
})

describe('the sheet', () => {
  it('says what to look at when something else is seen, and is two pages at most for eight steps', async () => {
    const { page, context } = await openAnswer()
    await page.locator('.wrong-block tbody tr').first().waitFor()
    const rows = await page.locator('.wrong-block tbody tr').allInnerTexts()
    expect(rows.join('\n')).toMatch(/snow and hiss[^]*CH of the VM-2: it must be on channel [34]/)
    expect(rows.join('\n')).not.toMatch(/[{}]/)
    expect(await page.locator('.step-item').count()).toBe(8)
    const pdf = await page.pdf({ format: 'A4', preferCSSPageSize: true })
    const pages = pdf.toString('latin1').match(/\/Type \/Page\b(?!s)/g) ?? []
    expect([1, 2]).toContain(pages.length)
    await context.close()
  })
})

describe('who may only look', () => {
  it.each(['shelf/add', `shelf/${UNITS.player}/edit`, 'models/add'])(
    'gets no form at %s, but a word on who can change it and a way on',
    async (path) => {
      const visitor = await visit(browser, { as: PEOPLE.viewer })
      const { page, context } = visitor
      await visitor.go(at(ALDER_LANE, path))
      await page.getByRole('heading', { name: 'You can look, but not change' }).waitFor()
      expect(await page.locator('form').count()).toBe(0)
      expect(await page.locator('main').innerText()).toMatch(/viewer.*owner, collector, restorer/)
      await page
        .locator('main')
        .getByRole('link', { name: /^Look at/ })
        .first()
        .click()
      await page.waitForURL(new RegExp(`/${path.split('/')[0] ?? ''}$`))
      await context.close()
    },
  )
})

describe('a hookup that worked', () => {
  it('is noted on all its units by one request', async () => {
    const { page, context } = await openAnswer()
    const writes: string[] = []
    page.on('request', (request: Request) => {
      if (!['GET', 'HEAD'].includes(request.method())) writes.push(request.url())
    })
    await page.getByRole('button', { name: 'It worked' }).filter({ visible: true }).first().click()
    await page.locator('.worked-bar').getByText('everything that it used is tested').waitFor()
    expect(writes.filter((url) => !url.endsWith('/answers'))).toEqual([
      expect.stringMatching(/\/unit-states$/),
    ])
    await context.close()
  })
})
