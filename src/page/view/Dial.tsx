import { useRef } from 'preact/hooks'
import { fromPlain } from '../../units/quantity.js'

interface DialProps {
  readonly label: string
  /** Counter-clockwise from three o'clock as the viewer sees the screen. */
  readonly axisRad: number
  /** After which the axis is the same again. */
  readonly periodRad: number
  readonly onTurn: (axisRad: number, gesture?: string) => void
}

const DEGREE = Math.PI / 180
const SIZE_PX = 40
const RADIUS = 19
/** A hand on a pointer is no finer than this. */
const DRAG_STEP_DEG = 0.1

let gestures = 0

/** The axis of a film, turned by pointer (farther out is finer) or by arrow keys: 1°, with Shift 5°, with Alt 0.1°. */
export function Dial({ label, axisRad, periodRad, onTurn }: DialProps) {
  const grip = useRef<{ readonly offset: number; readonly gesture: string } | undefined>(undefined)
  const dial = useRef<HTMLDivElement>(null)
  const period = periodRad / DEGREE
  const shown = rounded(axisRad / DEGREE, 1e-6)

  const pointerAt = ({ clientX, clientY }: PointerEvent): number => {
    const box = dial.current?.getBoundingClientRect() ?? { left: 0, top: 0, width: 0, height: 0 }
    return Math.atan2(box.top + box.height / 2 - clientY, clientX - box.left - box.width / 2) / DEGREE
  }
  const turnTo = (degrees: number, gesture?: string): void =>
    onTurn(fromPlain(wrapped(degrees, period), 'angle'), gesture)
  const start = (event: PointerEvent): void => {
    dial.current?.setPointerCapture(event.pointerId)
    grip.current = { offset: shown - pointerAt(event), gesture: `drag ${++gestures}` }
  }
  const move = (event: PointerEvent): void => {
    if (grip.current === undefined) return
    turnTo(rounded(pointerAt(event) + grip.current.offset, DRAG_STEP_DEG), grip.current.gesture)
  }
  const release = (): void => {
    grip.current = undefined
  }
  const press = (event: KeyboardEvent): void => {
    const sense = SENSES[event.key]
    if (sense === undefined) return
    event.preventDefault()
    const step = event.altKey ? 0.1 : event.shiftKey || event.key.startsWith('Page') ? 5 : 1
    turnTo(rounded(shown + sense * step, 1e-6))
  }

  const [x, y] = [RADIUS * Math.cos(axisRad), -RADIUS * Math.sin(axisRad)]
  return (
    <div
      ref={dial}
      class="dial"
      role="slider"
      tabIndex={0}
      aria-label={label}
      aria-valuemin={0}
      aria-valuemax={period}
      aria-valuenow={shown}
      aria-valuetext={`${rounded(shown, 0.01)} degrees`}
      onPointerDown={start}
      onPointerMove={move}
      onPointerUp={release}
      onPointerCancel={release}
      onKeyDown={press}
    >
      <svg width={SIZE_PX} height={SIZE_PX} viewBox="-23 -23 46 46" aria-hidden="true">
        <circle class="dial-face" r={RADIUS + 2.5} />
        {TICKS.map((angle) => (
          <line key={angle} class="dial-tick" x1="17" x2="20.5" transform={`rotate(${-angle})`} />
        ))}
        <line class="dial-axis" x1={-x} y1={-y} x2={x} y2={y} />
        <circle class="dial-end" cx={x} cy={y} r="3.2" />
      </svg>
    </div>
  )
}

const TICKS = Array.from({ length: 12 }, (_, k) => 30 * k)
const SENSES: Readonly<Record<string, 1 | -1>> = {
  ArrowUp: 1,
  ArrowRight: 1,
  PageUp: 1,
  ArrowDown: -1,
  ArrowLeft: -1,
  PageDown: -1,
}

function wrapped(degrees: number, period: number): number {
  return rounded(((degrees % period) + period) % period, 1e-9)
}

function rounded(value: number, step: number): number {
  return Number((Math.round(value / step) * step).toPrecision(12))
}
