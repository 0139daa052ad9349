import { randomBytes } from 'node:crypto'
import { rename, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { Actor } from '@shared/access'
import { Person } from '../models/person'
import { tellStories } from './commissions/all'
import { onDay } from './days'
import { enterDemoPeople } from './people'
import type { DemoSignIn } from './people'
import { enterDemoWorkshop } from './workshop'

export interface DemoSurroundings {
  /** Where the sign-ins are noted for whoever started the demo. */
  readonly dataDir: string
}

/** Fills an empty database with a workshop of our own invention. Passwords are new for every installation. */
export async function fillDemo({ dataDir }: DemoSurroundings): Promise<void> {
  if ((await Person.count()) > 0)
    throw new Error('The database holds people already; the demo was not filled in.')
  const { workshop, people } = await onDay(90, 9, async () => {
    const entered = await enterDemoWorkshop(FOUNDER)
    return { workshop: entered, people: await enterDemoPeople(FOUNDER, entered, newPassword) }
  })
  await tellStories({ ...workshop, people: people.actors })
  await noteSignIns(join(dataDir, 'demo-sign-ins.json'), people.signIns)
}

/** Acts until there is a manager. */
const FOUNDER: Actor = {
  personId: '00000000-0000-7000-8000-000000000000',
  name: 'Listel',
  memberships: [{ role: 'manager', clientId: null, millId: null }],
}

/** 80 bits of chance, easy to type: four groups without letters that look alike. */
function newPassword(): string {
  const letters = 'abcdefghjkmnpqrstuvwxyz23456789x'
  const text = [...randomBytes(16)].map((byte) => letters[byte % 32]).join('')
  return (text.match(/.{4}/g) ?? []).join('-')
}

async function noteSignIns(path: string, signIns: readonly DemoSignIn[]): Promise<void> {
  const scratch = `${path}.${process.pid}`
  await writeFile(scratch, `${JSON.stringify(signIns, null, 2)}\n`, { mode: 0o600 })
  await rename(scratch, path)
}
