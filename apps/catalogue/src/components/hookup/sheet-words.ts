import { stepsOf, type Hookup, type HookupStep, type Setting, type Snapshot } from '@coaxwain/shelf'

/** What a step asks for, whatever the language and its number. */
export const stepKey = ({ say, lines }: HookupStep): string => JSON.stringify([say, lines])

export const settingKey = ({ unit, control, position }: Setting): string =>
  `${unit} ${control} ${position}`

/** Everything that a sheet asks for, so that the next one can show what is new. */
export const sheetKeys = (hookup: Hookup, snapshot: Snapshot): ReadonlySet<string> =>
  new Set([...stepsOf(hookup, snapshot).map(stepKey), ...hookup.settings.map(settingKey)])
