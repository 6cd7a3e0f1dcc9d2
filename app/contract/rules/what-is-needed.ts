/** Parts that are optional until another part needs them. */
import type * as z from 'zod'
import { complain } from '../definition/clashes.ts'
import { fieldsOf, part, phasesOf } from './view.ts'

type Ctx = z.core.$RefinementCtx

/** The substrate's molar mass, for activities, molar concentrations and a stoichiometric yield. */
export const molarMassWhereNeeded = (file: unknown, ctx: Ctx): void => {
  const substrate = fieldsOf(part(file, 'feed', 'substrate'))
  if (substrate === undefined || Object.hasOwn(substrate, 'molarMass')) return
  const user = usersOfMolarMass(file)[0]
  if (user !== undefined) {
    complain(ctx, `is missing; ${user} needs it, such as "342.3 g/mol"`, 'feed', 'substrate', 'molarMass')
  }
}

const usersOfMolarMass = (file: unknown): readonly string[] => [
  ...(part(file, 'enzyme', 'rate', 'activity') === undefined ? [] : ['enzyme.rate.activity']),
  ...(part(file, 'feed', 'product', 'molarMass') === undefined ? [] : ['feed.product.molarMass']),
  ...molarPlaces
    .filter((path) => isMolar(part(file, ...path)))
    .map((path) => `${path.join('.')}, a molar concentration,`),
  ...phasesOf(file).flatMap((phase, n) =>
    ['concentration', 'product']
      .filter((key) => isMolar(part(phase, key)))
      .map((key) => `programme.phases[${n}].${key}, a molar concentration,`),
  ),
]

const molarPlaces = [
  ['feed', 'substrate', 'concentration'],
  ['feed', 'product', 'concentration'],
  ['enzyme', 'rate', 'Km'],
  ['enzyme', 'rate', 'Kic'],
  ['enzyme', 'rate', 'Kiu'],
  ['enzyme', 'rate', 'Ksi'],
  ['enzyme', 'rate', 'activity', 'assay', 'substrate'],
  ['enzyme', 'inactivation', 'Kp'],
]

const isMolar = (value: unknown): boolean => part(value, 'by') === 'amount'

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
