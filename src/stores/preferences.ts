import { useLocalStorage } from '@vueuse/core'
import { defineStore } from 'pinia'

/** How the list of commissions was last looked through, on this device. */
export interface CommissionFilter {
  readonly state: 'open' | 'archived' | 'all'
  readonly stage: string
  readonly clientId: string
}

export const WHOLE_LIST: CommissionFilter = { state: 'open', stage: '', clientId: '' }

/** What this device remembers of how its user likes things. */
export const usePreferencesStore = defineStore('preferences', () => {
  const commissionFilter = useLocalStorage<CommissionFilter>('listel-commission-filter', WHOLE_LIST, {
    mergeDefaults: true,
  })
  return { commissionFilter }
})
