export { headRunningOf, knifeHeadOf } from './head'
export type { WrittenHead } from './head'
