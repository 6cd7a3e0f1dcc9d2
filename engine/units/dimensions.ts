/**
 * The one table of dimensions and their units of measure; whatever reads, converts, displays or documents a
 * quantity asks it. Compound units are generated from the simple ones.
 *
 * Units    factors to coherent SI: K, s, m³, kg, mol, J.
 * Source   definitions: 1 U = 1 µmol/min, 1 kat = 1 mol/s, 1 cal = 4.184 J, 0 degC = 273.15 K, 1 L = 1 dm³.
 */
import { per, type UnitOfMeasure, unit } from './measure.ts'

const time = [unit('s'), unit('min', 60), unit('h', 3600), unit('d', 86400)]
const mass = [unit('ug', 1, 1e9), unit('mg', 1, 1e6), unit('g', 1, 1000), unit('kg'), unit('t', 1000)]
const amount = [
  unit('nmol', 1, 1e9),
  unit('umol', 1, 1e6),
  unit('mmol', 1, 1000),
  unit('mol'),
  unit('kmol', 1000),
]
const volume = [unit('uL', 1, 1e9), unit('mL', 1, 1e6), unit('L', 1, 1000), unit('hL', 1, 10), unit('m3')]
const degree = [unit('K'), unit('degC')]
const energy = [
  unit('J'),
  unit('kJ', 1000),
  unit('MJ', 1e6),
  unit('Wh', 3600),
  unit('kWh', 3.6e6),
  unit('MWh', 3.6e9),
]
const mole = [unit('mol')]
const one = [unit('1')]
const turnover = [
  unit('U', 1, 6e7),
  unit('kU', 1, 6e4),
  unit('MU', 1, 60),
  unit('nkat', 1, 1e9),
  unit('ukat', 1, 1e6),
  unit('mkat', 1, 1000),
  unit('kat'),
]
const molarity = [unit('uM', 1, 1000), unit('mM'), unit('M', 1000)]
const massConcentration = per(mass, volume)
const molarConcentration = [...per(amount, volume), ...molarity]

interface Dimension {
  /** With its article, as a sentence needs it. */
  readonly called: string
  readonly units: readonly UnitOfMeasure[]
  /** A few units for messages, the most usual first. */
  readonly usual: readonly string[]
  readonly example: string
}

const table = {
  time: { called: 'a time', units: time, usual: ['h', 'min', 's', 'd'], example: '10 h' },
  temperature: {
    called: 'a temperature',
    units: [unit('degC', 1, 1, 273.15), unit('K')],
    usual: ['degC', 'K'],
    example: '42 degC',
  },
  'temperature difference': {
    called: 'a temperature difference',
    units: degree,
    usual: ['K', 'degC'],
    example: '6 K',
  },
  mass: { called: 'a mass', units: mass, usual: ['kg', 'g', 'mg', 't'], example: '3.5 kg' },
  amount: {
    called: 'an amount of substance',
    units: amount,
    usual: ['mol', 'mmol', 'umol'],
    example: '2 mol',
  },
  volume: { called: 'a volume', units: volume, usual: ['m3', 'L', 'mL'], example: '12 m3' },
  concentration: {
    called: 'a concentration by mass',
    units: massConcentration,
    usual: ['g/L', 'mg/L', 'kg/m3'],
    example: '45 g/L',
  },
  'molar concentration': {
    called: 'a molar concentration',
    units: molarConcentration,
    usual: ['mmol/L', 'mol/L'],
    example: '130 mmol/L',
  },
  density: {
    called: 'a density',
    units: massConcentration,
    usual: ['kg/L', 'g/mL', 'kg/m3'],
    example: '1.15 kg/L',
  },
  'molar mass': {
    called: 'a molar mass',
    units: per(mass, mole),
    usual: ['g/mol', 'kg/mol'],
    example: '342.3 g/mol',
  },
  'molar energy': {
    called: 'an energy per mole',
    units: [...per(energy.slice(0, 3), mole), unit('cal/mol', 4184, 1000), unit('kcal/mol', 4184)],
    usual: ['kJ/mol', 'J/mol', 'kcal/mol'],
    example: '45 kJ/mol',
  },
  'first-order rate': {
    called: 'a first-order rate',
    units: per(one, time),
    usual: ['1/h', '1/min', '1/s', '1/d'],
    example: '0.08 1/h',
  },
  'specific rate': {
    called: 'a specific rate (mass of substrate per mass of enzyme preparation and time)',
    units: per(per(mass, mass), time),
    usual: ['g/g/h', 'g/g/min', 'g/mg/min', 'mg/mg/h', 'kg/kg/h'],
    example: '95 g/g/h',
  },
  'molar specific rate': {
    called: 'a molar specific rate (amount of substrate per mass of enzyme preparation and time)',
    units: per(per(amount, mass), time),
    usual: ['mmol/g/h', 'mol/kg/h'],
    example: '280 mmol/g/h',
  },
  'activity per mass': {
    called: 'an activity per mass of preparation',
    units: [...per(turnover, mass), ...per(per(amount, time), mass)],
    usual: ['U/g', 'kU/g', 'U/mg', 'kat/kg', 'nkat/g'],
    example: '5000 U/g',
  },
  'activity per volume': {
    called: 'an activity per volume of preparation',
    units: [...per(turnover, volume), ...per(per(amount, time), volume)],
    usual: ['U/mL', 'kU/mL', 'U/L'],
    example: '800 U/mL',
  },
  flow: { called: 'a flow', units: per(volume, time), usual: ['L/h', 'm3/h', 'mL/min'], example: '500 L/h' },
  'mass flow': {
    called: 'a mass flow',
    units: per(mass, time),
    usual: ['kg/h', 'kg/min'],
    example: '500 kg/h',
  },
  ramp: {
    called: 'a ramp',
    units: per(degree, time),
    usual: ['K/min', 'degC/min', 'K/h', 'degC/h'],
    example: '0.5 K/min',
  },
  power: {
    called: 'a power',
    units: [unit('W'), unit('kW', 1000), unit('MW', 1e6)],
    usual: ['kW', 'W'],
    example: '30 kW',
  },
  energy: { called: 'an energy', units: energy, usual: ['kWh', 'MJ', 'kJ', 'J'], example: '120 kWh' },
  'concentration rate': {
    called: 'a rate of concentration by mass',
    units: per(massConcentration, time),
    usual: ['g/L/h', 'g/L/min', 'mg/L/min'],
    example: '1.5 g/L/min',
  },
  'molar concentration rate': {
    called: 'a rate of molar concentration',
    units: per(molarConcentration, time),
    usual: ['mmol/L/min', 'umol/L/min'],
    example: '0.2 mmol/L/min',
  },
  'amount rate': {
    called: 'an amount of substance per time',
    units: [...per(amount, time), ...turnover],
    usual: ['umol/min', 'mmol/h', 'U', 'kat'],
    example: '76 umol/min',
  },
} as const satisfies Record<string, Dimension>

export type DimensionName = keyof typeof table

/** Every dimension and what belongs to it. */
export const dimensions: Readonly<Record<DimensionName, Dimension>> = table

/** The names of all dimensions. */
export const dimensionNames = Object.keys(table) as readonly DimensionName[]

const bySymbol = new Map(
  dimensionNames.map((name) => [name, new Map(table[name].units.map((u) => [u.symbol, u]))] as const),
)

/** The unit of a dimension with a symbol, if it has one. */
export const unitOf = (dimension: DimensionName, symbol: string): UnitOfMeasure | undefined =>
  bySymbol.get(dimension)?.get(symbol)

/** Units that fit a dimension, for messages: a short list, the most usual first. */
export const fittingUnits = (dimension: DimensionName): readonly string[] => dimensions[dimension].usual
