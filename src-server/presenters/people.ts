import type { ClientView, MembershipView, PersonView, SessionView, Settings } from '@shared/contracts'
import type { Client, Membership, Person } from '../models/person'

export function presentPerson(person: Person): PersonView {
  return {
    id: person.id,
    name: person.name,
    email: person.email,
    state: person.state,
    memberships: (person.memberships ?? []).map(presentMembership),
    version: person.version,
  }
}

function presentMembership({ role, client, mill }: Membership): MembershipView {
  return {
    role,
    client: client ? { id: client.id, name: client.name } : null,
    mill: mill ? { id: mill.id, name: mill.name } : null,
  }
}

export function presentClient({ id, name, state, version }: Client): ClientView {
  return { id, name, state, version }
}

/** The person signed in, with what the workshop has settled on. */
export function presentSession(person: Person, settings: Settings): SessionView {
  const { id, name, email, units, vocabulary } = person
  return {
    person: { id, name, email, units, vocabulary },
    memberships: (person.memberships ?? []).map(presentMembership),
    workshop: {
      name: settings.workshop,
      units: settings.units,
      vocabulary: settings.vocabulary,
      currency: settings.currency,
    },
  }
}
