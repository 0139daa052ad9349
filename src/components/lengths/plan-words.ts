import type { CutListView } from '@shared/contracts'

export interface PlanPrinters {
  readonly length: (mm: number) => string
  readonly lengthWord: (count: number) => string
  readonly currency: string
}

/** What the plan costs or opens, and how surely nothing does with less. “No plan needs fewer” is said only where it is proven. */
export function planWordsOf(list: CutListView, { length, lengthWord, currency }: PlanPrinters): string {
  const { count, proven } = list
  const cost = Number(list.cost ?? 0) === 0 ? undefined : list.cost
  const opened = `${count} ${lengthWord(count)}${cost ? ` for ${cost} ${currency}` : ''}.`
  if (proven)
    return `${opened} ${cost ? 'No plan costs less: it is proven.' : 'No plan needs fewer: it is proven.'}`
  const bound = boundWordsOf(list, { length, currency })
  return `${opened} It is not proven that none does with less${bound === '' ? '' : `: the least that is known to be needed is ${bound}`}.`
}

/** The bound is a cost where there are prices, else a number of pieces or a total length: pieces are never more than those opened. */
function boundWordsOf(
  { bound, cost, count }: CutListView,
  { length, currency }: Pick<PlanPrinters, 'length' | 'currency'>,
): string {
  if (bound === '') return ''
  if (cost) return `${bound} ${currency}`
  const figure = Number(bound)
  return figure <= count ? bound : length(figure)
}
