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

const { nodes, weights } = gauss16

/** A panel this wide at the start of u keeps 16 nodes at round-off; each next one may be twice as wide. */
const panelWidth = 4
/** A panel in which the enzyme falls below this share is halved: 1/E is then no longer smooth in it. */
const leastShare = 0.4

/** Constants under constant conditions: k and kd in 1/s (mass per mass), Kp in kg/m³. */
export interface ProtectedDecay {
  readonly k: number
  readonly kd: number
  readonly Kp: number
}

/** Values at the nodes of a panel, to be used again and again. */
export interface ProtectedWorkspace {
  readonly demand: Float64Array
  readonly loss: Float64Array
  readonly lost: Float64Array
}

/** Makes the room that `protectedTime` works in; making it costs as much as a whole answer. */
export const protectedWorkspace = (): ProtectedWorkspace => ({
  demand: new Float64Array(order),
  loss: new Float64Array(order),
  lost: new Float64Array(order),
})

/**
 * Enzyme lost on the way to u, kg/m³: below this dose u is never reached.
 */
export function protectedLoss(path: ReactionPath, decay: ProtectedDecay, u: number): number {
  const room = protectedWorkspace()
  let sum = 0
  let low = 0
  // Exponentials in u fade as panels grow: a slow fraction may take u to any length.
  for (let panel = panelWidth; low < u; panel *= 2) {
    const width = Math.min(panel, u - low)
    slopesInto(room, path, decay, low, width)
    sum += width * integrateWhole(room.loss)
    low += width
  }
  return sum
}

/**
 * Time to u from a dose E0.
 *
 * Units    E0 kg/m³; returns s, Infinity where the enzyme is spent before.
 */
export function protectedTime(
  path: ReactionPath,
  decay: ProtectedDecay,
  E0: number,
  u: number,
  room: ProtectedWorkspace = protectedWorkspace(),
): number {
  const { demand, loss, lost } = room
  let E = E0
  let time = 0
  let low = 0
  let width = panelWidth
  while (low < u) {
    width = Math.min(width, u - low)
    slopesInto(room, path, decay, low, width)
    const lostWithin = width * integrateToNodesInto(lost, loss)
    if (E - lostWithin < leastShare * E && width > 1e-12 * (1 + low)) {
      width *= 0.5
      continue
    }
    if (!(lostWithin < E)) return Number.POSITIVE_INFINITY
    let sum = 0
    for (let i = 0; i < order; i++)
      sum += ((weights[i] as number) * (demand[i] as number)) / (E - width * (lost[i] as number))
    time += (width * sum) / decay.k
    E -= lostWithin
    low += width
    width *= 2
  }
  return time
}

/** Enzyme-time demanded, and enzyme lost, per u at the nodes of a panel. */
function slopesInto(
  { demand, loss }: ProtectedWorkspace,
  path: ReactionPath,
  { k, kd, Kp }: ProtectedDecay,
  low: number,
  width: number,
): void {
  const ratio = kd / k
  const perKp = 1 / Kp
  for (let i = 0; i < order; i++) {
    const S = path.substrate(low + width * (nodes[i] as number))
    const slope = path.demandSlopeAt(S)
    demand[i] = slope
    loss[i] = (ratio * slope) / (1 + S * perKp)
  }
}
