import { changeSettings, readSettings } from '@/api/settings'
import { KEYS } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'

export const useSettings = () => useAsked(KEYS.settings, readSettings)
export const useChangeSettings = () =>
  useAct((input: Parameters<typeof changeSettings>[0]) => changeSettings(input), {
    changes: () => [KEYS.settings],
  })
