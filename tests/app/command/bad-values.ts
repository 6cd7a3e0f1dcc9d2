/** Scenarios with one value wrong, each with the line that says where and what would fit. */
import { type BadInputCase, changed } from './bad-inputs.ts'

/** What is wrong with one value. */
export const badValues: readonly BadInputCase[] = [
  {
    what: 'no unit',
    input: changed('"45 g/L"', '"45"'),
    lines: [
      'feed.substrate.concentration: found "45" without a unit; write a concentration as "45 g/L" (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
    ],
  },
  {
    what: 'a bare number',
    input: changed('"45 g/L"', '45'),
    lines: [
      'feed.substrate.concentration: found the bare number 45 where a unit is due; write a concentration as a text with its unit, such as "45 g/L" (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
    ],
  },
  {
    what: 'a unit of the wrong dimension',
    input: changed('"45 g/L"', '"45 degC"'),
    lines: [
      'feed.substrate.concentration: found "45 degC", where degC is a unit of temperature; a concentration is due here (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
    ],
  },
  {
    what: 'an unknown unit',
    input: changed('"42 degC"', '"42 °C"'),
    lines: [
      'programme.temperature: found "42 °C", where "°C" is not a known unit; perhaps degC is meant; units that fit: degC, K',
    ],
  },
  {
    what: 'a decimal comma',
    input: changed('"0.08 1/h"', '"0,08 1/h"'),
    lines: [
      'enzyme.inactivation.kd: found "0,08 1/h" with a decimal comma; write a point, as in "0.08 1/h", and no grouping of thousands (units that fit: 1/h, 1/min, 1/s, 1/d)',
    ],
  },
  {
    what: 'a negative dose',
    input: changed('"3.5 kg"', '"-3.5 kg"'),
    lines: ['programme.dose: found "-3.5 kg"; the dose, given at time 0, must be above 0'],
  },
  {
    what: 'no dose to speak of',
    input: changed('"3.5 kg"', '"0 kg"'),
    lines: ['programme.dose: found "0 kg"; the dose, given at time 0, must be above 0'],
  },
  {
    what: 'a negative Km',
    input: changed('"Km": "8 g/L"', '"Km": "-8 g/L"'),
    lines: ['enzyme.rate.Km: found "-8 g/L"; Km must be above 0'],
  },
  {
    what: 'below absolute zero',
    input: changed('"42 degC"', '"-300 degC"'),
    lines: [
      'programme.temperature: found "-300 degC"; the temperature held throughout must be above absolute zero (-273.15 degC)',
    ],
  },
  {
    what: 'pH 15',
    input: changed('"pH": 6.7, "dose"', '"pH": 15, "dose"'),
    lines: ['programme.pH: found 15; the pH held throughout must be a plain number from 0 to 14'],
  },
  {
    what: 'pH as a text',
    input: changed('"pH": 6.7, "dose"', '"pH": "6.7", "dose"'),
    lines: ['programme.pH: found "6.7"; the pH held throughout must be a plain number from 0 to 14'],
  },
  {
    what: '1e999',
    input: changed('0.5263', '1e999'),
    lines: [
      'feed.product.massYield: found a number beyond the range of doubles; the mass of product per mass of substrate must be a plain number above 0',
    ],
  },
  {
    what: '1e999 with a unit',
    input: changed('"45 g/L"', '"1e999 g/L"'),
    lines: [
      'feed.substrate.concentration: found "1e999 g/L", which is not a finite number; write a concentration as "45 g/L" (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
    ],
  },
  {
    what: 'NaN with a unit',
    input: changed('"45 g/L"', '"NaN g/L"'),
    lines: [
      'feed.substrate.concentration: found "NaN g/L", which is not a finite number; write a concentration as "45 g/L" (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
    ],
  },
  {
    what: 'conversion 1',
    input: changed('0.9 }', '1 }'),
    lines: ['ask.conversion: found 1; the conversion must be a plain number above 0 and below 1'],
  },
  {
    what: 'conversion 0',
    input: changed('0.9 }', '0 }'),
    lines: ['ask.conversion: found 0; the conversion must be a plain number above 0 and below 1'],
  },
  {
    what: 'conversion in percent',
    input: changed('0.9 }', '90 }'),
    lines: ['ask.conversion: found 90; the conversion must be a plain number above 0 and below 1'],
  },
  {
    what: 'a volume of nothing',
    input: changed('"12 m3"', '"0 m3"'),
    lines: ['feed.volume: found "0 m3"; the volume charged must be above 0'],
  },
  {
    what: 'another format',
    input: changed('dosewright-scenario', 'dosewright-data'),
    lines: ['format: found "dosewright-data"; a scenario file says "dosewright-scenario"'],
  },
  {
    what: 'another version',
    input: changed('"version": 1', '"version": 2'),
    lines: ['version: found 2; this program reads version 1'],
  },
  {
    what: 'null for a value',
    input: changed('"12 m3"', 'null'),
    lines: [
      'feed.volume: found null; write a volume as a text with its unit, such as "12 m3" (units that fit: m3, L, mL)',
    ],
  },
]
