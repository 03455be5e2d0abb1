import { deviceModel, toFieldErrors } from '@coaxwain/contract'
import { checkModel, type DeviceModel } from '@coaxwain/models'
import type { FieldFaults } from '../../composables/use-form'
import type { ModelForm } from './model-form'

const required = (path: string) => ({ path, code: 'required', details: {} })

/** What a person has left out, before anything is judged. */
function gaps(form: ModelForm): FieldFaults {
  return [
    ...(form.maker.trim() === '' ? [required('maker')] : []),
    ...(form.name.trim() === '' ? [required('name')] : []),
    ...(form.kind === '' ? [required('kind')] : []),
    ...form.sockets.flatMap((s, i) => [
      ...(s.label.trim() === '' ? [required(`ports.${i}.label`)] : []),
      ...(s.use === '' ? [required(`ports.${i}.circuits`)] : []),
      ...(s.connector === '' ? [required(`ports.${i}.connector`)] : []),
    ]),
    ...form.controls.flatMap((c, i) => [
      ...(c.label.trim() === '' ? [required(`controls.${i}.label`)] : []),
      ...(c.kind === 'positions' && c.positions.trim() === ''
        ? [required(`controls.${i}.positions`)]
        : []),
    ]),
    ...form.does.flatMap((d, i) => [
      ...(d.label.trim() === '' ? [required(`functions.${i}.label`)] : []),
      ...(d.kind !== 'plays' && d.input === '' ? [required(`functions.${i}.needs`)] : []),
      ...(d.kind !== 'shows' && d.outputs.length === 0 ? [required(`functions.${i}.gives`)] : []),
    ]),
  ]
}

/** Every fault of a form: gaps first, then what the schema refuses, then what does not hold together. */
export function modelFaults(form: ModelForm, model: DeviceModel): FieldFaults {
  const missing = gaps(form)
  if (missing.length > 0) return missing
  const parsed = deviceModel.safeParse(JSON.parse(JSON.stringify(model)), { reportInput: true })
  if (!parsed.success) return toFieldErrors(parsed.error)
  return checkModel(model).map(({ code, details }) => ({
    path: details.path,
    code,
    details: { name: details.name },
  }))
}
