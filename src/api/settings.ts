import { SettingsAnswer } from '@shared/contracts'
import type { OutputOf, SettingsRequest } from '@shared/contracts'
import { ask, send } from './request'

export const readSettings = (signal?: AbortSignal) => ask(SettingsAnswer, ['settings'], { signal })
export const changeSettings = (body: OutputOf<typeof SettingsRequest>) =>
  send(SettingsAnswer, 'PUT', ['settings'], { body })
