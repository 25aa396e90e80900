import { sheetHeightPx, thicknessText } from '../../report/html/sheetHeight.js'
import type { ParameterInfo } from '../../stack/parameters.js'
import type { Layer } from '../../stack/stack.js'
import type { Values } from '../engine/messages.js'
import { Dial } from './Dial.js'
import { NumberField } from './NumberField.js'

interface SheetProps {
  readonly layer: Layer
  readonly parameters: readonly ParameterInfo[]
  readonly values: Values
  readonly selected: boolean
  readonly onSelect: () => void
  readonly onSet: (changes: Values, gesture?: string) => void
}

/** One layer edge-on: as high as its thickness says, with a dial for its axis and the number that goes with it. */
export function Sheet({ layer, parameters, values, selected, onSelect, onSet }: SheetProps) {
  const own = parameters.filter(({ path }) => path.startsWith(`${layer.id}.`))
  const find = (field: string) => own.find(({ path }) => path === `${layer.id}.${field}`)
  const present = ({ path, value }: ParameterInfo): number => values[path] ?? value
  const thickness = find('thickness')
  const retardance = find('retardance')
  const turns = layer.kind !== 'retarder' || (retardance !== undefined && present(retardance) !== 0)
  const axis = turns ? AXES.map(find).find((found) => found !== undefined) : undefined
  const thicknessNm = thickness === undefined ? layer.thickness : present(thickness)
  const shown = turns ? [axis, retardance].filter((found) => found !== undefined) : []
  return (
    <div
      class={`sheet ${layer.kind}`}
      style={{ height: `${HAND_ROOM_PX + sheetHeightPx(thicknessNm)}px` }}
      aria-current={selected}
    >
      <span class="thickness">{thicknessText(thicknessNm)}</span>
      <button type="button" class="sheet-name" aria-expanded={selected} onClick={onSelect}>
        {layer.id.replaceAll('_', ' ')}
      </button>
      {axis !== undefined && (
        <Dial
          label={`${layer.id} axis`}
          axisRad={present(axis)}
          periodRad={axis.period ?? Math.PI}
          onTurn={(axisRad, gesture) => onSet({ [axis.path]: axisRad }, gesture)}
        />
      )}
      <div class="sheet-numbers">
        {shown.map((parameter) => (
          <NumberField
            key={parameter.path}
            parameter={parameter}
            value={present(parameter)}
            label={parameter.path}
            onChange={(value) => onSet({ [parameter.path]: value })}
          />
        ))}
      </div>
    </div>
  )
}

/** More than on paper, so that a dial has room in the thinnest coating. */
const HAND_ROOM_PX = 10

const AXES = ['slow_axis', 'absorption_axis', 'azimuth'] as const
