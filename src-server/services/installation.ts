/** What the services must know of the installation they run in; set once when the application is built. */
export interface Installation {
  /** Address that letters and links use, without a slash at its end. */
  readonly publicUrl: string
  readonly caughtMailDir: string | undefined
  /** The address that letters come from. */
  readonly mailFrom: string
}

let held: Installation | undefined

export function setInstallation(installation: Installation): void {
  held = installation
}

export function installation(): Installation {
  if (held === undefined) throw new Error('the application has not been built')
  return held
}
