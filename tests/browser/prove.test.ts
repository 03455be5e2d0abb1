import { demoUid } from '@coaxwain/demo'
import type { Browser } from 'playwright-core'
import { afterAll, beforeAll, describe, expect, it } from 'vitest'
import { ALDER_LANE, at } from './addresses'
import { axeViolations, launchBrowser, PEOPLE, SIZE_NAMES, visit } from './browser'

let browser: Browser

beforeAll(async () => {
  browser = await launchBrowser()
})

afterAll(async () => {
  await browser.close()
})

/** Of each one output is untested, and a set that is known to work takes it. */
const UNTRIED = {
  desk: {
    unit: demoUid('u-a-127'),
    chain: 'Test chain 1: Oakhithe GS-16 to',
    what: 'Aerial signal (RF)',
  },
  phone: { unit: demoUid('u-a-131'), chain: 'Test chain 1: Brindlow HC-8 to', what: 'S-Video' },
} as const

/** A monitor of which two inputs can be tried, and others cannot. */
const MONITOR = demoUid('u-a-112')

describe.each(SIZE_NAMES.map((size) => ({ size })))(
  'what is untested at $size size',
  ({ size }) => {
    it('is tried by a test chain, and the verdict is noted with one press', async () => {
      const { unit, chain, what } = UNTRIED[size]
      const visitor = await visit(browser, { size, as: PEOPLE.owner })
      const { page, context, complaints } = visitor
      await visitor.go(at(ALDER_LANE, `shelf/${unit}`))
      const box = page.locator('.prove-box')
      await box.getByRole('button', { name: 'Find test chains' }).click()
      await box.getByRole('heading', { level: 3, name: chain }).waitFor()
      expect(await box.locator('.trial-verdict li').allInnerTexts()).toEqual([what])
      expect(await box.locator('.step-item').count()).toBeGreaterThan(0)
      expect(await axeViolations(page)).toEqual([])

      const row = page.locator('.evidence-item').filter({ hasText: what })
      expect(await row.locator('.with-mark').innerText()).toMatch(/untested/i)
      await box.getByRole('button', { name: 'Picture is good' }).click()
      await row.locator('.with-mark').filter({ hasText: /works/i }).waitFor()
      await box.waitFor({ state: 'detached' })
      expect(complaints).toEqual({ policy: [], errors: [] })
      await context.close()
    })

    it('is said to wait where something else is missing, and is no more than looked at by a viewer', async () => {
      const visitor = await visit(browser, { size, as: PEOPLE.viewer })
      const { page, context, complaints } = visitor
      await visitor.go(at(ALDER_LANE, `shelf/${MONITOR}`))
      const box = page.locator('.prove-box')
      await box.getByRole('button', { name: 'Find test chains' }).click()
      await box.getByRole('heading', { level: 3, name: 'Cannot be tried now' }).waitFor()
      expect(await box.locator('.prove-left').innerText()).toContain('known to work')
      expect(await box.locator('.proof-card').count()).toBe(2)
      expect(await box.locator('.trial-buttons').count()).toBe(0)
      expect(complaints).toEqual({ policy: [], errors: [] })
      await context.close()
    })
  },
)
