/** Who may import whom: the house's table, as data. */

/** What a room may import: other rooms, and packages or builtins by name (`node:` stands for all builtins). */
export interface Room {
  readonly rooms: readonly string[]
  readonly packages?: readonly string[]
}

const algebra = ['outcome', 'numeric']
const chemistry = ['outcome', 'units', 'scenario']
const solving = ['outcome', 'units', 'numeric', 'kinetics', 'integrate', 'scenario', 'answer']
const door = ['engine', 'outcome', 'scenario', 'answer']

/**
 * `engine` is the engine's door. `outcome`, `scenario` and `answer` hold the words in which everyone speaks to
 * it: plain data described in SI. A room may always import itself.
 */
export const rooms: Readonly<Record<string, Room>> = {
  outcome: { rooms: [] },
  units: { rooms: ['outcome'] },
  scenario: { rooms: ['units'] },
  answer: { rooms: ['units', 'scenario'] },
  numeric: { rooms: ['outcome'] },
  kinetics: { rooms: chemistry },
  cost: { rooms: chemistry },
  schedule: { rooms: chemistry },
  integrate: { rooms: algebra, packages: ['ode-rk4'] },
  solve: { rooms: solving },
  fit: { rooms: [...solving, 'solve'] },
  plan: { rooms: ['outcome', 'units', 'solve', 'cost', 'schedule', 'scenario', 'answer'] },
  engine: { rooms: [...solving, 'solve', 'fit', 'plan', 'cost', 'schedule'] },
  contract: { rooms: door, packages: ['zod'] },
  command: { rooms: [...door, 'contract'], packages: ['node:', 'dist/node/dosewright.js'] },
}

const doors: Readonly<Record<string, string>> = {
  'engine/index.ts': 'engine',
  'engine/plan.ts': 'plan',
  'engine/outcome.ts': 'outcome',
  'engine/scenario.ts': 'scenario',
  'engine/answer.ts': 'answer',
}

/** The room a file of the program lives in, or undefined where it lives in none. */
export const roomOf = (path: string): string | undefined => {
  const named = doors[path]
  if (named) return named
  const [, room, file] = path.split('/')
  return room !== undefined && file !== undefined && Object.hasOwn(rooms, room) ? room : undefined
}
