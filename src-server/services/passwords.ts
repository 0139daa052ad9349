import argon2 from 'argon2'

export const hashPassword = (password: string): Promise<string> => argon2.hash(password)

/** A hash that no password opens, so that an unknown address takes as long to refuse as a known one. */
let nobodys: Promise<string> | undefined

/** Whether the password opens the account; with no account it takes as long, and says no. */
export async function isPasswordOf(passwordHash: string | undefined, password: string): Promise<boolean> {
  nobodys ??= argon2.hash(crypto.randomUUID())
  const isRight = await argon2.verify(passwordHash ?? (await nobodys), password)
  return passwordHash !== undefined && isRight
}
