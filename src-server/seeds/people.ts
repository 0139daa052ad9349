import type { Actor } from '@shared/access'
import type { RoleName } from '@shared/contracts'
import { takeInPerson } from '../services/people'
import type { DemoWorkshop } from './workshop'

/** A way into the demo, as the start prints it. */
export interface DemoSignIn {
  readonly role: RoleName
  readonly name: string
  readonly email: string
  readonly password: string
}

interface DemoPerson {
  readonly name: string
  readonly email: string
  readonly role: RoleName
  readonly clientId?: string
  readonly millId?: string
}

export type DemoName = 'maren' | 'tobias' | 'ines' | 'hanna' | 'piers' | 'jon' | 'sam'

/** Everybody in the demo, able to act. */
export type DemoActors = Readonly<Record<DemoName, Actor>>

export interface DemoPeople {
  readonly actors: DemoActors
  readonly signIns: readonly DemoSignIn[]
}

/** Everybody in the demo, each with a password that is told only to whoever started it. */
export async function enterDemoPeople(
  actor: Actor,
  workshop: DemoWorkshop,
  newPassword: () => string,
): Promise<DemoPeople> {
  const wanted = peopleOf(workshop)
  const take = async (name: DemoName) => {
    const { name: fullName, email, role, clientId = null, millId = null } = wanted[name]
    const memberships = [{ role, clientId, millId }]
    const password = newPassword()
    const person = await takeInPerson(actor, { name: fullName, email, password, memberships })
    return {
      actor: { personId: person.id, name: fullName, memberships },
      signIn: { role, name: fullName, email, password },
    }
  }
  const [maren, tobias, ines, hanna, piers, jon, sam] = await Promise.all([
    take('maren'),
    take('tobias'),
    take('ines'),
    take('hanna'),
    take('piers'),
    take('jon'),
    take('sam'),
  ])
  return {
    actors: {
      maren: maren.actor,
      tobias: tobias.actor,
      ines: ines.actor,
      hanna: hanna.actor,
      piers: piers.actor,
      jon: jon.actor,
      sam: sam.actor,
    },
    signIns: [maren, tobias, ines, hanna, piers, jon, sam].map(({ signIn }) => signIn),
  }
}

const peopleOf = ({ clientIds, millIds }: DemoWorkshop): Readonly<Record<DemoName, DemoPerson>> => ({
  maren: { name: 'Maren Ashgrove', email: 'maren@ashgrove-lunn.example', role: 'manager' },
  tobias: { name: 'Tobias Lunn', email: 'tobias@ashgrove-lunn.example', role: 'designer' },
  ines: { name: 'Ines Corder', email: 'ines@ashgrove-lunn.example', role: 'designer' },
  hanna: {
    name: 'Dr Hanna Weft',
    email: 'hanna.weft@harbour-museum.example',
    role: 'curator',
    clientId: clientIds.harbourMuseum,
  },
  piers: {
    name: 'Piers Nolloth',
    email: 'p.nolloth@tarn-college.example',
    role: 'curator',
    clientId: clientIds.collegeGallery,
  },
  jon: {
    name: 'Jon Brackley',
    email: 'jon@riverside-planing.example',
    role: 'mill',
    millId: millIds.riverside,
  },
  sam: { name: 'Sam Reddick', email: 'sam@ashgrove-lunn.example', role: 'bench' },
})
