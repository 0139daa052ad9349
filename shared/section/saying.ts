/** A worked-out length in a sentence, mm to a micrometre; given numbers are repeated as they were given. */
export const saidMm = (valueMm: number): string => String(Number(valueMm.toFixed(3)))

/** An angle in a sentence, degrees to a tenth. */
export const saidDegrees = (degrees: number): string => String(Number(degrees.toFixed(1)))
