/** Runs a small program to its end: a fault is one clear line and a failing exit, never a stack on the screen. */
export function runProgram(work: () => Promise<void>): void {
  work().then(
    () => process.exit(0),
    (error: unknown) => {
      process.stderr.write(`${error instanceof Error ? error.message : String(error)}\n`)
      process.exit(1)
    },
  )
}
