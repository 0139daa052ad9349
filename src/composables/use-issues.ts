import { toValue } from 'vue'
import type { MaybeRefOrGetter } from 'vue'
import {
  addRemark,
  addRemarkEntry,
  decideIssue,
  previewOrder,
  putForward,
  readDifference,
  readIssue,
  readIssues,
  sendOrder,
} from '@/api/issues'
import { KEYS, keysTouchedBy } from './query-keys'
import { useAct } from './use-act'
import { useAsked } from './use-asked'

export { issueSheetAddress } from '@/api/issues'

type IdSource = MaybeRefOrGetter<string>
type Body<Fn extends (id: string, body: never) => unknown> = Omit<Parameters<Fn>[1], 'operationId'>

/** `null` as an id asks nothing. */
export const useIssue = (id: MaybeRefOrGetter<string | null>) =>
  useAsked(
    () => KEYS.issue(toValue(id) ?? ''),
    (signal) => readIssue(toValue(id) ?? '', signal),
    { when: () => toValue(id) !== null },
  )
export const useIssues = (commissionId: IdSource) =>
  useAsked(
    () => KEYS.issuesOf(toValue(commissionId)),
    (signal) => readIssues(toValue(commissionId), signal),
  )
export const useDifference = (issueId: MaybeRefOrGetter<string | null>) =>
  useAsked(
    () => KEYS.difference(toValue(issueId) ?? ''),
    (signal) => readDifference(toValue(issueId) ?? '', signal),
    { when: () => toValue(issueId) !== null },
  )

export const usePutForward = (commissionId: IdSource) =>
  useAct(
    (input: Body<typeof putForward>, operationId) =>
      putForward(toValue(commissionId), { ...input, operationId }),
    { changes: () => [...keysTouchedBy(toValue(commissionId)), ['issue'], KEYS.orders] },
  )
export const useDecideIssue = (issueId: IdSource) =>
  useAct(
    (input: Body<typeof decideIssue>, operationId) =>
      decideIssue(toValue(issueId), { ...input, operationId }),
    { changes: ({ commission }) => [...keysTouchedBy(commission.id), KEYS.issue(toValue(issueId))] },
  )
export const useAddRemark = (issueId: IdSource, commissionId: IdSource) =>
  useAct(
    (input: Body<typeof addRemark>, operationId) => addRemark(toValue(issueId), { ...input, operationId }),
    { changes: () => [...keysTouchedBy(toValue(commissionId)), KEYS.issue(toValue(issueId))] },
  )
export const useAddRemarkEntry = (issueId: IdSource, commissionId: IdSource) =>
  useAct(
    ({ remarkId, ...entry }: { readonly remarkId: string } & Body<typeof addRemarkEntry>, operationId) =>
      addRemarkEntry(remarkId, { ...entry, operationId }),
    { changes: () => [...keysTouchedBy(toValue(commissionId)), KEYS.issue(toValue(issueId))] },
  )
export const useSendOrder = (issueId: IdSource) =>
  useAct(
    (input: Body<typeof sendOrder>, operationId) => sendOrder(toValue(issueId), { ...input, operationId }),
    { changes: ({ commission }) => [...keysTouchedBy(commission.id), KEYS.orders, KEYS.letters] },
  )
/** Works the letter out without sending it. */
export const usePreviewOrder = (issueId: IdSource) =>
  useAct((input: Body<typeof previewOrder>, operationId) =>
    previewOrder(toValue(issueId), { ...input, operationId }),
  )
