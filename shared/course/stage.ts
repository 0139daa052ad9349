/** The stages of a commission, in the order of the work. None is ever locked against looking. */
export const STAGES = [
  'picture',
  'evidence',
  'section',
  'review',
  'knife',
  'lengths',
  'bench',
  'finish',
] as const
export type StageName = (typeof STAGES)[number]

/** What is known of a commission, enough to say where it stands. */
export interface CommissionFacts {
  readonly pictures: number
  readonly measuredPictures: number
  readonly photographs: number
  readonly draftMembers: number
  readonly issue: 'none' | 'put-forward' | 'returned' | 'approved' | 'withdrawn' | 'superseded'
  readonly draftMovedOn: boolean
  readonly order:
    | 'none'
    | 'awaits-mill'
    | 'awaits-manager'
    | 'awaits-first-off-decision'
    | 'held'
    | 'cancelled'
    | 'first-off-settled'
  readonly rackHasShape: boolean
  readonly cutList: 'none' | 'closed' | 'open' | 'done' | 'superseded'
}

/** Where a commission stands: the stage, what it waits for, and who must act next (null: nobody). */
export interface Standing {
  readonly stage: StageName
  readonly waitsFor: string
  readonly role: 'manager' | 'designer' | 'curator' | 'mill' | 'bench' | null
}

/** Reads the facts from the bench backwards: the furthest thing that has begun says where the commission stands. */
export function standingOf(facts: CommissionFacts): Standing {
  if (facts.cutList === 'done')
    return { stage: 'finish', waitsFor: 'All rails are cut: on to the finish', role: null }
  if (facts.cutList === 'open') return { stage: 'bench', waitsFor: 'The bench cuts the rails', role: 'bench' }
  if (facts.issue === 'approved') return approvedStanding(facts)
  switch (facts.issue) {
    case 'put-forward':
      return { stage: 'review', waitsFor: 'The curator looks at the drawing', role: 'curator' }
    case 'returned':
      return {
        stage: 'review',
        waitsFor: "The curator's remarks want an answer and a new issue",
        role: 'designer',
      }
    case 'withdrawn':
      return {
        stage: 'review',
        waitsFor: 'The approval was withdrawn: settle why, then decide again',
        role: 'designer',
      }
    case 'none':
    case 'superseded':
      return drawingStanding(facts)
  }
}

function approvedStanding(facts: CommissionFacts): Standing {
  switch (facts.order) {
    case 'held':
      return { stage: 'knife', waitsFor: 'The knife order is held: resume or cancel it', role: 'designer' }
    case 'awaits-mill':
      return { stage: 'knife', waitsFor: 'The mill is to answer', role: 'mill' }
    case 'awaits-manager':
      return { stage: 'knife', waitsFor: 'The price waits to be accepted', role: 'manager' }
    case 'awaits-first-off-decision':
      return { stage: 'knife', waitsFor: 'The first-off waits to be accepted or refused', role: 'designer' }
    case 'none':
    case 'cancelled':
      if (!facts.rackHasShape)
        return { stage: 'knife', waitsFor: 'Approved: the knife order can go to a mill', role: 'designer' }
      return lengthsStanding(facts)
    case 'first-off-settled':
      return lengthsStanding(facts)
  }
}

function lengthsStanding(facts: CommissionFacts): Standing {
  return facts.cutList === 'closed'
    ? { stage: 'lengths', waitsFor: 'The cut list waits to be opened to the bench', role: 'designer' }
    : { stage: 'lengths', waitsFor: 'Rails are to be planned on lengths', role: 'designer' }
}

function drawingStanding(facts: CommissionFacts): Standing {
  if (facts.pictures === 0 || facts.measuredPictures < facts.pictures) {
    return { stage: 'picture', waitsFor: 'The picture is to be measured', role: 'designer' }
  }
  if (facts.photographs === 0 && facts.draftMembers === 0) {
    return {
      stage: 'evidence',
      waitsFor: 'A photograph of the old frame, or another reason for its shape',
      role: 'designer',
    }
  }
  return { stage: 'section', waitsFor: 'The section is being drawn', role: 'designer' }
}
