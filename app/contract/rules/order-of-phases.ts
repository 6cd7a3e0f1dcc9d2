/** Phases follow one another: what must come first, and which way a temperature may go. */
import type * as z from 'zod'
import { formatQuantity, type Temperature } from '../../../engine/index.ts'
import { complain } from '../definition/clashes.ts'
import { fieldsOf, part, phasesOf } from './view.ts'

type Ctx = z.core.$RefinementCtx
type Complain = (message: string, ...below: readonly string[]) => void

/** What has happened before a phase; `unread` once a phase could not be recognised. */
interface Course {
  temperature: Temperature | undefined
  /** The temperature has been changed: a hold may be a heat treatment. */
  treated: boolean
  /** A hold before the first dose is worth a word: a dose does follow, and no trace shows the wait. */
  readonly idle: boolean
  dosed: boolean
  killed: boolean
  unread: boolean
}

/** Walks through the phases in order. */
export const phasesFollow = (file: unknown, ctx: Ctx): void => {
  if (!Array.isArray(part(file, 'programme', 'phases'))) return
  if (shortKeys.some((key) => part(file, 'programme', key) !== undefined)) return
  const phases = phasesOf(file)
  if (phases.length === 0) {
    complain(ctx, 'found an empty list; at least a dose is due', 'programme', 'phases')
    return
  }
  const start = part(file, 'programme', 'start', 'temperature')
  const course: Course = {
    temperature: asTemperature(start),
    treated: false,
    idle: part(file, 'ask', 'find') !== 'trace' && phases.some((phase) => part(phase, 'phase') === 'dose'),
    dosed: false,
    killed: false,
    unread: false,
  }
  for (const [n, phase] of phases.entries()) {
    follow(course, phase, (message, ...below) => complain(ctx, message, 'programme', 'phases', n, ...below))
  }
  if (!course.dosed && !course.unread) {
    complain(ctx, 'no phase gives a dose; at least one { "phase": "dose" } is due', 'programme', 'phases')
  }
}

/** Beside these, `programme` itself is at fault. */
const shortKeys = ['temperature', 'pH', 'dose', 'hold']

const follow = (course: Course, phase: unknown, say: Complain): void => {
  switch (part(phase, 'phase')) {
    case 'dose':
      if (course.killed) say('a dose follows the kill step, which has ended the reaction')
      course.dosed = true
      return
    case 'hold':
      if (course.dosed || course.unread) return
      if (part(phase, 'until') !== undefined) say('waits for a conversion before any dose is given', 'until')
      else if (course.idle && !course.treated) {
        say('a hold before any dose, at the temperature of the start, does nothing; give the dose before it')
      }
      return
    case 'feed':
      if (course.killed) say('a feed follows the kill step, which has ended the reaction')
      if (!course.dosed && !course.unread && Number(part(phase, 'enzyme') ?? 0) > 0) {
        say('the feed brings enzyme before the first dose; time counts from the first dose', 'enzyme')
      }
      return
    case 'heat':
      change(course, phase, 'heat', say)
      return
    case 'cool':
      change(course, phase, 'cool', say)
      return
    case 'inactivate':
      if (!course.dosed && !course.unread) say('a kill step comes before any dose is given')
      change(course, phase, 'inactivate', say)
      course.killed = true
      return
    case 'adjust':
      return
    default:
      course.unread = true
  }
}

/** A set point on the right side of the temperature in force, and within the reach of the jacket. */
const change = (
  course: Course,
  phase: unknown,
  kind: 'heat' | 'cool' | 'inactivate',
  say: Complain,
): void => {
  const before = course.temperature
  const to = asTemperature(part(phase, 'to'))
  course.treated = true
  course.temperature = to
  if (before === undefined || to === undefined) return
  const up = kind !== 'cool'
  if (up ? to < before : to > before) {
    const other = kind === 'heat' ? '; to go down, cool' : kind === 'cool' ? '; to go up, heat' : ''
    say(
      `${degrees(to)} is ${up ? 'below' : 'above'} the ${degrees(before)} in force; ${kind} goes ${up ? 'up' : 'down'}${other}`,
      'to',
    )
    return
  }
  const jacket = asTemperature(part(phase, 'jacket', 'temperature'))
  if (jacket === undefined || to === before) return
  if (up ? jacket <= to : jacket >= to) {
    say(
      `a jacket at ${degrees(jacket)} never brings the batch to ${degrees(to)}; it must be ${up ? 'hotter' : 'colder'} than the set point`,
      'jacket',
      'temperature',
    )
  }
}

const asTemperature = (value: unknown): Temperature | undefined =>
  typeof value === 'number' ? (value as Temperature) : undefined

const degrees = (temperature: Temperature): string => formatQuantity(temperature, 'temperature', 'degC', 5)

/** The slow share and the reverse reaction are not answered together. */
export const slowWithoutReverse = (file: unknown, ctx: Ctx): void => {
  const slow = fieldsOf(part(file, 'feed', 'substrate', 'slow'))
  if (slow !== undefined && part(file, 'enzyme', 'rate', 'Keq') !== undefined) {
    complain(
      ctx,
      'stands beside enzyme.rate.Keq; a slow share and a reverse reaction are not answered together',
      'feed',
      'substrate',
      'slow',
    )
  }
}
