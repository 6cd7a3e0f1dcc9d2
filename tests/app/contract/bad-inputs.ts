/** Inputs that are wrong, each with the fault lines it gives, whole. */
import { edited, type Json, phased, shortForm } from './scenarios.ts'

type Edit = readonly [path: string, value: Json | undefined]

const short = (...edits: Edit[]): string => JSON.stringify(edited(shortForm(), ...edits))
const phases = (...edits: Edit[]): string => JSON.stringify(edited(phased(), ...edits))
const list = 'programme.phases'
const activity = (declared: string): Json => ({ declared, assay: { temperature: '37 degC', pH: 6.5 } })
const withActivity = (declared: string, ...edits: Edit[]): string =>
  short(['enzyme.rate.specificRate', undefined], ['enzyme.rate.activity', activity(declared)], ...edits)
const seriesStep: Json = { kd: '1 1/h', at: '40 degC', z: '6 K', residual: 0.5 }

/** What is wrong, the text, and its fault lines. */
export const badInputs: readonly (readonly [name: string, text: string, faults: readonly string[]])[] = [
  [
    'a bare number where a unit is due',
    short(['feed.volume', 12]),
    [
      'feed.volume: found the bare number 12 where a unit is due; write a volume as a text with its unit, such as "12 m3" (units that fit: m3, L, mL)',
    ],
  ],
  [
    'a unit of another dimension',
    short(['feed.volume', '12 kg']),
    [
      'feed.volume: found "12 kg", where kg is a unit of mass; a volume is due here (units that fit: m3, L, mL)',
    ],
  ],
  [
    'a unit in another spelling',
    short(['feed.volume', '12 m³']),
    [
      'feed.volume: found "12 m³", where "m³" is not a known unit; perhaps m3 is meant; units that fit: m3, L, mL',
    ],
  ],
  [
    'a degree without deg',
    short(['programme.temperature', '42 C']),
    [
      'programme.temperature: found "42 C", where "C" is not a known unit; perhaps degC is meant; units that fit: degC, K',
    ],
  ],
  [
    'a unit nobody knows',
    short(['feed.volume', '12 barrels']),
    ['feed.volume: found "12 barrels", where "barrels" is not a known unit; units that fit: m3, L, mL'],
  ],
  [
    'a decimal comma',
    short(['programme.dose', '3,5 kg']),
    [
      'programme.dose: found "3,5 kg" with a decimal comma; write a point, as in "3.5 kg", and no grouping of thousands (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a number without a unit',
    short(['programme.dose', '3.5']),
    ['programme.dose: found "3.5" without a unit; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)'],
  ],
  [
    'an empty quantity',
    short(['programme.dose', '']),
    [
      'programme.dose: found "", which does not begin with a number; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a unit before its number',
    short(['programme.dose', 'kg 3.5']),
    [
      'programme.dose: found "kg 3.5", which does not begin with a number; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a number that is none',
    short(['programme.dose', 'NaN kg']),
    [
      'programme.dose: found "NaN kg", which is not a finite number; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'an infinite number',
    short(['programme.dose', 'Infinity kg']),
    [
      'programme.dose: found "Infinity kg", which is not a finite number; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a number beyond doubles',
    short(['programme.dose', '1e999 kg']),
    [
      'programme.dose: found "1e999 kg", which is not a finite number; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a number too near to 0',
    short(['programme.dose', '1e-400 kg']),
    [
      'programme.dose: found "1e-400 kg", which is too near to 0 to be held as a double; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a number that vanishes in SI',
    short(['programme.dose', '5e-324 g']),
    [
      'programme.dose: found "5e-324 g", which is too near to 0 to be held as a double; write a mass as "3.5 kg" (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a number without a digit before the point',
    short(['programme.dose', '.5 kg']),
    [
      'programme.dose: found ".5 kg", where ".5" is not written as a plain number; write a mass as "3.5 kg", with digits on both sides of the point and no grouping (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'grouped thousands',
    short(['programme.dose', '1 200 kg']),
    [
      'programme.dose: found "1 200 kg", where "1 200" is not written as a plain number; write a mass as "3.5 kg", with digits on both sides of the point and no grouping (units that fit: kg, g, mg, t)',
    ],
  ],
  [
    'a trailing space',
    short(['programme.dose', '3.5 kg ']),
    [
      'programme.dose: found "3.5 kg ", where "kg " is not a known unit; perhaps kg is meant; units that fit: kg, g, mg, t',
    ],
  ],
  [
    'control characters in a quantity',
    short(['programme.dose', '3.5 \u001b[31mkg\n']),
    [
      'programme.dose: found "3.5 \\u001b[31mkg\\u000a", where "\\u001b[31mkg\\u000a" is not a known unit; units that fit: kg, g, mg, t',
    ],
  ],
  [
    'a very long quantity',
    short(['programme.dose', `3.5 ${'kg'.repeat(400)}`]),
    [
      'programme.dose: found "3.5 kgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkg…", where "kgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkgkg…" is not a known unit; units that fit: kg, g, mg, t',
    ],
  ],
  [
    'no dose at all',
    short(['programme.dose', '0 kg']),
    ['programme.dose: found "0 kg"; the dose, given at time 0, must be above 0'],
  ],
  [
    'a negative concentration',
    short(['feed.substrate.concentration', '-45 g/L']),
    ['feed.substrate.concentration: found "-45 g/L"; the concentration of substrate charged must be above 0'],
  ],
  [
    'a negative product',
    short(['feed.product.concentration', '-1 g/L']),
    ['feed.product.concentration: found "-1 g/L"; the concentration of product charged must be at least 0'],
  ],
  [
    'absolute zero',
    short(['programme.temperature', '-273.15 degC']),
    [
      'programme.temperature: found "-273.15 degC"; the temperature held throughout must be above absolute zero (-273.15 degC)',
    ],
  ],
  [
    'a pH as text',
    short(['programme.pH', '6.7']),
    ['programme.pH: found "6.7"; the pH held throughout must be a plain number from 0 to 14'],
  ],
  [
    'a pH above 14',
    short(['programme.pH', 15]),
    ['programme.pH: found 15; the pH held throughout must be a plain number from 0 to 14'],
  ],
  [
    'a ramp that is a temperature',
    phases([`${list}[0].ramp`, '0.5 K']),
    [
      'programme.phases[0].ramp: found "0.5 K", where K is a unit of temperature; a ramp is due here (units that fit: K/min, degC/min, K/h, degC/h)',
    ],
  ],
  [
    'a conversion of 1',
    short(['ask.conversion', 1]),
    ['ask.conversion: found 1; the conversion must be a plain number above 0 and below 1'],
  ],
  [
    'a conversion of 0',
    short(['ask.conversion', 0]),
    ['ask.conversion: found 0; the conversion must be a plain number above 0 and below 1'],
  ],
  [
    'a conversion in percent',
    short(['ask.conversion', '95 %']),
    ['ask.conversion: found "95 %"; the conversion must be a plain number above 0 and below 1'],
  ],
  [
    'a number in the file beyond doubles',
    short().replace('0.95}', '1e999}'),
    [
      'ask.conversion: found a number beyond the range of doubles; the conversion must be a plain number above 0 and below 1',
    ],
  ],
  [
    'null for a quantity',
    short(['feed.volume', null]),
    [
      'feed.volume: found null; write a volume as a text with its unit, such as "12 m3" (units that fit: m3, L, mL)',
    ],
  ],
  [
    'a list for a quantity',
    short(['feed.volume', ['12 m3']]),
    [
      'feed.volume: found a list of 1; write a volume as a text with its unit, such as "12 m3" (units that fit: m3, L, mL)',
    ],
  ],
  [
    'a missing quantity',
    short(['feed.volume', undefined]),
    [
      'feed.volume: is missing; write a volume as a text with its unit, such as "12 m3" (units that fit: m3, L, mL)',
    ],
  ],
  [
    'a missing part',
    short(['feed', undefined]),
    ['feed: is missing; it is an object with volume, substrate, product'],
  ],
  [
    'a number for a part',
    short(['feed', 5]),
    ['feed: found 5; what is charged before the enzyme must be an object with volume, substrate, product'],
  ],
  [
    'a number for a name',
    short(['feed.substrate.name', 5]),
    ['feed.substrate.name: found 5; name of the substrate must be a text'],
  ],
  ['a missing format', short(['format', undefined]), ['format: is missing; it is "dosewright-scenario"']],
  [
    'another format',
    short(['format', 'dosewright-data']),
    ['format: found "dosewright-data"; a scenario file says "dosewright-scenario"'],
  ],
  ['a later version', short(['version', 2]), ['version: found 2; this program reads version 1']],
  [
    'an unknown key near a known one',
    short(['enzyme.rate.km', '8 g/L']),
    ['enzyme.rate.km: the key "km" is not known here; the nearest known one is "Km"'],
  ],
  [
    'unknown keys in two places',
    short(['feed.colour', 'red'], ['enzyme.density_', 1]),
    [
      'feed.colour: the key "colour" is not known here; known here: volume, substrate, product',
      'enzyme.density_: the key "density_" is not known here; the nearest known one is "density"',
    ],
  ],
  [
    'an unknown key with control characters',
    short(['a\n\u001b!b', 1]),
    [
      'a\\u000a\\u001b!b: the key "a\\u000a\\u001b!b" is not known here; known here: format, version, title, feed, enzyme, programme, costs, spreads, ask',
    ],
  ],
  [
    'keys named like parts of a prototype',
    short().replace('"title"', '"__proto__":{"a":1},"constructor":{"b":1},"title"'),
    [
      '__proto__: the key "__proto__" is not known here; known here: format, version, title, feed, enzyme, programme, costs, spreads, ask',
      'constructor: the key "constructor" is not known here; known here: format, version, title, feed, enzyme, programme, costs, spreads, ask',
    ],
  ],
  [
    'a missing yield',
    short(['feed.product.massYield', undefined]),
    [
      'feed.product.massYield: is missing; give the mass of product per mass of substrate as a plain number, or molarMass and molesPerSubstrate instead',
    ],
  ],
  [
    'two yields',
    short(['feed.product.molarMass', '180.16 g/mol']),
    ['feed.product: found massYield beside molarMass; give the yield one way only'],
  ],
  [
    'moles of product without its molar mass',
    short(['feed.product.massYield', undefined], ['feed.product.molesPerSubstrate', 2]),
    ['feed.product.molarMass: is missing; molesPerSubstrate needs the molar mass of the product'],
  ],
  [
    'a rate given twice',
    short(['enzyme.rate.activity', activity('5000 U/g')]),
    ['enzyme.rate: exactly one of specificRate and activity is due; found specificRate and activity'],
  ],
  [
    'a rate given not at all',
    short(['enzyme.rate.specificRate', undefined]),
    ['enzyme.rate: exactly one of specificRate and activity is due; found neither'],
  ],
  [
    'a specific rate without its reference',
    short(['enzyme.rate.reference', undefined]),
    ['enzyme.rate.reference: is missing; a specificRate needs the temperature (and pH) at which it holds'],
  ],
  [
    'a reference without pH where the rate follows pH',
    short(['enzyme.rate.reference.pH', undefined]),
    ['enzyme.rate.reference.pH: is missing; enzyme.pH needs it, as a plain number from 0 to 14'],
  ],
  [
    'a programme without pH where the rate follows pH',
    short(['programme.pH', undefined]),
    ['programme.pH: is missing; enzyme.pH needs it, as a plain number from 0 to 14'],
  ],
  [
    'an activity without the molar mass',
    withActivity('5000 U/g', ['feed.substrate.molarMass', undefined]),
    ['feed.substrate.molarMass: is missing; enzyme.rate.activity needs it, such as "342.3 g/mol"'],
  ],
  [
    'an activity by volume without the density',
    withActivity('5000 U/mL', ['enzyme.density', undefined]),
    ['enzyme.density: is missing; an activity per volume needs it, such as "1.15 kg/L"'],
  ],
  [
    'a molar constant without the molar mass',
    short(['enzyme.rate.Km', '23 mmol/L'], ['feed.substrate.molarMass', undefined]),
    ['feed.substrate.molarMass: is missing; enzyme.rate.Km, given in moles, needs it, such as "342.3 g/mol"'],
  ],
  [
    'a specific rate in moles without the molar mass',
    short(['enzyme.rate.specificRate', '360 mmol/g/h'], ['feed.substrate.molarMass', undefined]),
    [
      'feed.substrate.molarMass: is missing; enzyme.rate.specificRate, given in moles, needs it, such as "342.3 g/mol"',
    ],
  ],
  [
    'a dose volume without the density',
    short(['programme.countDoseVolume', true], ['enzyme.density', undefined]),
    ['enzyme.density: is missing; countDoseVolume needs it, such as "1.15 kg/L"'],
  ],
  [
    'a flag that is a text',
    short(['programme.countDoseVolume', 'yes']),
    ['programme.countDoseVolume: found "yes"; write true or false'],
  ],
  [
    'an inactivation given twice',
    short(['enzyme.inactivation.halfLife', '8 h']),
    ['enzyme.inactivation: exactly one of kd, halfLife and D is due; found kd and halfLife'],
  ],
  [
    'an inactivation without a rate',
    short(['enzyme.inactivation.kd', undefined]),
    ['enzyme.inactivation: exactly one of kd, halfLife and D is due; found none of them'],
  ],
  [
    'Ea beside z',
    short(['enzyme.inactivation.z', '6 K']),
    ['enzyme.inactivation: exactly one of Ea and z is due; found Ea and z'],
  ],
  [
    'an inactivation without its temperature',
    short(['enzyme.inactivation.at', undefined]),
    ['enzyme.inactivation.at: is missing; write the temperature at which kd holds, such as "40 degC"'],
  ],
  [
    'a series of one step',
    short(['enzyme.inactivation', { series: [seriesStep] }]),
    [
      'enzyme.inactivation.series: found a list of 1; series is a list of two steps, the first and the second',
    ],
  ],
  [
    'a series step without its residual',
    short(['enzyme.inactivation', { series: [seriesStep, { kd: '1 1/h', at: '40 degC', z: '6 K' }] }]),
    [
      'enzyme.inactivation.series[1].residual: is missing; the activity of the form after this step beside the native one must be a plain number of at least 0',
    ],
  ],
  [
    'a series beside a single step',
    short(['enzyme.inactivation.series', [seriesStep, seriesStep]]),
    ['enzyme.inactivation: found series beside kd, at and Ea; give one step, or a series of two'],
  ],
  [
    'Q10 without its pair',
    short(['enzyme.temperature', { Q10: 2 }]),
    ['enzyme.temperature.from: is missing; a Q10 needs the lower temperature of its pair, such as "30 degC"'],
  ],
  [
    'Ea beside Q10',
    short(['enzyme.temperature', { Ea: '45 kJ/mol', Q10: 2, from: '30 degC' }]),
    ['enzyme.temperature: exactly one of Ea and Q10 is due; found Ea and Q10'],
  ],
  [
    'Ea beside from',
    short(['enzyme.temperature', { Ea: '45 kJ/mol', from: '30 degC' }]),
    ['enzyme.temperature: found from beside Ea; from belongs to Q10'],
  ],
  [
    'half a bell',
    short(['enzyme.pH', { pKa1: 5 }]),
    ['enzyme.pH.pKa2: is missing; the bell needs pKa1 and pKa2 as plain numbers'],
  ],
  [
    'one bell of two',
    short(['enzyme.pH', { free: { pKa1: 5, pKa2: 8 } }]),
    ['enzyme.pH.complex: is missing; free and complex go together'],
  ],
  [
    'short form beside phases',
    short(['programme.phases', []]),
    [
      'programme: found temperature, pH, dose and hold of the short form beside phases; give the short form, or start and phases',
    ],
  ],
  [
    'a short form without its dose',
    short(['programme.dose', undefined]),
    [
      'programme.dose: is missing; "find": "time" needs the dose, such as "3.5 kg" ("find": "dose" asks for it)',
    ],
  ],
  [
    'a short form without its temperature',
    short(['programme.temperature', undefined]),
    [
      'programme.temperature: is missing; write the temperature held, such as "42 degC", or give start and phases',
    ],
  ],
  [
    'a start without phases',
    phases([list, undefined]),
    ['programme.phases: is missing; start needs a list of phases after it'],
  ],
  [
    'phases without a start',
    phases(['programme.start', undefined]),
    ['programme.start: is missing; phases need the conditions they start from'],
  ],
  ['no phases', phases([list, []]), ['programme.phases: found an empty list; at least a dose is due']],
  [
    'phases without a dose',
    phases([list, [{ phase: 'hold', for: '1 h' }]]),
    ['programme.phases: no phase gives a dose; at least one { "phase": "dose" } is due'],
  ],
  [
    'an unknown phase',
    phases([`${list}[1].phase`, 'dsoe']),
    [
      'programme.phases[1].phase: found "dsoe"; perhaps dose is meant; the phases are heat, dose, hold, feed, adjust, inactivate, cool',
    ],
  ],
  [
    'a nameless phase',
    phases([`${list}[1].phase`, undefined]),
    [
      'programme.phases[1].phase: is missing; the phases are heat, dose, hold, feed, adjust, inactivate, cool',
    ],
  ],
  [
    'a phase that is a text',
    phases([`${list}[1]`, 'dose']),
    [
      'programme.phases[1]: found "dose"; a phase must be an object, such as { "phase": "dose", "amount": "3.5 kg" }',
    ],
  ],
  [
    'a phase with the key of another',
    phases([`${list}[1].hold`, '1 h']),
    ['programme.phases[1].hold: the key "hold" is not known here; known here: phase, amount'],
  ],
  [
    'a hold with two ends',
    phases([`${list}[2].until`, { conversion: 0.9 }]),
    ['programme.phases[2]: found for beside until or atMost; a hold has one end: for, or until with atMost'],
  ],
  [
    'a hold without an end',
    phases([`${list}[2].for`, undefined]),
    ['programme.phases[2]: the hold has no end; give for, or until with atMost'],
  ],
  [
    'a hold until without its limit',
    phases([`${list}[2]`, { phase: 'hold', until: { conversion: 0.9 } }]),
    ['programme.phases[2].atMost: is missing; write the longest the hold may take, such as "12 h"'],
  ],
  [
    'heating to below',
    phases([`${list}[0].to`, '5 degC']),
    ['programme.phases[0].to: 5 degC is below the 10 degC in force; heat goes up; to go down, cool'],
  ],
  [
    'cooling to above',
    phases([`${list}[7].to`, '90 degC']),
    ['programme.phases[7].to: 90 degC is above the 85 degC in force; cool goes down; to go up, heat'],
  ],
  [
    'a kill step to below',
    phases([`${list}[6].to`, '20 degC']),
    ['programme.phases[6].to: 20 degC is below the 42 degC in force; inactivate goes up'],
  ],
  [
    'a jacket too cool',
    phases([`${list}[0].jacket`, { temperature: '40 degC', timeConstant: '20 min' }]),
    [
      'programme.phases[0].jacket.temperature: a jacket at 40 degC never brings the batch to 42 degC; it must be hotter than the set point',
    ],
  ],
  [
    'a dose after the kill step',
    phases([`${list}[7]`, { phase: 'dose', amount: '1 kg' }]),
    ['programme.phases[7]: a dose follows the kill step, which has ended the reaction'],
  ],
  [
    'a feed after the kill step',
    phases([`${list}[7]`, { phase: 'feed', flow: '1 L/h', for: '1 h', concentration: '1 g/L' }]),
    ['programme.phases[7]: a feed follows the kill step, which has ended the reaction'],
  ],
  [
    'a kill step before any dose',
    phases(
      [`${list}[0]`, { phase: 'inactivate', to: '85 degC', hold: '1 min' }],
      [`${list}[1]`, { phase: 'cool', to: '42 degC' }],
    ),
    [
      'programme.phases[0]: a kill step comes before any dose is given',
      'programme.phases[3]: a dose follows the kill step, which has ended the reaction',
      'programme.phases[4]: a feed follows the kill step, which has ended the reaction',
    ],
  ],
  [
    'a hold before any dose',
    phases([`${list}[0]`, { phase: 'hold', for: '1 h' }]),
    [
      'programme.phases[0]: a hold before any dose, at the temperature of the start, does nothing; give the dose before it',
    ],
  ],
  [
    'a wait for a conversion before any dose',
    phases([`${list}[0]`, { phase: 'hold', until: { conversion: 0.5 }, atMost: '1 h' }]),
    ['programme.phases[0].until: waits for a conversion before any dose is given'],
  ],
  [
    'a flow by mass without the density',
    phases([`${list}[4].flow`, '500 kg/h']),
    ['programme.phases[4].density: is missing; a flow by mass needs it, such as "1.05 kg/L"'],
  ],
  [
    'enzyme fed before any dose',
    phases([
      `${list}[0]`,
      { phase: 'feed', flow: '1 L/h', for: '1 h', concentration: '1 g/L', enzyme: '1 g/L' },
    ]),
    [
      'programme.phases[0].enzyme: the feed brings enzyme before the first dose; time counts from the first dose',
    ],
  ],
  [
    "a phase's dose of nothing",
    phases([`${list}[1].amount`, '0 kg']),
    ['programme.phases[1].amount: found "0 kg"; the dose must be above 0'],
  ],
  [
    'a slow share beside a reverse reaction',
    short(['feed.substrate.slow', { share: 0.2, relativeRate: 0.1 }]),
    [
      'feed.substrate.slow: stands beside enzyme.rate.Keq; a slow share and a reverse reaction are not answered together',
    ],
  ],
  [
    'two currencies',
    short(['costs.vessel', '85 USD/h']),
    ['costs.vessel: found money in USD, while costs.enzyme is in EUR; use one currency throughout'],
  ],
  [
    'a currency that is none',
    short(['costs.vessel', '85 EURO/h']),
    [
      'costs.vessel: found "85 EURO/h", where "EURO" is not an ISO 4217 currency code; perhaps EUR is meant; write money per time as "85 EUR/h" (units that fit: EUR/h, EUR/min, EUR/s, EUR/d)',
    ],
  ],
  [
    'money per nothing',
    short(['costs.enzyme', '30 EUR']),
    [
      'costs.enzyme: found "30 EUR", which does not say per what; write money per mass as "30 EUR/kg" (units that fit: EUR/kg, EUR/g, EUR/mg, EUR/t)',
    ],
  ],
  [
    'money per time where per mass is due',
    short(['costs.enzyme', '30 EUR/h']),
    [
      'costs.enzyme: found "30 EUR/h", where "EUR/h" is not money per mass; units that fit: EUR/kg, EUR/g, EUR/mg, EUR/t',
    ],
  ],
  [
    'money as a bare number',
    short(['costs.enzyme', 30]),
    [
      'costs.enzyme: found the bare number 30 where a unit is due; write money per mass as a text with its unit, such as "30 EUR/kg" (units that fit: EUR/kg, EUR/g, EUR/mg, EUR/t)',
    ],
  ],
  [
    'negative money',
    short(['costs.enzyme', '-30 EUR/kg']),
    ['costs.enzyme: found "-30 EUR/kg"; the price of the preparation must be at least 0'],
  ],
  [
    'a negative spread',
    short(['spreads.Km', -0.1]),
    ['spreads.Km: found -0.1; the relative standard deviation of Km must be a plain number of at least 0'],
  ],
  [
    'a spread of temperature without a unit',
    short(['spreads.temperature', 0.4]),
    [
      'spreads.temperature: found the bare number 0.4 where a unit is due; write a temperature difference as a text with its unit, such as "0.4 K" (units that fit: K, degC)',
    ],
  ],
  [
    'a misspelt question',
    short(['ask.find', 'tmie']),
    [
      'ask.find: found "tmie"; perhaps time is meant; this version answers "time", "dose", "temperature" and "trace"',
    ],
  ],
  [
    'a question for a later version, cheapest',
    short(['ask', { find: 'cheapest', conversion: 0.95 }]),
    [
      'ask.find: found "cheapest", which this version does not answer; this version answers "time", "dose", "temperature" and "trace"',
    ],
  ],
  [
    'a question for a later version, probability',
    short(['ask', { find: 'probability', conversion: 0.95, within: '10 h' }]),
    [
      'ask.find: found "probability", which this version does not answer; this version answers "time", "dose", "temperature" and "trace"',
    ],
  ],
  [
    'a question for a later version, confidence',
    short(['ask', { find: 'dose', conversion: 0.95, within: '10 h', confidence: 0.95 }]),
    [
      'ask.confidence: this version does not answer with a confidence; without "confidence" it answers the dose for the stated constants',
    ],
  ],
  [
    'no question',
    short(['ask', undefined]),
    ['ask: is missing; ask must be an object that says what to find'],
  ],
  [
    'an empty question',
    short(['ask', {}]),
    ['ask.find: is missing; this version answers "time", "dose", "temperature" and "trace"'],
  ],
  [
    'a dose question without its time',
    short(['ask', { find: 'dose', conversion: 0.95 }]),
    [
      'ask.within: is missing; write a time as a text with its unit, such as "10 h" (units that fit: h, min, s, d)',
    ],
  ],
  [
    'temperatures in the wrong order',
    short(['ask', { find: 'temperature', best: 'time', conversion: 0.9, between: ['60 degC', '25 degC'] }]),
    ['ask.between: found 60 degC before 25 degC; between goes from the lower to the higher'],
  ],
  [
    'one temperature of two',
    short(['ask', { find: 'temperature', best: 'time', conversion: 0.9, between: ['60 degC'] }]),
    ['ask.between: found a list of 1; between is a list of two temperatures, the lower first'],
  ],
  [
    'a temperature question without its aim',
    short(['ask', { find: 'temperature', conversion: 0.9, between: ['20 degC', '60 degC'] }]),
    ['ask.best: is missing; with "find": "temperature", best is "time" or "conversion"'],
  ],
  [
    'times of a trace that are none',
    short(['ask', { find: 'trace', at: ['1 h', 2, '-1 h', '3 kg'] }]),
    [
      'ask.at[1]: found 2; write a time as a text with its unit, such as "1 h" (units that fit: h, min, s, d)',
      'ask.at[2]: found "-1 h"; a time of the trace must be at least 0',
      'ask.at[3]: found "3 kg", where kg is a unit of mass; a time is due here (units that fit: h, min, s, d)',
    ],
  ],
  [
    'a trace without times',
    short(['ask', { find: 'trace', at: [] }]),
    ['ask.at: found an empty list; at least one time is due, such as "1 h"'],
  ],
  [
    'a trace of one text',
    short(['ask', { find: 'trace', at: '1 h' }]),
    ['ask.at: found "1 h"; at is a list of times, such as ["0 h", "1 h"]'],
  ],
  [
    'a molar value that leaves doubles',
    short(['enzyme.rate.Kiu', '1e-305 umol/m3'], ['feed.substrate.molarMass', '1e-20 g/mol']),
    ['enzyme.rate.Kiu: leaves the range of doubles when it is converted through the molar mass'],
  ],
  [
    'many faults in the order of the file',
    short(
      ['feed.volume', 12],
      ['enzyme.rate.Km', '8 kg'],
      ['programme.pH', undefined],
      ['costs.vessel', '1 EUR'],
      ['ask.conversion', 2],
    ),
    [
      'feed.volume: found the bare number 12 where a unit is due; write a volume as a text with its unit, such as "12 m3" (units that fit: m3, L, mL)',
      'enzyme.rate.Km: found "8 kg", where kg is a unit of mass; a concentration is due here (units that fit: g/L, mg/L, kg/m3, mmol/L, mol/L)',
      'programme.pH: is missing; enzyme.pH needs it, as a plain number from 0 to 14',
      'costs.vessel: found "1 EUR", which does not say per what; write money per time as "85 EUR/h" (units that fit: EUR/h, EUR/min, EUR/s, EUR/d)',
      'ask.conversion: found 2; the conversion must be a plain number above 0 and below 1',
    ],
  ],
  [
    'a list for a file',
    '[]',
    [
      '(file): found a list of 0; a scenario must be an object with format, version, title, feed, enzyme, programme, costs, spreads, ask',
    ],
  ],
  [
    'null for a file',
    'null',
    [
      '(file): found null; a scenario must be an object with format, version, title, feed, enzyme, programme, costs, spreads, ask',
    ],
  ],
  ['an empty file', ' \n', ['(file): is empty; a scenario is a JSON object']],
  [
    'a byte order mark',
    `\ufeff${short()}`,
    ['(file): begins with a byte order mark; save it in UTF-8 without one'],
  ],
  [
    'a file cut off',
    '{"format": "dosewright-scenario"',
    ['(file): line 1, column 33: the file ends before it is complete; a } is due'],
  ],
  [
    'a file cut off in a text',
    '{"format": "dosewri',
    ['(file): line 1, column 12: a string that begins here is never closed'],
  ],
  [
    'a key given twice',
    short().replace('"version":1', '"version":1,"version":1'),
    ['version: the key is given more than once; keep one of them'],
  ],
  [
    'a key given twice in an escape',
    short().replace('"Km"', '"Km":"1 g/L","K\\u006d"'),
    ['enzyme.rate.Km: the key is given more than once; keep one of them'],
  ],
  ['a comment', '{\n  // no\n}', ['(file): line 2, column 3: comments are not part of JSON; remove them']],
  [
    'a comma too many',
    '{"a":1,}',
    ['(file): line 1, column 8: a comma stands before the closing bracket; remove the comma'],
  ],
  ['a comma too few', '{"a":1 "b":2}', ['(file): line 1, column 8: a comma or } is due here']],
  ['single quotes', "{'a':1}", ['(file): line 1, column 2: a key in double quotation marks is due here']],
  [
    'a name without quotes',
    '{"a":abc}',
    ['(file): line 1, column 6: "abc" is not a value of JSON; put text in double quotation marks'],
  ],
  [
    'a leading zero',
    '{"a":01}',
    [
      '(file): line 1, column 6: "01" is not a number of JSON; write it with digits on both sides of a point, without a leading zero or plus',
    ],
  ],
  ['NaN', '{"a":NaN}', ['(file): line 1, column 6: NaN is not a number of JSON; only finite numbers are']],
  [
    'something after the end',
    '{}\n{}',
    ['(file): line 2, column 1: something follows the end of the JSON value'],
  ],
  [
    'a line end in a text',
    '{"a":"b\nc"}',
    [
      '(file): line 1, column 8: a string holds a line end; close it with " or write the character as an escape',
    ],
  ],
  [
    'an escape that is none',
    '{"a":"\\x"}',
    ['(file): line 1, column 7: "\\x" is not an escape of JSON; a backslash itself is written "\\\\"'],
  ],
  ['a bracket of the other kind', '{"a":[1}', ['(file): line 1, column 8: found } where ] is due']],
  [
    'a hundred thousand brackets',
    '['.repeat(100_000),
    ['(file): line 1, column 65: nests deeper than 64 levels'],
  ],
]
