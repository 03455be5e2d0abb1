import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import {
  ALDER_LANE,
  arrangementPath,
  at,
  EXAMPLE_ARRANGEMENT,
  MARRAM_ROW,
  UNITS,
} from './addresses'
import { axeViolations, launchBrowser, PEOPLE, SIZE_NAMES, visit } from './browser'

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

async function choose(page: Page, label: string, words: string, option: string): Promise<void> {
  const box = page.getByRole('combobox', { name: new RegExp(`^${label}( |$)`) })
  await box.click()
  await box.fill(words)
  await page.getByRole('option', { name: option }).filter({ visible: true }).first().click()
}

const click = (page: Page, name: string): Promise<void> =>
  page.getByRole('button', { name, exact: true }).filter({ visible: true }).first().click()

async function expectSound(page: Page): Promise<void> {
  const wide = await page.evaluate(
    () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
  )
  expect(wide).toBeLessThanOrEqual(0)
  expect(await axeViolations(page)).toEqual([])
  expect(await page.locator('main').innerText()).not.toMatch(/[{}[\]]/)
}

/** Numbers in the drawing of a card: those of its leads, and those of its controls. */
const drawn = async (page: Page, card: number): Promise<number[]> => {
  const numbers = page.locator('.use-card').nth(card).locator('.drawing-scroll .step-number text')
  return (await numbers.allTextContents()).map(Number)
}

describe.each(SIZE_NAMES.map((size) => ({ size })))('several ends at $size size', ({ size }) => {
  it('two players stay joined to one set: plugged once, each with positions of its own', async () => {
    const visitor = await visit(browser, { size, as: PEOPLE.viewer })
    const { page, context, complaints } = visitor
    await visitor.go(at(ALDER_LANE, 'hookups'))
    await choose(page, 'Source', 'DP-62', 'Tarnbeck DP-62')
    await choose(page, 'Set', 'CT-27', 'Quillmark CT-27')
    await page.getByRole('link', { name: /Wire them once/ }).click()
    await page.getByRole('heading', { level: 1, name: 'Several players or sets' }).waitFor()
    expect(await page.getByRole('combobox', { name: /^Player 1/ }).inputValue()).toMatch(/DP-62/)
    expect(await page.getByRole('combobox', { name: /^Set/ }).inputValue()).toMatch(/CT-27/)
    await choose(page, 'Player 2', 'GX', 'Varnhope GX')
    await click(page, 'Find an arrangement')

    const once = page.locator('.plug-once')
    await once.waitFor()
    expect(await page.locator('h1').innerText()).toMatch(/CT-27/)
    const steps = await once.locator('.step-sentence').allInnerTexts()
    expect(steps[0]).toMatch(/^1\.\s+Fetch/)
    expect(await once.locator('.step-lines').first().innerText()).toMatch(/DP-62[^]*GX|GX[^]*DP-62/)
    expect(steps.length).toBeGreaterThan(2)
    expect(await page.locator('.best-found').count()).toBe(0)

    const cards = page.locator('.use-card')
    expect(await cards.locator('h3').allInnerTexts()).toEqual([
      expect.stringMatching(/^To watch the .*DP-62$/),
      expect.stringMatching(/^To watch the .*GX$/),
    ])
    const power = await cards.locator('.use-power').allInnerTexts()
    expect(power[0]).toMatch(/On[^]*DP-62[^]*CT-27[^]*Left off[^]*GX/)
    expect(power[1]).toMatch(/On[^]*GX[^]*CT-27[^]*Left off[^]*DP-62/)
    const settings = await Promise.all(
      [0, 1].map((i) => cards.nth(i).locator('.setting-row').allInnerTexts()),
    )
    expect(settings[0]).not.toEqual(settings[1])
    for (const card of [0, 1]) {
      await cards.nth(card).locator('.expect-block strong').first().waitFor()
      const numbers = await drawn(page, card)
      const plugged = numbers.filter((n) => n <= steps.length)
      // The first step fetches; what is plugged and what is set carries the number of the lists.
      expect(plugged.length).toBeGreaterThan(0)
      expect(plugged).not.toContain(1)
      const rows = cards.nth(card).locator('.setting-row .setting-name .unseen')
      const listed = (await rows.allTextContents()).map((text) => Number.parseInt(text, 10))
      expect(new Set(numbers.filter((n) => n > steps.length))).toEqual(new Set(listed))
    }
    await expectSound(page)

    await once.locator('.step-tick').first().click()
    await page.reload()
    await once.waitFor()
    expect(await once.locator('.step-item.is-done').count()).toBe(1)

    await page.getByRole('link', { name: 'Change the question' }).click()
    await page.getByRole('heading', { level: 1, name: 'Several players or sets' }).waitFor()
    expect(await page.getByRole('combobox', { name: /^Player 2/ }).inputValue()).toMatch(/GX/)
    await click(page, 'Add another player')
    await choose(page, 'Player 3', 'GS-16', 'Oakhithe GS-16')
    await click(page, 'Find an arrangement')
    await page.locator('.best-found').waitFor()
    expect(await page.locator('.best-found').innerText()).toMatch(/^Best found\./)
    expect(await page.locator('.use-card').count()).toBe(3)
    expect(complaints).toEqual({ policy: [], errors: [] })
    await context.close()
  })

  it('one player feeds two sets at once, and nothing is left off', async () => {
    const visitor = await visit(browser, { size, night: true, as: PEOPLE.neighbour })
    const { page, context, complaints } = visitor
    await visitor.go(at(MARRAM_ROW, 'hookups/several'))
    await page.getByText('One player, several sets').click()
    await choose(page, 'Source', 'RV-22', 'Fennock RV-22')
    await choose(page, 'Set 1', 'S-25', 'Fennock S-25')
    await click(page, 'Find an arrangement')
    await page.getByText('Choose a set from your shelf.').waitFor()
    await choose(page, 'Set 2', 'S-25', 'Fennock S-25')
    await click(page, 'Find an arrangement')
    await page.getByText('This is chosen already.').waitFor()
    await expectSound(page)
    await choose(page, 'Set 2', 'CE-21', 'Lindrake CE-21')
    await click(page, 'Find an arrangement')
    const cards = page.locator('.use-card')
    await cards.first().waitFor()
    expect(await cards.locator('h3').allInnerTexts()).toEqual([
      expect.stringMatching(/^On the .*S-25$/),
      expect.stringMatching(/^On the .*CE-21$/),
    ])
    for (const power of await cards.locator('.use-power').allInnerTexts())
      expect(power).toMatch(/On[^]*RV-22[^]*Left off\s*Nothing/)
    await expectSound(page)
    expect(complaints).toEqual({ policy: [], errors: [] })
    await context.close()
  })
})

describe('an arrangement', () => {
  it('that cannot be is not left at that: each use can be asked for alone', async () => {
    const visitor = await visit(browser, { as: PEOPLE.owner })
    const { page, context } = visitor
    const sets = [UNITS.monitor, UNITS.otherMonitor]
    await visitor.go(arrangementPath(ALDER_LANE, [[UNITS.player, 'disc']], sets))
    const none = page.locator('.arrangement-none')
    await none.waitFor()
    expect(await none.getByRole('heading').innerText()).toMatch(/^Not all at once/)
    expect(await none.getByRole('link').count()).toBe(2)
    await none.getByRole('link').first().click()
    await page.getByRole('heading', { level: 1, name: /DP-62/ }).waitFor()
    await context.close()
  })

  it('whose address names several of both is not asked for', async () => {
    const visitor = await visit(browser, { as: PEOPLE.owner })
    await visitor.go(`${EXAMPLE_ARRANGEMENT}&display=${UNITS.set}`)
    await visitor.page.getByText('This address does not say what goes together').waitFor()
    await visitor.context.close()
  })
})
