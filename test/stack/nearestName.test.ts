import { expect, it } from 'vitest'
import { nearestName } from '../../src/stack/nearestName.js'

const KNOWN = ['slow_axis', 'retardance', 'thickness', 'nz', 'rth']

it.each([
  ['slow_axes', 'slow_axis'],
  ['retardence', 'retardance'],
  ['Thickness', 'thickness'],
  ['thicknses', 'thickness'],
  ['zn', 'nz'],
  ['color', undefined],
  ['x', undefined],
  ['', undefined],
])('for %j suggests %s', (name, wanted) => {
  expect(nearestName(name, KNOWN)).toBe(wanted)
})

it('takes no time over a very long name', () => {
  expect(nearestName('slow_axis'.repeat(100_000), KNOWN)).toBeUndefined()
})
