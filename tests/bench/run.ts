/**
 * `npm run bench`: what the engine's answers cost, as ratios to yardsticks of the same run, each with the error
 * achieved. Times are lower quartiles of interleaved repeats; only the ratios are worth quoting.
 */
import { closedForms } from './closed-forms.ts'
import { summary } from './measure.ts'
import { odeEngine } from './ode-engine.ts'
import { againstScipy } from './scipy.ts'

console.log(`Node ${process.versions.node}, ${process.platform} ${process.arch}\n`)
closedForms()
odeEngine()
againstScipy()
console.log(summary())
