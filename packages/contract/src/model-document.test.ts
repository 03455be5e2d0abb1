import { DEMO } from '@coaxwain/demo'
import { channelsOf, PLAN_IDS } from '@coaxwain/signal'
import { expect, test } from 'vitest'
import { modelDocument, planPart } from './model-document'

const models = Object.entries(DEMO.models)

test('every model of the demonstration passes and comes out as it went in', () => {
  expect(models.length).toBeGreaterThan(20)
  for (const [uid, model] of models) {
    const found = modelDocument.safeParse(model)
    expect(found.error?.issues ?? [], uid).toEqual([])
    expect(found.data).toEqual(model)
  }
})

test('a field that nobody knows is refused, at any depth', () => {
  const device = models.map(([, m]) => m).find((m) => m.type === 'device')
  if (device?.type !== 'device') throw new Error('no device in the demo data')
  const [first, ...rest] = device.ports
  expect(modelDocument.safeParse({ ...device, owner: 1 }).success).toBe(false)
  expect(modelDocument.safeParse({ ...device, ports: [{ ...first, x: 1 }, ...rest] }).success).toBe(
    false,
  )
})

test('every channel of every plan can be named, a span of millions cannot', () => {
  const names = (plan: string, text: string) => planPart.safeParse({ plan, names: text }).success
  for (const plan of PLAN_IDS) {
    for (const { name } of channelsOf(plan)) expect(names(plan, name), name).toBe(true)
  }
  expect(names('us-broadcast', '14..69')).toBe(true)
  expect(names('us-broadcast', '1..999999999')).toBe(false)
})
