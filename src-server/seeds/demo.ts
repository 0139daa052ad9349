import { randomBytes } from 'node:crypto'
import { rename, writeFile } from 'node:fs/promises'
import { join } from 'node:path'
import type { Actor } from '@shared/access'
import type { RoleName } from '@shared/contracts'
import { Person } from '../models/person'
import { enterDemoPeople } from './people'
import { enterDemoWorkshop } from './workshop'

export interface DemoSurroundings {
  /** Where the sign-ins are noted for whoever started the demo. */
  readonly dataDir: string
}

/** A way into the demo, as the start prints it. */
export interface DemoSignIn {
  readonly role: RoleName
  readonly name: string
  readonly email: string
  readonly password: string
}

/** Fills an empty database with a workshop of our own invention. Passwords are new for every installation. */
export async function fillDemo({ dataDir }: DemoSurroundings): Promise<void> {
  if ((await Person.count()) > 0)
    throw new Error('The database holds people already; the demo was not filled in.')
  const workshop = await enterDemoWorkshop(FOUNDER)
  const signIns = await enterDemoPeople(FOUNDER, workshop, newPassword)
  await noteSignIns(join(dataDir, 'demo-sign-ins.json'), signIns)
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
