import { describe, expect, it } from 'vitest'
import type { MillCard } from '@shared/contracts'
import { STAGES } from '@shared/course'
import { stageShapesOf } from '@/components/course/course-profile'
import { cardFrom, enteredCardFrom } from '@/components/mill/entered-card'
import { waysOf } from '@/components/shell/ways'

const namesOf = (...roles: Parameters<typeof waysOf>[0]) => waysOf(roles).map(({ to }) => to)

describe('the ways of a person', () => {
  it('are those of the role', () => {
    expect(namesOf('curator')).toEqual(['waiting', 'commissions'])
    expect(namesOf('mill')).toEqual(['waiting', 'orders'])
    expect(namesOf('bench')).toEqual(['waiting', 'cut-lists', 'rack'])
  })

  it('are those of all roles together, each once', () => {
    expect(namesOf('bench', 'designer')).toEqual([
      'waiting',
      'commissions',
      'orders',
      'cut-lists',
      'rack',
      'mills',
    ])
  })
})

describe('the moulding of the stages', () => {
  it('has one closed piece for each stage, side by side', () => {
    const shapes = stageShapesOf(STAGES)
    expect(shapes.map(({ stage }) => stage)).toEqual([...STAGES])
    shapes.forEach(({ area }, place) => {
      expect(area).toMatch(new RegExp(`^M${place * 100} `))
      expect(area).toMatch(new RegExp(`H${place * 100}Z$`))
    })
  })
})

describe('a mill’s card as it is typed', () => {
  const card: MillCard = {
    maxWidth: 180,
    maxDepth: 40,
    wheelNose: 0.8,
    wheelWidth: 3,
    maxToothRatio: 2.5,
    sideClearance: { angle: 3, over: 3 },
    leastWood: 6,
    machiningAllowance: 3,
    head: {
      cuttingDiameter: 122,
      hookAngle: 12,
      knives: 2,
      finishingKnives: 1,
      rpm: 6000,
      maxRpm: 8000,
      feed: 9144,
      feedBy: 'mechanical',
    },
    lengths: [
      { length: 3660, price: '18.50' },
      { length: 2440, price: null },
    ],
  }

  it('comes back as it was', () => {
    expect(cardFrom(enteredCardFrom(card))).toEqual(card)
  })

  it('is no card while a figure or a size is missing', () => {
    expect(cardFrom(enteredCardFrom(undefined))).toBeUndefined()
    expect(cardFrom({ ...enteredCardFrom(card), rpm: null })).toBeUndefined()
    expect(cardFrom({ ...enteredCardFrom(card), lengths: [{ length: null, price: '' }] })).toBeUndefined()
  })
})
