import { Model } from 'sequelize'
import type { CreationOptional, InferAttributes, InferCreationAttributes, Sequelize } from 'sequelize'
import type { OrderInput } from '@shared/contracts'
import type { OrderEventName, OrderStateName } from '@shared/course'
import {
  dayOrNone,
  document,
  instant,
  key,
  line,
  moneyOrNone,
  ownKey,
  whole,
  word,
  wordOrNone,
  yesOrNo,
} from './columns'

/** What a mill is asked to grind and run from one approved issue, by the card that it had then. */
export class KnifeOrder extends Model<InferAttributes<KnifeOrder>, InferCreationAttributes<KnifeOrder>> {
  declare id: CreationOptional<string>
  declare number: string
  declare commissionId: string
  declare issueId: string
  declare millId: string
  declare millCardId: string
  declare document: OrderInput
  declare state: OrderStateName
  declare heldFrom: CreationOptional<OrderStateName | null>
  declare refusals: CreationOptional<number>
  declare byId: string
  declare at: Date
}

/** A step of an order's course: who, when, and what was said with it. */
export class OrderEvent extends Model<InferAttributes<OrderEvent>, InferCreationAttributes<OrderEvent>> {
  declare id: CreationOptional<string>
  declare orderId: string
  declare seq: number
  declare event: OrderEventName
  declare fromState: OrderStateName | null
  declare toState: OrderStateName
  declare actorId: string
  declare actorName: string
  declare onBehalfOfMill: boolean
  declare note: string
  declare price: string | null
  declare promised: string | null
  declare at: Date
}

/** The sheet as it went to the mill, byte for byte. */
export class OrderSheet extends Model<InferAttributes<OrderSheet>, InferCreationAttributes<OrderSheet>> {
  declare id: CreationOptional<string>
  declare orderId: string
  declare format: 'pdf' | 'dxf' | 'svg'
  declare fileId: string
}

export function bindOrders(sequelize: Sequelize): void {
  KnifeOrder.init(
    {
      id: ownKey(),
      number: line(32),
      commissionId: key(),
      issueId: key(),
      millId: key(),
      millCardId: key(),
      document: document(),
      state: word(),
      heldFrom: wordOrNone(),
      refusals: { ...whole(), defaultValue: 0 },
      byId: key(),
      at: instant(),
    },
    { sequelize, tableName: 'knife_order' },
  )
  OrderEvent.init(
    {
      id: ownKey(),
      orderId: key(),
      seq: whole(),
      event: word(),
      fromState: wordOrNone(),
      toState: word(),
      actorId: key(),
      actorName: line(200),
      onBehalfOfMill: yesOrNo(),
      note: line(5000),
      price: moneyOrNone(),
      promised: dayOrNone(),
      at: instant(),
    },
    { sequelize, tableName: 'order_event' },
  )
  OrderSheet.init(
    { id: ownKey(), orderId: key(), format: word(), fileId: key() },
    { sequelize, tableName: 'order_sheet' },
  )
}
