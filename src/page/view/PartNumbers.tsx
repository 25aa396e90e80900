import type { ParameterInfo } from '../../stack/parameters.js'
import type { Values } from '../engine/messages.js'
import { NumberField } from './NumberField.js'

interface PartNumbersProps {
  /** Of the layer, or `panel`. */
  readonly id: string
  readonly parameters: readonly ParameterInfo[]
  readonly values: Values
  readonly onSet: (changes: Values) => void
}

/** Every number of one part of the stack. */
export function PartNumbers({ id, parameters, values, onSet }: PartNumbersProps) {
  const own = parameters.filter(({ path }) => path.startsWith(`${id}.`))
  return (
    <fieldset class="part-numbers">
      <legend class="unseen">all numbers of {id}</legend>
      {own.map((parameter) => (
        <NumberField
          key={parameter.path}
          parameter={parameter}
          value={values[parameter.path] ?? parameter.value}
          label={parameter.path.slice(id.length + 1).replaceAll('_', ' ')}
          labelled
          onChange={(value) => onSet({ [parameter.path]: value })}
        />
      ))}
    </fieldset>
  )
}
