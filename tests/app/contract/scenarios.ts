/** Sound scenarios that tests start from, as a file holds them. */

/** A value of a JSON file, for editing in a test. */
export type Json = string | number | boolean | null | Json[] | { [key: string]: Json }

/** The short form with every part of the format's page. */
export const shortForm = (): { [key: string]: Json } => ({
  format: 'dosewright-scenario',
  version: 1,
  title: 'Lactose in permeate',
  feed: {
    volume: '12 m3',
    substrate: { name: 'lactose', molarMass: '342.3 g/mol', concentration: '45 g/L' },
    product: { name: 'galactose', massYield: 0.5263, concentration: '0 g/L' },
  },
  enzyme: {
    name: 'an invented lactase',
    form: 'liquid',
    density: '1.15 kg/L',
    rate: {
      specificRate: '95 g/g/h',
      reference: { temperature: '40 degC', pH: 6.7 },
      Km: '8 g/L',
      Kic: '5 g/L',
      Kiu: '40 g/L',
      Ksi: '300 g/L',
      Keq: 3.2,
    },
    temperature: { Ea: '45 kJ/mol' },
    pH: { pKa1: 5.2, pKa2: 8.1 },
    inactivation: { kd: '0.08 1/h', at: '40 degC', Ea: '230 kJ/mol' },
  },
  programme: { temperature: '42 degC', pH: 6.7, dose: '3.5 kg', hold: '10 h' },
  costs: { enzyme: '30 EUR/kg', vessel: '85 EUR/h', turnaround: '90 min' },
  spreads: {
    rate: 0.08,
    Km: 0.15,
    Kic: 0.2,
    kd: 0.25,
    lotActivity: 0.04,
    concentration: 0.02,
    temperature: '0.4 K',
    pH: 0.05,
  },
  ask: { find: 'time', conversion: 0.95 },
})

/** The programme of the format's page in phases. */
export const phased = (): { [key: string]: Json } => ({
  ...shortForm(),
  programme: {
    start: { temperature: '10 degC', pH: 6.7 },
    phases: [
      { phase: 'heat', to: '42 degC', ramp: '0.5 K/min' },
      { phase: 'dose', amount: '3.5 kg' },
      { phase: 'hold', for: '6 h' },
      { phase: 'dose', amount: '0.8 kg' },
      { phase: 'feed', flow: '500 L/h', for: '2 h', concentration: '150 g/L' },
      { phase: 'hold', for: '4 h' },
      { phase: 'inactivate', to: '85 degC', ramp: '1 K/min', hold: '10 min' },
      { phase: 'cool', to: '8 degC', ramp: '1 K/min' },
    ],
  },
})

/** A copy with the value at a path replaced; undefined removes the key. Paths as in fault lines. */
export const edited = (
  source: { [key: string]: Json },
  ...edits: readonly (readonly [path: string, value: Json | undefined])[]
): { [key: string]: Json } => {
  const copy = structuredClone(source)
  for (const [path, value] of edits) {
    const steps = path.split(/[.[\]]+/).filter((step) => step !== '')
    const last = steps.pop() ?? ''
    let at: { [key: string]: Json } = copy
    for (const step of steps) at = at[step] as { [key: string]: Json }
    if (value === undefined) delete at[last]
    else at[last] = value
  }
  return copy
}
