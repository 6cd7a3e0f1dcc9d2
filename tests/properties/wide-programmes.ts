/** Random programmes in phases that may follow one another, for a scenario's dose and temperatures. */
import fc from 'fast-check'
import type { File, Json } from './asking.ts'
import { between, decades, type Family, fileOf, type Wide, wide } from './wide-scenarios.ts'

const ramp = decades(-1.5, 1.5)
const way = fc.oneof(
  fc.constant({}),
  fc.record({ ramp }),
  fc.record({ beyond: between(1, 40), timeConstant: decades(0, 2.5) }),
  fc.record({ ramp, beyond: between(1, 40), timeConstant: decades(0, 2.5) }),
)
type Way = { readonly ramp?: number; readonly beyond?: number; readonly timeConstant?: number }

const hours = decades(-1.5, 1.5)
const move = fc.oneof(
  { weight: 3, arbitrary: fc.record({ kind: fc.constant('temperature' as const), to: between(1, 95), way }) },
  { weight: 2, arbitrary: fc.record({ kind: fc.constant('dose' as const), share: decades(-1, 0.5) }) },
  { weight: 3, arbitrary: fc.record({ kind: fc.constant('hold' as const), hours }) },
  {
    weight: 1,
    arbitrary: fc.record({ kind: fc.constant('until' as const), conversion: between(0.01, 0.99), hours }),
  },
  { weight: 1, arbitrary: fc.record({ kind: fc.constant('adjust' as const), pH: between(2, 10) }) },
)
const feeding = fc.record({
  kind: fc.constant('feed' as const),
  share: decades(-2, 0.3),
  concentration: decades(-1, 1),
  product: fc.option(decades(-2, 0), { nil: undefined }),
  enzyme: fc.option(decades(-2, 0), { nil: undefined }),
  slope: fc.option(decades(-0.5, 0.5), { nil: undefined }),
  hours,
})
const kill = fc.record({
  kind: fc.constant('kill' as const),
  rise: between(0, 60),
  way,
  minutes: between(0, 30),
})

type Move = typeof move extends fc.Arbitrary<infer M> ? M : never
type Feeding = typeof feeding extends fc.Arbitrary<infer M> ? M : never
type Kill = typeof kill extends fc.Arbitrary<infer M> ? M : never

/** A scenario with a programme in phases; feeds only where asked for. */
export function widePlan(family: Family & { readonly feeds?: boolean } = {}): fc.Arbitrary<File> {
  const one: fc.Arbitrary<Move | Feeding> = family.feeds ? fc.oneof(move, move, move, feeding) : move
  return fc
    .record({
      w: wide(family),
      start: between(1, 60),
      before: fc.option(fc.record({ to: between(1, 95), way }), { nil: undefined }),
      moves: fc.array(one, { minLength: 1, maxLength: 7 }),
      end: fc.option(kill, { nil: undefined }),
    })
    .map(({ w, start, before, moves, end }) => {
      const course = { at: start }
      const first = before ? [change(course, before.to, before.way)] : []
      const phases = [
        ...first,
        { phase: 'dose', amount: `${w.dose} kg` },
        ...moves.map((each) => phaseOf(w, course, each)),
        ...(end ? [killStep(course, end)] : []),
      ]
      return { ...fileOf(w), programme: { start: { temperature: `${start} degC`, pH: w.pH }, phases } }
    })
}

function phaseOf(w: Wide, course: { at: number }, one: Move | Feeding): Json {
  switch (one.kind) {
    case 'temperature':
      return change(course, one.to, one.way)
    case 'dose':
      return { phase: 'dose', amount: `${w.dose * one.share} kg` }
    case 'hold':
      return { phase: 'hold', for: `${one.hours} h` }
    case 'until':
      return { phase: 'hold', until: { conversion: one.conversion }, atMost: `${one.hours} h` }
    case 'adjust':
      return { phase: 'adjust', pH: one.pH }
    case 'feed': {
      const flow = (one.share * w.volume) / one.hours
      return {
        phase: 'feed',
        flow: `${flow} m3/h`,
        ...(one.slope === undefined ? {} : { flowTo: `${flow * one.slope} m3/h` }),
        for: `${one.hours} h`,
        concentration: `${one.concentration * w.S0} g/L`,
        ...(one.product === undefined ? {} : { product: `${one.product * w.S0} g/L` }),
        ...(one.enzyme === undefined ? {} : { enzyme: `${(one.enzyme * w.dose) / w.volume} g/L` }),
      }
    }
  }
}

function change(course: { at: number }, to: number, how: Way): Json {
  const up = to >= course.at
  course.at = to
  return { phase: up ? 'heat' : 'cool', to: `${to} degC`, ...by(how, to, up) }
}

function killStep(course: { at: number }, { rise, way: how, minutes }: Kill): Json {
  const to = course.at + rise
  course.at = to
  return { phase: 'inactivate', to: `${to} degC`, ...by(how, to, true), hold: `${minutes} min` }
}

function by(
  { ramp: perMinute, beyond, timeConstant }: Way,
  to: number,
  up: boolean,
): { [key: string]: Json } {
  return {
    ...(perMinute === undefined ? {} : { ramp: `${perMinute} K/min` }),
    ...(beyond === undefined
      ? {}
      : {
          jacket: {
            temperature: `${up ? to + beyond : to - beyond} degC`,
            timeConstant: `${timeConstant} min`,
          },
        }),
  }
}
