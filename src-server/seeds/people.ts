import type { Actor } from '@shared/access'
import type { RoleName } from '@shared/contracts'
import { takeInPerson } from '../services/people'
import type { DemoSignIn } from './demo'
import type { DemoWorkshop } from './workshop'

interface DemoPerson {
  readonly name: string
  readonly email: string
  readonly role: RoleName
  readonly clientId?: string
  readonly millId?: string
}

/** Everybody in the demo, each with a password that is told only to whoever started it. */
export async function enterDemoPeople(
  actor: Actor,
  workshop: DemoWorkshop,
  newPassword: () => string,
): Promise<readonly DemoSignIn[]> {
  const signIns: DemoSignIn[] = []
  for (const { name, email, role, clientId, millId } of peopleOf(workshop)) {
    const password = newPassword()
    const membership = { role, clientId: clientId ?? null, millId: millId ?? null }
    await takeInPerson(actor, { name, email, password, memberships: [membership] })
    signIns.push({ role, name, email, password })
  }
  return signIns
}

const peopleOf = ({ clientIds, millIds }: DemoWorkshop): readonly DemoPerson[] => [
  { name: 'Maren Ashgrove', email: 'maren@ashgrove-lunn.example', role: 'manager' },
  { name: 'Tobias Lunn', email: 'tobias@ashgrove-lunn.example', role: 'designer' },
  { name: 'Ines Corder', email: 'ines@ashgrove-lunn.example', role: 'designer' },
  {
    name: 'Dr Hanna Weft',
    email: 'hanna.weft@harbour-museum.example',
    role: 'curator',
    clientId: clientIds.harbourMuseum,
  },
  {
    name: 'Piers Nolloth',
    email: 'p.nolloth@tarn-college.example',
    role: 'curator',
    clientId: clientIds.collegeGallery,
  },
  {
    name: 'Jon Brackley',
    email: 'jon@riverside-planing.example',
    role: 'mill',
    millId: millIds.riverside,
  },
  { name: 'Sam Reddick', email: 'sam@ashgrove-lunn.example', role: 'bench' },
]
