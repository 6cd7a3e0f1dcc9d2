import { expect, test } from 'vitest'
import { formatNumber, formatNumberUp, formatQuantity, inUnit } from '../../../engine/units/display.ts'
import { nearest } from '../../../engine/units/nearest.ts'
import { celsius, hours, type Mass, quantity } from '../../../engine/units/quantity.ts'

test.each<[number, number, string]>([
  [0, 3, '0'],
  [-0, 3, '0'],
  [9.412, 3, '9.41'],
  [9.996, 3, '10'],
  [42, 3, '42'],
  [12345.6, 3, '12346'],
  [999999.4, 3, '999999'],
  [1234567, 3, '1.23e6'],
  [0.001, 3, '0.001'],
  [0.0123456, 3, '0.0123'],
  [0.00099, 3, '9.9e-4'],
  [-0.25, 3, '-0.25'],
  [1e-9, 1, '1e-9'],
  [95, 4, '95'],
  [100, 2, '100'],
])('%d with %d digits is %s', (value, digits, text) => {
  expect(formatNumber(value, digits)).toBe(text)
})

test.each<[number, string]>([
  [3.361, '3.37'],
  [3.3599999999, '3.36'],
  [3.3600000001, '3.36'],
  [9.994, '10'],
  [99.91, '100'],
  [1234.2, '1235'],
  [10, '10'],
  [0.01231, '0.0124'],
])('%d, which must be enough, is %s', (value, text) => {
  expect(formatNumberUp(value)).toBe(text)
})

test('a quantity is shown in the unit asked', () => {
  expect(formatQuantity(hours(9.412), 'time', 'h')).toBe('9.41 h')
  expect(formatQuantity(celsius(42), 'temperature', 'degC')).toBe('42 degC')
  expect(formatQuantity(quantity<Mass>(3.4), 'mass', 'g')).toBe('3400 g')
})

test('a temperature that was given in whole degrees comes back in whole degrees', () => {
  for (let degrees = -50; degrees <= 150; degrees++) {
    expect(inUnit(celsius(degrees), 'temperature', 'degC')).toBe(degrees)
  }
})

test('a unit of another dimension shows nothing', () => {
  expect(inUnit(hours(1), 'time', 'kg')).toBeUndefined()
})

test('the nearest known word is offered only when it is near', () => {
  const known = ['specificRate', 'activity', 'reference', 'Km', 'Kic', 'Kiu', 'Ksi', 'Keq']
  expect(nearest('specificrate', known)).toBe('specificRate')
  expect(nearest('refrence', known)).toBe('reference')
  expect(nearest('KM', known)).toBe('Km')
  expect(nearest('Kci', known)).toBe('Kic')
  expect(nearest('viscosity', known)).toBeUndefined()
  expect(nearest('x'.repeat(1000), known)).toBeUndefined()
})
