import { inviteFirstManager } from '@server/services/first-manager'

/** The token of a first manager's link, as the start prints it; undefined: somebody is there already. */
export const aFirstManagerToken = (): Promise<string | undefined> => inviteFirstManager()
