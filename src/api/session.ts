import { Done, SessionAnswer } from '@shared/contracts'
import type { FirstManagerRequest, OutputOf, PreferencesRequest, SignInRequest } from '@shared/contracts'
import { ask, send } from './request'

export const readSession = () => ask(SessionAnswer, ['session'])
export const signIn = (body: OutputOf<typeof SignInRequest>) =>
  send(SessionAnswer, 'POST', ['session'], { body })
export const signOut = () => send(Done, 'DELETE', ['session'])
export const setPreferences = (body: OutputOf<typeof PreferencesRequest>) =>
  send(SessionAnswer, 'PUT', ['session', 'preferences'], { body })
export const makeFirstManager = (body: OutputOf<typeof FirstManagerRequest>) =>
  send(SessionAnswer, 'POST', ['first-manager'], { body })
