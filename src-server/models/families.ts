import type { Sequelize } from 'sequelize'
import { bindCommissions } from './commission'
import { bindCutLists } from './cut-list'
import { bindDrafts } from './draft'
import { bindFiles } from './file'
import { bindOperations } from './operation'
import { bindLetters } from './letter'
import { bindOrders } from './order'
import { bindPeople } from './person'
import { bindPhotographs } from './photograph'
import { bindRack } from './rack'
import { bindReview } from './review'
import { bindSessions } from './session'
import { bindTrail } from './trail'
import { bindWorkshop } from './workshop'

/** Every family of models; each binds its models to the database when it is opened. */
export const MODEL_FAMILIES: readonly ((sequelize: Sequelize) => void)[] = [
  bindPeople,
  bindSessions,
  bindWorkshop,
  bindCommissions,
  bindFiles,
  bindPhotographs,
  bindDrafts,
  bindReview,
  bindOrders,
  bindLetters,
  bindRack,
  bindCutLists,
  bindTrail,
  bindOperations,
]
