import { useEffect, useId, useState } from 'preact/hooks'
import type { ParameterInfo } from '../../stack/parameters.js'
import { formatQuantity, isFault, parseQuantity } from '../../units/quantity.js'

interface NumberFieldProps {
  readonly parameter: ParameterInfo
  readonly value: number
  readonly label: string
  /** Whether the label is seen, or only said. */
  readonly labelled?: boolean
  readonly onChange: (value: number) => void
}

/** Digits shown of a number that was computed; what was typed is kept as typed. */
const DIGITS = 6

/** A number with its unit; what is typed takes effect with Enter or on leaving the field. */
export function NumberField({ parameter, value, label, labelled = false, onChange }: NumberFieldProps) {
  const id = useId()
  const shown = formatQuantity(value, parameter.kind, DIGITS)
  const [text, setText] = useState(shown)
  const [fault, setFault] = useState('')
  useEffect(() => {
    setText(shown)
    setFault('')
  }, [shown])
  const accept = (): void => {
    if (text === shown) return
    const read = readWithin(text, parameter)
    if (typeof read === 'string') setFault(read)
    else {
      setFault('')
      setText(formatQuantity(read, parameter.kind, DIGITS))
      if (read !== value) onChange(read)
    }
  }
  const press = (event: KeyboardEvent): void => {
    if (event.key === 'Enter') accept()
    if (event.key !== 'Escape') return
    setText(shown)
    setFault('')
  }
  return (
    <div class="number">
      <label for={id} class={labelled ? '' : 'unseen'}>
        {label}
      </label>
      <input
        id={id}
        type="text"
        inputMode="decimal"
        autocomplete="off"
        spellcheck={false}
        value={text}
        data-path={parameter.path}
        aria-invalid={fault !== ''}
        aria-describedby={fault === '' ? undefined : `${id}-fault`}
        onInput={(event) => setText(event.currentTarget.value)}
        onBlur={accept}
        onKeyDown={press}
      />
      {fault !== '' && (
        <p id={`${id}-fault`} class="fault" role="alert">
          {fault}
        </p>
      )}
    </div>
  )
}

/** The value, or what is wrong with the text. */
function readWithin(text: string, { kind, range: [least, most] }: ParameterInfo): number | string {
  const value = parseQuantity(text, kind)
  if (isFault(value)) return `allowed: ${value.allowed}${value.hint === undefined ? '' : `; ${value.hint}`}`
  if (value >= least && value <= most) return value
  return `allowed: from ${formatQuantity(least, kind, 4)} to ${formatQuantity(most, kind, 4)}`
}
