/** Parts that are optional until another part needs them. */
import type * as z from 'zod'
import { complain } from '../definition/clashes.ts'
import { type PathStep, pathText } from '../fault.ts'
import { fieldsOf, part, phasesOf } from './view.ts'

type Ctx = z.core.$RefinementCtx

/** The substrate's molar mass, for activities, molar concentrations and a stoichiometric yield. */
export const molarMassWhereNeeded = (file: unknown, ctx: Ctx): void => {
  const substrate = fieldsOf(part(file, 'feed', 'substrate'))
  if (substrate === undefined) return
  const { molarMass } = substrate
  if (molarMass === undefined) {
    const user = usersOfMolarMass(file)[0]
    if (user === undefined) return
    complain(ctx, `is missing; ${user} needs it, such as "342.3 g/mol"`, 'feed', 'substrate', 'molarMass')
  } else if (typeof molarMass === 'number') {
    for (const { path, value } of molarValues(file)) {
      const byMass = value * molarMass
      if (Number.isFinite(byMass) && (byMass > 0 || value === 0)) continue
      complain(ctx, 'leaves the range of doubles when it is converted through the molar mass', ...path)
    }
  }
}

const usersOfMolarMass = (file: unknown): readonly string[] => [
  ...(part(file, 'enzyme', 'rate', 'activity') === undefined ? [] : ['enzyme.rate.activity']),
  ...(part(file, 'feed', 'product', 'molarMass') === undefined ? [] : ['feed.product.molarMass']),
  ...molarValues(file).map(({ path }) => `${pathText(path)}, given in moles,`),
]

interface MolarValue {
  readonly path: readonly PathStep[]
  readonly value: number
}

const molarValues = (file: unknown): readonly MolarValue[] => [
  ...molarPlaces.flatMap((path) => molarValue(path, part(file, ...path))),
  ...phasesOf(file).flatMap((phase, n) =>
    ['concentration', 'product'].flatMap((key) =>
      molarValue(['programme', 'phases', n, key], part(phase, key)),
    ),
  ),
]

const molarValue = (path: readonly PathStep[], given: unknown): readonly MolarValue[] => {
  const value = part(given, 'value')
  return part(given, 'by') === 'amount' && typeof value === 'number' ? [{ path, value }] : []
}

const molarPlaces = [
  ['feed', 'substrate', 'concentration'],
  ['feed', 'product', 'concentration'],
  ['enzyme', 'rate', 'activity', 'assay', 'substrate'],
  ['enzyme', 'rate', 'specificRate'],
  ['enzyme', 'rate', 'Km'],
  ['enzyme', 'rate', 'Kic'],
  ['enzyme', 'rate', 'Kiu'],
  ['enzyme', 'rate', 'Ksi'],
  ['enzyme', 'inactivation', 'Kp'],
]

/** pH wherever the rate or the loss of enzyme follows it. */
export const phWhereNeeded = (file: unknown, ctx: Ctx): void => {
  const rate = part(file, 'enzyme', 'pH') !== undefined
  const loss = part(file, 'enzyme', 'inactivation', 'pH') !== undefined
  if (!rate && !loss) return
  const user = rate ? 'enzyme.pH' : 'enzyme.inactivation.pH'
  const need = (...path: readonly string[]): void => {
    const holder = fieldsOf(part(file, ...path))
    if (holder !== undefined && !Object.hasOwn(holder, 'pH')) {
      complain(ctx, `is missing; ${user} needs it, as a plain number from 0 to 14`, ...path, 'pH')
    }
  }
  if (rate) {
    need('enzyme', 'rate', 'activity', 'assay')
    need('enzyme', 'rate', 'reference')
  }
  const programme = fieldsOf(part(file, 'programme'))
  if (programme === undefined) return
  if (Object.hasOwn(programme, 'start')) need('programme', 'start')
  else if (!Object.hasOwn(programme, 'phases')) need('programme')
}

/** Densities, of the preparation and of a feed given by mass. */
export const densityWhereNeeded = (file: unknown, ctx: Ctx): void => {
  const enzyme = fieldsOf(part(file, 'enzyme'))
  if (enzyme !== undefined && !Object.hasOwn(enzyme, 'density')) {
    const user =
      part(file, 'enzyme', 'rate', 'activity', 'declared', 'per') === 'volume'
        ? 'an activity per volume'
        : part(file, 'programme', 'countDoseVolume') === true
          ? 'countDoseVolume'
          : undefined
    if (user !== undefined)
      complain(ctx, `is missing; ${user} needs it, such as "1.15 kg/L"`, 'enzyme', 'density')
  }
  for (const [n, phase] of phasesOf(file).entries()) {
    const byMass = ['flow', 'flowTo'].some((key) => part(phase, key, 'per') === 'mass')
    if (byMass && part(phase, 'density') === undefined) {
      complain(
        ctx,
        'is missing; a flow by mass needs it, such as "1.05 kg/L"',
        'programme',
        'phases',
        n,
        'density',
      )
    }
  }
}

/** The dose of the short form, unless it is what is asked. */
export const doseWhereNeeded = (file: unknown, ctx: Ctx): void => {
  const programme = fieldsOf(part(file, 'programme'))
  const find = part(file, 'ask', 'find')
  if (programme === undefined || typeof find !== 'string' || !usesDose.includes(find)) return
  if (['dose', 'start', 'phases'].some((key) => Object.hasOwn(programme, key))) return
  complain(
    ctx,
    `is missing; "find": "${find}" needs the dose, such as "3.5 kg" ("find": "dose" asks for it)`,
    'programme',
    'dose',
  )
}

const usesDose = ['time', 'temperature', 'trace']
