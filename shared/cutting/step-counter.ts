import type { PlanOptions } from './cut-instance'

/** How much has been tried; ends a search by count or on request, never by a clock. */
export interface StepCounter {
  steps: number
  readonly stepLimit: number
  hasEnded: boolean
  readonly options: PlanOptions
}

export const DEFAULT_STEP_LIMIT = 4_000_000
const STEPS_PER_REPORT = 8192

export const stepCounterFrom = (options: PlanOptions): StepCounter => ({
  steps: 0,
  stepLimit: options.stepLimit ?? DEFAULT_STEP_LIMIT,
  hasEnded: false,
  options,
})

/** Counts one step; true where the search must end now. */
export function hasEndedAfterStep(counter: StepCounter): boolean {
  counter.steps += 1
  if (counter.steps % STEPS_PER_REPORT === 0) {
    counter.options.onProgress?.({ steps: counter.steps, stepLimit: counter.stepLimit })
    if (counter.options.isStopped?.() === true) counter.hasEnded = true
  }
  if (counter.steps >= counter.stepLimit) counter.hasEnded = true
  return counter.hasEnded
}

/** A counter for a part of the work: ends after so many steps of its own, or with the whole. */
export function withAllowance<T>(counter: StepCounter, steps: number, work: (part: StepCounter) => T): T {
  const part: StepCounter = {
    ...counter,
    stepLimit: Math.min(counter.stepLimit, counter.steps + steps),
  }
  const result = work(part)
  counter.steps = part.steps
  counter.hasEnded =
    counter.hasEnded || counter.steps >= counter.stepLimit || counter.options.isStopped?.() === true
  return result
}
