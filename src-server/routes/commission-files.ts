import { COMMISSION_FILE_BYTES, IdParams, ImportAnswer, ImportRequest } from '@shared/contracts'
import { fileAnswer } from '../files/file-answer'
import { exportCommission } from '../services/export-commission'
import { importCommission } from '../services/import-commission'
import { route } from './route'

const exportRoute = route({
  method: 'get',
  path: '/commissions/:id/file',
  right: 'file.export',
  see: 'commission.read',
  params: IdParams,
  answer: 'file',
  handle: async ({ actor, params }) => {
    const { name, text } = await exportCommission(actor, params.id)
    const bytes = new TextEncoder().encode(text)
    return fileAnswer({ from: { bytes }, type: 'application/json', name, inline: false, cache: 'never' })
  },
})

const importRoute = route({
  method: 'post',
  path: '/commissions/import',
  right: 'file.import',
  see: 'commission.list',
  body: ImportRequest,
  // The file and the few words about it.
  bodyBytes: COMMISSION_FILE_BYTES + 1000,
  answer: ImportAnswer,
  handle: ({ actor, body }) => importCommission(actor, body),
})

export const COMMISSION_FILE_ROUTES = [importRoute, exportRoute]
