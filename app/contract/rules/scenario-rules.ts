/** Rules across the parts of a file; they come next. */
export const scenarioRules = (): void => {}
