import type { Snapshot, Uid } from '@coaxwain/shelf'
import { fullName, type Lookup } from '../../format/lookup'
import { optionLine } from '../../format/option-line'
import type { Searchable } from '../../format/search'
import type { Speak } from '../../format/words'
import { PAGES, type PageName } from '../../router/names'

/** Something that the search box of the frame leads to. */
export interface SearchTarget extends Searchable {
  readonly value: string
  readonly label: string
  readonly note: string
  readonly page: PageName
  readonly params: Readonly<Record<string, string>>
}

/** Units first, with their places, then the models. */
export function searchTargets(
  snapshot: Snapshot,
  lookup: Lookup,
  numbers: ReadonlyMap<Uid, number>,
  say: Speak,
): SearchTarget[] {
  const units = snapshot.units.flatMap((unit): SearchTarget[] => {
    const model = snapshot.models[unit.model]
    if (!model) return []
    const kind = say(`kind.${model.kind}`)
    return [
      {
        value: unit.uid,
        label: fullName(model),
        note: optionLine(
          unit,
          kind,
          { device: lookup.device(unit.uid), number: numbers.get(unit.uid) },
          say,
        ),
        maker: model.maker,
        name: model.name,
        aliases: model.aliases,
        kind,
        place: unit.place,
        page: PAGES.unit,
        params: { unit: unit.uid },
      },
    ]
  })
  const models = Object.entries(snapshot.models).map(([uid, model]): SearchTarget => {
    const kind = say(`kind.${model.kind}`)
    return {
      value: `model ${uid}`,
      label: fullName(model),
      note: say('rail.search-model', { kind }),
      maker: model.maker,
      name: model.name,
      aliases: model.aliases,
      kind,
      page: PAGES.model,
      params: { model: uid },
    }
  })
  return [...units, ...models]
}
