import { expect, test } from 'vitest'
import { hydrolysisMassGain, massYieldOf } from '../../../engine/kinetics/hydrolysis-gain.ts'
import { type MolarMass, quantity } from '../../../engine/units/quantity.ts'

const grams = (g: number): MolarMass => quantity<MolarMass>(g / 1000)

test.each([
  { what: 'a disaccharide of hexoses, such as lactose or sucrose', molarMass: 342.3, gain: 1.0526 },
  { what: 'starch to glucose, per anhydroglucose unit', molarMass: 162.14, gain: 1.1111 },
])('hydrolysis of $what gains what common practice has it gain', ({ molarMass, gain }) => {
  expect(hydrolysisMassGain(grams(molarMass))).toBeCloseTo(gain, 4)
})

test('the gain is what the products weigh', () => {
  const [lactose, glucose] = [grams(342.297), grams(180.156)]
  const both = massYieldOf(glucose, lactose, 1) + massYieldOf(glucose, lactose, 1)
  expect(hydrolysisMassGain(lactose)).toBeCloseTo(both, 12)
})

test('each bond that is split takes up a water', () => {
  const trisaccharide = grams(504.44)
  const one = hydrolysisMassGain(trisaccharide) - 1
  expect(hydrolysisMassGain(trisaccharide, 2) - 1).toBeCloseTo(2 * one, 14)
})
