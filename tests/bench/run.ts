/**
 * `npm run bench`: what the engine's answers cost, as ratios to yardsticks of the same run, each with the error
 * achieved. Times are lower quartiles of interleaved repeats; only the ratios are worth quoting. Each part runs in a
 * process of its own, contender and yardstick side by side, so that what one part taught the compiler does not slow
 * the next.
 */
import { spawnSync } from 'node:child_process'
import { fileURLToPath } from 'node:url'
import { closedForms } from './closed-forms.ts'
import { odeEngine } from './ode-engine.ts'
import { againstScipy } from './scipy.ts'

const chapters: Readonly<Record<string, Readonly<Record<string, () => void>>>> = {
  'Without stepping': closedForms,
  'ODE engine, time beside Dormand–Prince 5(4) inlined by hand': odeEngine,
  "ODE engine beside SciPy's solve_ivp, LSODA with an event": { scipy: againstScipy },
}

const asked = process.argv[2]
if (asked === undefined) measureAll()
else for (const parts of Object.values(chapters)) parts[asked]?.()

function measureAll(): void {
  console.log(`Node ${process.versions.node}, ${process.platform} ${process.arch}`)
  let met = 0
  let missed = 0
  for (const [title, parts] of Object.entries(chapters)) {
    console.log(`\n${title}`)
    for (const part of Object.keys(parts)) {
      const { status, stdout } = spawnSync(process.execPath, [fileURLToPath(import.meta.url), part], {
        encoding: 'utf8',
        stdio: ['ignore', 'pipe', 'inherit'],
      })
      process.stdout.write(stdout)
      met += stdout.match(/^meets /gm)?.length ?? 0
      missed += stdout.match(/^MISSES/gm)?.length ?? 0
      if (status !== 0) process.exitCode = 1
    }
  }
  console.log(`\n${met} goals met, ${missed} missed`)
}
