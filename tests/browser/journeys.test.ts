import type { Browser, Page } from 'playwright-core'
import { afterAll, afterEach, beforeAll, beforeEach, describe, expect, it } from 'vitest'
import { ALDER_LANE, at, MARRAM_ROW, UNITS } from './addresses'
import { launchBrowser, PEOPLE, SIZE_NAMES, visit, type Size, type Visit } from './browser'

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

/** Types in a search box until one choice is left, and takes it. */
async function choose(page: Page, label: string, words: string, option: string): Promise<void> {
  const box = page.getByRole('combobox', { name: label })
  await box.click()
  await box.fill(words)
  await page.getByRole('option', { name: option }).first().click()
}

async function press(page: Page, name: string): Promise<void> {
  await page.getByRole('button', { name, exact: true }).filter({ visible: true }).first().click()
}

/** Asks as a person does: two search boxes and one button. */
async function ask(
  visitor: Visit,
  collection: string,
  source: readonly [words: string, option: string],
  display: readonly [words: string, option: string],
): Promise<Page> {
  const { page } = visitor
  await visitor.go(at(collection, 'hookups'))
  await choose(page, 'Source', source[0], source[1])
  await choose(page, 'Set', display[0], display[1])
  return page
}

const sentences = (page: Page): Promise<string[]> =>
  page.locator('.step-item').evaluateAll((items) => items.map((i) => (i as HTMLElement).innerText))

const settings = (page: Page): Promise<string[]> =>
  page
    .locator('.setting-row')
    .evaluateAll((rows) => rows.map((r) => (r as HTMLElement).innerText.replaceAll('\n', ' ')))

describe.each(SIZE_NAMES.map((size) => ({ size })))('at $size size', ({ size }: { size: Size }) => {
  let visitor: Visit

  beforeEach(async ({ task }) => {
    const as = task.name.includes('recorder') ? PEOPLE.neighbour : PEOPLE.owner
    visitor = await visit(browser, { size, as })
  })

  afterEach(async () => {
    expect(visitor.complaints).toEqual({ policy: [], errors: [] })
    await visitor.context.close()
  })

  it('a disc player reaches a set with 300 ohm terminals, with every switch named', async () => {
    const page = await ask(
      visitor,
      ALDER_LANE,
      ['tarnbek dp62', 'Tarnbeck DP-62'],
      ['ostrel 14', 'Ostrel 14-C'],
    )
    await press(page, 'Find a hookup')
    await page.locator('.step-item').first().waitFor()
    const steps = await sentences(page)
    expect(steps[0]).toMatch(/Fetch, with everything off/)
    expect(steps[0]).toMatch(/VM-2: Loft/)
    expect(steps.join('\n')).toMatch(/75\/300 transformer/)
    const rows = await settings(page)
    expect(rows.join('\n')).toMatch(/VM-2, CH.* [34]/)
    expect(rows.join('\n')).toMatch(/VM-2, VIDEO IN.*75 Ω/)
    expect(rows.join('\n')).toMatch(/14-C, VHF.* [34]/)
    expect(await page.locator('.drawing').first().getAttribute('aria-label')).toMatch(
      /numbered steps/,
    )
  })

  it('an answer is saved, opened again and found to be changed since', async () => {
    const page = await ask(
      visitor,
      ALDER_LANE,
      ['DP-62', 'Tarnbeck DP-62'],
      ['ostrel 14', 'Ostrel 14-C'],
    )
    await press(page, 'Find a hookup')
    await page.locator('.step-item').first().waitFor()
    if (size === 'phone') await tickAll(page)
    await press(page, 'It worked')
    await page.locator('.worked-bar').getByText('everything that it used is tested').waitFor()
    await press(page, 'Save hookup')
    await page.getByText('still right').waitFor()
    const kept = page.url()
    const unit = at(ALDER_LANE, `shelf/${UNITS.modulator}`)
    await visitor.go(unit)
    await noteState(page, 'Composite, in', 'intermittent')
    await visitor.go(kept)
    expect(await page.locator('.page-line').innerText()).toMatch(/changed since/)
    expect(await page.locator('.page-line').innerText()).toMatch(/VM-2/)
    await visitor.go(unit)
    await noteState(page, 'Composite, in', 'works')
  })

  it('a recorder stands in for a modulator, with its warning on protected discs', async () => {
    const page = await ask(
      visitor,
      MARRAM_ROW,
      ['DV-200', 'Fennock DV-200'],
      ['U-17', 'Fennock U-17'],
    )
    await press(page, 'Find a hookup')
    await page.locator('.step-item').first().waitFor()
    expect((await sentences(page)).join('\n')).toMatch(/RV-22/)
    expect(await page.locator('.caution-box').first().innerText()).toMatch(
      /Protected discs and tapes will not play properly through the RV-22/,
    )
    await page.getByRole('link', { name: 'Change the question' }).click()
    await page.getByLabel('Copy protection').selectOption('agc-pulses')
    await press(page, 'Find a hookup')
    await page.getByRole('heading', { name: 'Not with what is on this shelf' }).waitFor()
    expect(await page.locator('.obstacle-list').innerText()).toMatch(/protected.*RV-22/)
    expect(await page.locator('.purchase-list').innerText()).toMatch(/With UHF modulator/)
  })

  it('a converter box reaches a pocket set by its channel and a plug-on adapter', async () => {
    const page = await ask(
      visitor,
      ALDER_LANE,
      ['selvane cb', 'Selvane CB-3'],
      ['belloway pv', 'Belloway PV-9'],
    )
    await press(page, 'Find a hookup')
    await page.locator('.step-item').first().waitFor()
    const steps = (await sentences(page)).join('\n')
    expect(steps).toMatch(/F socket to 3.5 mm plug/)
    expect((await settings(page)).join('\n')).toMatch(/CB-3, CH.* [34]/)
  })

  it('a 31 kHz computer gets an honest no with the two facts that clash', async () => {
    const page = await ask(visitor, ALDER_LANE, ['MD-4', 'Mistrand MD-4'], ['M-21', 'Jorvane M-21'])
    await press(page, 'Find a hookup')
    await page.getByRole('heading', { name: 'Not with what is on this shelf' }).waitFor()
    const reasons = await page.locator('.obstacle-list').innerText()
    expect(reasons).toMatch(/MD-4/)
    expect(reasons).toMatch(/M-21/)
    expect(reasons).toMatch(/31/)
    expect(reasons).not.toMatch(/[{}]/)
  })

  it('an obvious but harmful wiring is refused before anything else is shown', async () => {
    const page = await ask(
      visitor,
      ALDER_LANE,
      ['DP-62', 'Tarnbeck DP-62'],
      ['19-L', 'Ostrel 19-L'],
    )
    await press(page, 'Find a hookup')
    await page.getByRole('heading', { name: 'Do not do this' }).waitFor()
    const box = page.locator('.harm-box')
    expect(await box.innerText()).toMatch(/19-L/)
    expect(await box.innerText()).not.toMatch(/[{}]/)
    const order = await page.evaluate(() => {
      const harm = document.querySelector('.harm-box')
      const rest = document.querySelector('.hookup-sheet, .answer-none')
      return harm && rest
        ? harm.compareDocumentPosition(rest) & Node.DOCUMENT_POSITION_FOLLOWING
        : 0
    })
    expect(order).not.toBe(0)
  })

  it('a model of one’s own is described, put on the shelf, and its dead socket is avoided', async () => {
    const { page } = visitor
    const name = `QX-${size === 'desk' ? 1 : 2}`
    await visitor.go(at(ALDER_LANE, 'models/add'))
    await page.getByLabel('Maker', { exact: false }).first().fill('Farrant')
    await page.getByLabel('Type', { exact: false }).first().fill(name)
    await page.locator('.identity-fields').getByLabel('Kind').selectOption('disc-player')
    await addSocket(page, 1, { label: 'VIDEO 1', use: 'composite', heading: '' })
    await addSocket(page, 2, { label: 'VIDEO 2', use: 'composite', heading: '' })
    await addSocket(page, 3, { label: 'L', use: 'sound-left', heading: 'SOUND' })
    await addSocket(page, 4, { label: 'R', use: 'sound-right', heading: 'SOUND' })
    await page.getByRole('button', { name: 'It plays something' }).click()
    await page.getByLabel('In a few words').fill('Plays discs')
    for (const box of await page.locator('.does-outputs label').all()) await box.click()
    await press(page, 'Save the model')
    await page.getByRole('heading', { name: `Farrant ${name}` }).waitFor()

    await press(page, 'Add a unit of it')
    await page.getByRole('heading', { name: 'Add a unit' }).waitFor()
    await press(page, 'Put it on the shelf')
    await page.getByRole('heading', { name: `Farrant ${name}` }).waitFor()
    await noteState(page, 'Composite', 'dead')

    await visitor.go(at(ALDER_LANE, 'hookups'))
    await choose(page, 'Source', `farant ${name}`, `Farrant ${name}`)
    await choose(page, 'Set', 'ostrel 14', 'Ostrel 14-C')
    await press(page, 'Find a hookup')
    await page.locator('.step-item').first().waitFor()
    const steps = (await sentences(page)).join('\n')
    expect(steps).toMatch(new RegExp(`${name} VIDEO 2`))
    expect(steps).not.toMatch(/VIDEO 1/)
  })
})

/** On a phone the dock leads through the steps; saving comes after the last. */
async function tickAll(page: Page): Promise<void> {
  const count = await page.locator('.step-item').count()
  for (let i = 1; i <= count; i++) await press(page, `Step ${i} is done`)
}

async function addSocket(
  page: Page,
  number: number,
  socket: { label: string; use: string; heading: string },
): Promise<void> {
  await page.getByRole('button', { name: 'Add a socket' }).click()
  const fields = page
    .locator('.part-list')
    .first()
    .locator('.socket-fields')
    .nth(number - 1)
  await fields.getByLabel('Printed label').fill(socket.label)
  await fields.getByLabel('Carries').selectOption(socket.use)
  await fields.getByLabel('Under the heading').fill(socket.heading)
}

/** Notes what was found on the first form of that name. */
async function noteState(page: Page, form: string, state: string): Promise<void> {
  const item = page.locator('.evidence-item', { hasText: form }).first()
  await item.locator('.evidence-face').click()
  await item.getByLabel('State', { exact: true }).selectOption(state)
  await item.getByRole('button', { name: 'Save' }).click()
  await item.locator('form').waitFor({ state: 'detached' })
  await item.getByText(state, { exact: true }).first().waitFor()
}
