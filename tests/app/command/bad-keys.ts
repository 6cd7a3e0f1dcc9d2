/** Scenarios whose keys or phases do not go together, each with the lines that say so. */
import { type BadInputCase, changed, dose, hold, phases } from './bad-inputs.ts'

/** What is wrong with the keys and how they go together. */
export const badKeys: readonly BadInputCase[] = [
  {
    what: 'an unknown key near a known one',
    input: changed('"Km"', '"KM"'),
    lines: [
      'enzyme.rate.Km: is missing; write a concentration as a text with its unit, such as "8 g/L" (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
      'enzyme.rate.KM: the key "KM" is not known here; the nearest known one is "Km"',
    ],
  },
  {
    what: 'an unknown key near none',
    input: changed('"volume"', '"colour": "red", "volume"'),
    lines: ['feed.colour: the key "colour" is not known here; known here: volume, substrate, product'],
  },
  {
    what: '__proto__',
    input: changed('"find": "time"', '"find": "time", "__proto__": { "polluted": 1 }'),
    lines: ['ask.__proto__: the key "__proto__" is not known here; known here: find, conversion'],
  },
  {
    what: 'a key missing',
    input: changed('"Km": "8 g/L", ', ''),
    lines: [
      'enzyme.rate.Km: is missing; write a concentration as a text with its unit, such as "8 g/L" (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
    ],
  },
  {
    what: 'nothing asked',
    input: changed(',\n  "ask": { "find": "time", "conversion": 0.9 }', ''),
    lines: ['ask: is missing; ask must be an object that says what to find'],
  },
  {
    what: 'an unknown ask',
    input: changed('"find": "time"', '"find": "tiem"'),
    lines: [
      'ask.find: found "tiem"; perhaps time is meant; this version answers "time", "dose", "temperature" and "trace"',
    ],
  },
  {
    what: 'two rates',
    input: changed(
      '"specificRate"',
      '"activity": { "declared": "5000 U/g", "assay": { "temperature": "37 degC", "pH": 6.5 } }, "specificRate"',
    ),
    lines: ['enzyme.rate: exactly one of specificRate and activity is due; found specificRate and activity'],
  },
  {
    what: 'no rate',
    input: changed('"specificRate": "95 g/g/h", ', ''),
    lines: ['enzyme.rate: exactly one of specificRate and activity is due; found neither'],
  },
  {
    what: 'kd and a half-life',
    input: changed('"kd": "0.08 1/h"', '"kd": "0.08 1/h", "halfLife": "8.7 h"'),
    lines: ['enzyme.inactivation: exactly one of kd, halfLife and D is due; found kd and halfLife'],
  },
  {
    what: 'molar concentrations without a molar mass',
    input: changed('"molarMass": "342.3 g/mol", "concentration": "45 g/L"', '"concentration": "130 mmol/L"'),
    lines: [
      'feed.substrate.molarMass: is missing; feed.substrate.concentration, given in moles, needs it, such as "342.3 g/mol"',
    ],
  },
  {
    what: 'two programmes',
    input: changed('"dose": "3.5 kg" }', '"dose": "3.5 kg", "phases": [] }'),
    lines: [
      'programme: found temperature, pH and dose of the short form beside phases; give the short form, or start and phases',
    ],
  },
  {
    what: 'time without a dose',
    input: changed(', "dose": "3.5 kg"', ''),
    lines: [
      'programme.dose: is missing; "find": "time" needs the dose, such as "3.5 kg" ("find": "dose" asks for it)',
    ],
  },
  {
    what: 'no phases',
    input: phases(),
    lines: ['programme.phases: found an empty list; at least a dose is due'],
  },
  {
    what: 'a hold before any dose',
    input: phases('{ "phase": "hold", "for": "2 h" }', dose),
    lines: [
      'programme.phases[0]: a hold before any dose, at the temperature of the start, does nothing; give the dose before it',
    ],
  },
  {
    what: 'a hold for a conversion before any dose',
    input: phases('{ "phase": "hold", "until": { "conversion": 0.5 }, "atMost": "2 h" }', dose),
    lines: ['programme.phases[0].until: waits for a conversion before any dose is given'],
  },
  {
    what: 'a kill step before any dose',
    input: phases('{ "phase": "inactivate", "to": "85 degC", "hold": "10 min" }', dose),
    lines: [
      'programme.phases[0]: a kill step comes before any dose is given',
      'programme.phases[1]: a dose follows the kill step, which has ended the reaction',
    ],
  },
  {
    what: 'no dose at all',
    input: phases(hold),
    lines: ['programme.phases: no phase gives a dose; at least one { "phase": "dose" } is due'],
  },
  {
    what: 'heating down',
    input: phases(dose, '{ "phase": "heat", "to": "5 degC", "ramp": "1 K/min" }', hold),
    lines: ['programme.phases[1].to: 5 degC is below the 10 degC in force; heat goes up; to go down, cool'],
  },
  {
    what: 'cooling up',
    input: phases(dose, '{ "phase": "cool", "to": "50 degC" }', hold),
    lines: ['programme.phases[1].to: 50 degC is above the 10 degC in force; cool goes down; to go up, heat'],
  },
  {
    what: 'a phase after the kill step',
    input: phases(dose, hold, '{ "phase": "inactivate", "to": "85 degC", "hold": "10 min" }', dose),
    lines: ['programme.phases[3]: a dose follows the kill step, which has ended the reaction'],
  },
  {
    what: 'an unknown phase',
    input: phases(dose, '{ "phase": "hodl", "for": "6 h" }'),
    lines: [
      'programme.phases[1].phase: found "hodl"; perhaps hold is meant; the phases are heat, dose, hold, feed, adjust, inactivate, cool',
    ],
  },
  {
    what: 'a hold that never ends',
    input: phases(dose, '{ "phase": "hold", "until": { "conversion": 0.9 } }'),
    lines: ['programme.phases[1].atMost: is missing; write the longest the hold may take, such as "12 h"'],
  },
  {
    what: 'a hold with two ends',
    input: phases(dose, '{ "phase": "hold", "for": "1 h", "until": { "conversion": 0.9 }, "atMost": "2 h" }'),
    lines: [
      'programme.phases[1]: found for beside until or atMost; a hold has one end: for, or until with atMost',
    ],
  },
  {
    what: 'a ramp without time',
    input: phases('{ "phase": "heat", "to": "42 degC", "ramp": "0.5 K" }', dose, hold),
    lines: [
      'programme.phases[0].ramp: found "0.5 K", where K is a unit of temperature; a ramp is due here (units that fit: K/min, degC/min, K/h, degC/h)',
    ],
  },
  {
    what: 'an amount of the wrong kind in a phase',
    input: phases('{ "phase": "dose", "amount": "3.5 L" }', hold),
    lines: [
      'programme.phases[0].amount: found "3.5 L", where L is a unit of volume; a mass is due here (units that fit: kg, g, mg, t)',
    ],
  },
  {
    what: 'temperatures in the wrong order',
    input: changed(
      '"find": "time", "conversion": 0.9',
      '"find": "temperature", "best": "time", "conversion": 0.9, "between": ["60 degC", "25 degC"]',
    ),
    lines: ['ask.between: found 60 degC before 25 degC; between goes from the lower to the higher'],
  },
  {
    what: 'several faults at once',
    input: changed('"45 g/L"', '45').replace('"12 m3"', '"12"').replace('0.9 }', '2 }'),
    lines: [
      'feed.volume: found "12" without a unit; write a volume as "12 m3" (units that fit: m3, L, mL)',
      'feed.substrate.concentration: found the bare number 45 where a unit is due; write a concentration as a text with its unit, such as "45 g/L" (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
      'ask.conversion: found 2; the conversion must be a plain number above 0 and below 1',
    ],
  },
]
