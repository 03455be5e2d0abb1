import { checkModel, type Model } from '@coaxwain/models'
import { fitted, type Modification } from '@coaxwain/shelf'
import { AppError, type FieldTrouble } from '../app-error'
import { partKeys, type Part, type PartKey } from './parts'

/** Refuses a description that does not hold together, with every fault and its path. */
export function mustBeSound(document: Model): void {
  const errors = checkModel(document).map(({ code, details }) => ({
    path: `document.${details.path}`,
    code,
    details: { name: details.name },
  }))
  if (errors.length > 0) throw new AppError('model-unsound', { errors })
}

const LISTS: Readonly<Record<Part, string>> = {
  port: 'ports',
  jack: 'jacks',
  control: 'controls',
  function: 'functions',
}

const fault = ({ part, key }: PartKey, code: 'in-use' | 'used-before'): FieldTrouble => ({
  path: `document.${LISTS[part]}`,
  code,
  details: { name: key },
})

const word = ({ part, key }: PartKey): string => `${part} ${key}`

/**
 * What units or hookups name must stay, if only as retired; and a key that went once never comes back
 * for something else.
 */
export function mustKeepKeys(
  before: Model,
  after: Model,
  used: readonly PartKey[],
  ever: readonly PartKey[],
): void {
  const had = new Set(partKeys(before).map(word))
  const has = new Set(partKeys(after).map(word))
  const lost = used.filter((k) => had.has(word(k)) && !has.has(word(k)))
  if (lost.length > 0) {
    throw new AppError('part-in-use', { errors: lost.map((k) => fault(k, 'in-use')) })
  }
  const again = ever.filter((k) => has.has(word(k)) && !had.has(word(k)))
  if (again.length > 0) {
    throw new AppError('key-reused', { errors: again.map((k) => fault(k, 'used-before')) })
  }
}

/** Whatever was built into units must still make a whole with the new description. */
export function mustBearFittings(
  document: Model,
  fittings: readonly (readonly Modification[])[],
): void {
  if (document.type !== 'device') return
  const clashes = fittings.flatMap((modifications) =>
    checkModel(
      fitted(
        document,
        modifications.filter((m) => m.kind === 'added'),
      ),
    ),
  )
  const names = [...new Set(clashes.map(({ details }) => details.name))]
  if (names.length === 0) return
  throw new AppError('part-in-use', {
    errors: names.map((name) => ({
      path: 'document',
      code: 'clashes-with-fitting',
      details: { name },
    })),
  })
}
