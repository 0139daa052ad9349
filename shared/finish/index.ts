/** Finish: gilded stretches of the face, their area and the leaf they take. Lengths mm, areas mm². */
export { LEAVES_PER_BOOK, gildedAreaOf, leafPlanFor } from './leaf'
export type { GildedStretch, Leaf, LeafPlan } from './leaf'
