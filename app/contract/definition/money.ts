/** What things cost, and how much constants and charges scatter. */
import { complain, onObject } from './clashes.ts'
import { moneyField, numberField, quantityField, record } from './fields.ts'

/** `costs` of the file. */
export const costs = record('what a batch costs', {
  enzyme: moneyField('mass', { title: 'the price of the preparation', example: '30 EUR/kg' }).exactOptional(),
  vessel: moneyField('time', { title: 'the cost of the vessel', example: '85 EUR/h' }).exactOptional(),
  turnaround: quantityField('time', 'at-least', {
    title: 'the vessel time per batch beside the reaction',
    example: '90 min',
  }).exactOptional(),
}).superRefine((value, ctx) => {
  const enzyme = value?.enzyme?.currency
  const vessel = value?.vessel?.currency
  if (enzyme !== undefined && vessel !== undefined && enzyme !== vessel) {
    complain(
      ctx,
      `found money in ${vessel}, while costs.enzyme is in ${enzyme}; use one currency throughout`,
      'vessel',
    )
  }
}, onObject)

const relative = (what: string) =>
  numberField(`the relative standard deviation of ${what}`, { atLeast: 0 }).exactOptional()

/** `spreads` of the file. */
export const spreads = record('how much things scatter', {
  rate: relative('the rate'),
  Km: relative('Km'),
  Kic: relative('Kic'),
  Kiu: relative('Kiu'),
  Ksi: relative('Ksi'),
  Keq: relative('Keq'),
  kd: relative('kd'),
  lotActivity: relative("a lot's activity"),
  dose: relative('the dose'),
  concentration: relative('the concentration charged'),
  temperature: quantityField('temperature difference', 'at-least', {
    title: 'the standard deviation of the temperature',
    example: '0.4 K',
  }).exactOptional(),
  pH: numberField('the standard deviation of the pH', { atLeast: 0 }).exactOptional(),
})
