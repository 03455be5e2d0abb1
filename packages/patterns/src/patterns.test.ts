import { checkModel } from '@coaxwain/models'
import { expect, it } from 'vitest'
import { ORDINARY_PARTS } from './index'

it.each(Object.entries(ORDINARY_PARTS))('%s holds together as a model', (_, model) => {
  expect(checkModel(model)).toEqual([])
})
