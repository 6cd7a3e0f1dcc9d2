/** Looking costs a rate evaluation, a tenth of a step; so it is done for few of them. */
const EVERY = 8
/** So many looks at the limit of stability, with few others between, call a problem stiff… */
const ENOUGH = 8
/** …and so many others in a row clear it. */
const CLEARED = 4

/** Steps held short by stability waver about the limit, usually above this part of it. */
const STRAINED = 0.6

export interface StiffnessWatch {
  reset(): void
  due(accepted: number): boolean
  /** Takes the strain of another step (1 at the limit of stability); true once that is enough. */
  confirms(strain: number): boolean
}

/**
 * Decides whether stability, not accuracy, holds an explicit method to its short steps.
 *
 * Source   the counting rule of Hairer & Wanner, Solving Ordinary Differential Equations II,
 *          IV.2 ("automatic stiffness detection"), thinned out.
 */
export const createStiffnessWatch = (): StiffnessWatch => {
  let strained = 0
  let relaxed = 0
  return {
    reset() {
      strained = 0
      relaxed = 0
    },
    due: (accepted) => accepted % EVERY === 0,
    confirms(strain) {
      if (strain >= STRAINED) {
        strained++
        relaxed = 0
        return strained >= ENOUGH
      }
      relaxed++
      if (relaxed >= CLEARED) strained = 0
      return false
    },
  }
}
