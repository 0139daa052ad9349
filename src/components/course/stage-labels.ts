import type { StageName } from '@shared/course'

export const STAGE_LABELS = {
  picture: 'Picture',
  evidence: 'Evidence',
  section: 'Section',
  review: 'Review',
  knife: 'Knife',
  lengths: 'Lengths',
  bench: 'Bench',
  finish: 'Finish',
} satisfies Record<StageName, string>
