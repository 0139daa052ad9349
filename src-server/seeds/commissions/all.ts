import type { Story } from '../story'
import { tellOfTheHill, tellOfTheRidges, tellOfTheShipwright } from './in-review'
import { tellOfTheLinnet, tellOfTheUpland } from './just-begun'
import { tellOfLowWater } from './low-water'
import { tellOfPebbles } from './pebbles'
import { tellOfLamplight, tellOfTheOrchard, tellOfThePilot } from './with-the-mill'

/** Every commission of the demo, the oldest first, so that numbers rise with the days. */
export async function tellStories(story: Story): Promise<void> {
  await tellOfLowWater(story)
  await tellOfThePilot(story)
  await tellOfPebbles(story)
  await tellOfTheOrchard(story)
  await tellOfTheShipwright(story)
  await tellOfLamplight(story)
  await tellOfTheHill(story)
  await tellOfTheRidges(story)
  await tellOfTheUpland(story)
  await tellOfTheLinnet(story)
}
