import { v7 } from 'uuid'

/** A new key: UUID version 7, which sorts by the time it was made. */
export const newKey = (): string => v7()
