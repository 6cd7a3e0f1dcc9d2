/** The sound scenario from which the wrong inputs are made, one change each. */

/** One wrong input. */
export interface BadInputCase {
  readonly what: string
  readonly input: string | Uint8Array
  readonly lines: readonly string[]
}

/** A scenario with nothing wrong. */
export const soundScenario = `{
  "format": "dosewright-scenario", "version": 1, "title": "a sound one",
  "feed": {
    "volume": "12 m3",
    "substrate": { "name": "lactose", "molarMass": "342.3 g/mol", "concentration": "45 g/L" },
    "product": { "name": "galactose", "massYield": 0.5263, "concentration": "0 g/L" }
  },
  "enzyme": {
    "density": "1.15 kg/L",
    "rate": { "specificRate": "95 g/g/h", "reference": { "temperature": "40 degC", "pH": 6.7 }, "Km": "8 g/L", "Kic": "5 g/L" },
    "temperature": { "Ea": "45 kJ/mol" },
    "pH": { "pKa1": 5.2, "pKa2": 8.1 },
    "inactivation": { "kd": "0.08 1/h", "at": "40 degC", "Ea": "230 kJ/mol" }
  },
  "programme": { "temperature": "42 degC", "pH": 6.7, "dose": "3.5 kg" },
  "ask": { "find": "time", "conversion": 0.9 }
}`

const shortForm = '{ "temperature": "42 degC", "pH": 6.7, "dose": "3.5 kg" }'

/** The sound scenario with one text in place of another. */
export const changed = (from: string, to: string): string => {
  if (!soundScenario.includes(from)) throw new Error(`the sound scenario has no ${from}`)
  return soundScenario.replace(from, to)
}

/** The sound scenario with these phases for its programme. */
export const phases = (...list: string[]): string =>
  changed(shortForm, `{ "start": { "temperature": "10 degC", "pH": 6.7 }, "phases": [${list.join(', ')}] }`)

/** A phase that doses. */
export const dose = '{ "phase": "dose", "amount": "3.5 kg" }'
/** A phase that holds. */
export const hold = '{ "phase": "hold", "for": "6 h" }'
