/**
 * Time and enzyme under constant conditions when substrate protects the enzyme: along the reaction coordinate u the
 * enzyme is lost as dE = −(kd/k)·D/(1 + S/Kp) du and time passes as dt = D/(k·E) du, so that both are integrals; no
 * closed form: collocation at Gauss–Legendre nodes in u, which is ln S for a uniform substrate.
 *
 * Source   the balances of a batch divided by one another; Gauss–Legendre in ln S.
 */
import { integrateToNodesInto, integrateWhole, order } from '../numeric/collocation.ts'
import { gauss16 } from '../numeric/gauss-legendre.ts'
import type { ReactionPath } from './reaction-path.ts'

/** A panel this wide in u keeps 16 nodes at round-off. */
const panelWidth = 4
/** A panel in which the enzyme falls below this share is halved: 1/E is then no longer smooth in it. */
const leastShare = 0.4

/** Constants under constant conditions: k and kd in 1/s (mass per mass), Kp in kg/m³. */
export interface ProtectedDecay {
  readonly k: number
  readonly kd: number
  readonly Kp: number
}

const slopes = (): Float64Array => new Float64Array(order)

/**
 * Enzyme lost on the way to u, kg/m³: below this dose u is never reached.
 */
export function protectedLoss(path: ReactionPath, decay: ProtectedDecay, u: number): number {
  const loss = slopes()
  let sum = 0
  for (let low = 0; low < u; low += panelWidth) {
    const width = Math.min(panelWidth, u - low)
    for (let i = 0; i < order; i++)
      loss[i] = lossSlope(path, decay, low + width * (gauss16.nodes[i] as number))
    sum += width * integrateWhole(loss)
  }
  return sum
}

const lossSlope = (path: ReactionPath, { k, kd, Kp }: ProtectedDecay, u: number): number =>
  ((kd / k) * path.demandSlope(u)) / (1 + path.substrate(u) / Kp)

/**
 * Time to u from a dose E0.
 *
 * Units    E0 kg/m³; returns s, Infinity where the enzyme is spent before.
 */
export function protectedTime(path: ReactionPath, decay: ProtectedDecay, E0: number, u: number): number {
  const { k, kd, Kp } = decay
  const demand = slopes()
  const loss = slopes()
  const lost = slopes()
  const ratio = kd / k
  let E = E0
  let time = 0
  let low = 0
  let width = panelWidth
  while (low < u) {
    width = Math.min(width, u - low)
    for (let i = 0; i < order; i++) {
      const at = low + width * (gauss16.nodes[i] as number)
      const slope = path.demandSlope(at)
      demand[i] = slope
      loss[i] = (ratio * slope) / (1 + path.substrate(at) / Kp)
    }
    const lostWithin = width * integrateWhole(loss)
    if (E - lostWithin < leastShare * E && width > 1e-12 * (1 + low)) {
      width *= 0.5
      continue
    }
    if (!(lostWithin < E)) return Number.POSITIVE_INFINITY
    integrateToNodesInto(lost, loss)
    let sum = 0
    for (let i = 0; i < order; i++)
      sum +=
        ((gauss16.weights[i] as number) * (demand[i] as number)) / (k * (E - width * (lost[i] as number)))
    time += width * sum
    E -= lostWithin
    low += width
    width *= 2
  }
  return time
}
