import type { Browser, Page } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ALDER_LANE, at, EXAMPLE_ANSWER } from './addresses'
import { axeViolations, launchBrowser, PEOPLE, SIZE_NAMES, visit } from './browser'

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

const CHECK = at(ALDER_LANE, 'hookups/check')

async function choose(page: Page, label: string, words: string, option: string): Promise<void> {
  const box = page.getByRole('combobox', { name: new RegExp(`^${label}( |$)`) }).last()
  await box.click()
  await box.fill(words)
  await page.getByRole('option', { name: option }).filter({ visible: true }).first().click()
}

interface Entered {
  readonly from?: readonly [words: string, option: string]
  readonly fromPort: string
  readonly leads: readonly string[]
  readonly to?: readonly [words: string, option: string]
  readonly toPort: string
}

/** Takes the choice of a list that begins with some words. */
async function pick(page: Page, link: number, label: string, begins: string): Promise<void> {
  const fields = page.getByRole('group', { name: `Link ${link}`, exact: true })
  const list = fields.getByLabel(label, { exact: true }).last()
  const options = await list.locator('option').allInnerTexts()
  const option = options.find((o) => o.startsWith(begins))
  if (option === undefined) throw new Error(`${label} has no ${begins}: ${options.join(' | ')}`)
  await list.selectOption({ label: option })
}

async function addLink(page: Page, link: number, entered: Entered): Promise<void> {
  await page.getByRole('button', { name: 'Add a link' }).filter({ visible: true }).first().click()
  if (entered.from) await choose(page, 'From', ...entered.from)
  await pick(page, link, 'Socket', entered.fromPort)
  for (const [i, lead] of entered.leads.entries())
    await pick(page, link, i === 0 ? 'Lead or adapter' : 'Then through', lead)
  if (entered.to) await choose(page, 'To', ...entered.to)
  await pick(page, link, 'Socket there', entered.toPort)
}

const VM2 = ['VM-2', 'VM-2'] as const
const DP62 = ['DP-62', 'Tarnbeck DP-62'] as const
const SET = ['ostrel 14', 'Ostrel 14-C'] as const

/** Waits until the check has answered to what was entered last. */
async function settled(page: Page, link: number, word: string): Promise<string> {
  const fields = page.getByRole('group', { name: `Link ${link}`, exact: true })
  await fields.locator(`.verdict-mark.is-${word}`).waitFor()
  return fields.locator('.link-says').innerText()
}

describe.each(SIZE_NAMES.map((size) => ({ size })))('a chain at $size size', ({ size }) => {
  it('is entered link by link, judged at once, set right and drawn', async () => {
    const visitor = await visit(browser, { size, as: PEOPLE.viewer })
    const { page, context, complaints } = visitor
    await visitor.go(at(ALDER_LANE, 'hookups'))
    await page.getByRole('link', { name: /Wired something already/ }).click()
    await page.getByRole('heading', { level: 1, name: 'Check a hookup' }).waitFor()
    await choose(page, 'Source', ...DP62)
    await choose(page, 'Set', ...SET)

    await addLink(page, 1, {
      fromPort: 'VIDEO',
      leads: ['3-way phono lead'],
      to: VM2,
      toPort: 'VIDEO',
    })
    expect(await settled(page, 1, 'right')).toMatch(/^right$/)
    await page.locator('.check-strip').getByText('no further than the VM-2').waitFor()

    await addLink(page, 2, {
      fromPort: 'TO TV',
      leads: ['F lead'],
      to: SET,
      toPort: 'VHF',
    })
    expect(await settled(page, 2, 'wrong')).toMatch(
      /do not go together: F plug and 300 Ω terminals/,
    )
    await pick(page, 2, 'Then through', '75/300 transformer, F socket to lugs')
    await settled(page, 2, 'right')
    expect(await page.locator('.check-strip').innerText()).toMatch(
      /This can work[^]*colour[^]*silence/i,
    )

    const modulator = page.locator('.switch-fields', { hasText: 'VM-2' })
    await modulator.getByText(/Set CH.* of the VM-2 to 3/).waitFor()
    await page.locator('.check-drawing .drawing').first().waitFor()
    await modulator.getByLabel('CH', { exact: false }).first().selectOption('4')
    await page
      .locator('.switch-fields', { hasText: '14-C' })
      .getByText(/Set VHF of the 14-C to 4/)
      .waitFor()

    const wide = await page.evaluate(
      () => document.documentElement.scrollWidth - document.documentElement.clientWidth,
    )
    expect(wide).toBeLessThanOrEqual(0)
    expect(await axeViolations(page)).toEqual([])
    expect(await page.locator('main').innerText()).not.toMatch(/[{}]/)

    await page.reload()
    await settled(page, 2, 'right')
    await page.getByRole('button', { name: 'Remove link 2' }).click()
    await page.locator('.check-strip').getByText('no further than the VM-2').waitFor()
    expect(complaints).toEqual({ policy: [], errors: [] })
    await context.close()
  })
})

describe('an answer', () => {
  it('is opened to be wired differently, and one link turned round is wrong at once', async () => {
    const visitor = await visit(browser, { as: PEOPLE.owner, night: true })
    const { page, context } = visitor
    await visitor.go(EXAMPLE_ANSWER)
    await page.getByRole('button', { name: 'Wire it differently' }).click()
    await page.locator('.check-strip').waitFor()
    expect(await page.locator('.check-strip h2').innerText()).not.toMatch(/does not work/)
    expect(await page.locator('.link-fields .verdict-mark.is-wrong').count()).toBe(0)
    const first = page.getByRole('group', { name: 'Link 1', exact: true })
    const list = first.getByLabel('Socket there', { exact: true })
    const out = (await list.locator('option').allInnerTexts()).find((o) => o.startsWith('TO TV'))
    await list.selectOption({ label: out ?? '' })
    await first.locator('.verdict-mark.is-wrong').waitFor()
    await page.locator('.check-strip').getByText('This does not work as it is wired').waitFor()
    expect(await axeViolations(page)).toEqual([])
    await context.close()
  })
})

describe('by keyboard alone', () => {
  it('a link is added and its first list has the focus', async () => {
    const visitor = await visit(browser, { as: PEOPLE.owner })
    const { page, context } = visitor
    await visitor.go(CHECK)
    const source = page.getByRole('combobox', { name: /^Source/ })
    await source.focus()
    await page.keyboard.type('DP-62')
    await page.keyboard.press('Enter')
    await page.getByRole('button', { name: 'Add a link' }).filter({ visible: true }).focus()
    await page.keyboard.press('Enter')
    await page.getByRole('group', { name: 'Link 1', exact: true }).waitFor()
    const focused = await page.evaluate(() => {
      const e = document.activeElement
      return e instanceof HTMLSelectElement ? (e.labels[0]?.innerText ?? '') : (e?.tagName ?? '')
    })
    expect(focused).toBe('Socket')
    await context.close()
  })
})
