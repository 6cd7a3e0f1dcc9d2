/**
 * Coefficients of the Rosenbrock method RODAS, in the variables that avoid products with the
 * Jacobian: (I/(γh) − J)·Uᵢ = f(t + αᵢh, y + Σ aᵢⱼUⱼ) + Σ cᵢⱼUⱼ/h + dᵢh·∂f/∂t.
 *
 * Shapes   six stages; row i of a and c holds its entries for j < i. The last two stages
 *          and the result continue each other: y + Σ a₅ⱼUⱼ, then + U₅, then + U₆, and U₆ is the
 *          estimated error (fourth order with third embedded, both stiffly accurate).
 * Source   Hairer & Wanner, Solving Ordinary Differential Equations II, IV.7 and their code RODAS.
 *          The order conditions are checked in the tests.
 */
export const rodas = {
  gamma: 0.25,
  alpha: [0, 0.386, 0.21, 0.63],
  d: [0.25, -0.1043, 0.1035, -0.0362],
  a: [
    [],
    [1.544],
    [0.9466785280815826, 0.2557011698983284],
    [3.314825187068521, 2.896124015972201, 0.9986419139977817],
    [1.221224509226641, 6.019134481288629, 12.53708332932087, -0.687886036105895],
  ],
  c: [
    [],
    [-5.6688],
    [-2.430093356833875, -0.2063599157091915],
    [-0.1073529058151375, -9.594562251023355, -20.47028614809616],
    [7.496443313967647, -10.24680431464352, -33.99990352819905, 11.7089089320616],
    [8.083246795921522, -7.981132988064893, -31.52159432874371, 16.31930543123136, -6.058818238834054],
  ],
} as const
