import type { RoleOfPerson } from '@shared/access'
import type { MembershipView } from '@shared/contracts'

export const ROLE_WORDS = {
  manager: 'Manager',
  designer: 'Designer',
  curator: 'Curator',
  mill: 'Mill',
  bench: 'Bench hand',
} satisfies Record<RoleOfPerson, string>

export const ROLE_CHOICES: readonly { readonly value: RoleOfPerson; readonly label: string }[] = [
  { value: 'manager', label: ROLE_WORDS.manager },
  { value: 'designer', label: ROLE_WORDS.designer },
  { value: 'curator', label: ROLE_WORDS.curator },
  { value: 'mill', label: ROLE_WORDS.mill },
  { value: 'bench', label: ROLE_WORDS.bench },
]

/** A role with the house it is for: “Curator, Northgate collection”. */
export function membershipWords({ role, client, mill }: MembershipView): string {
  const house = client ?? mill
  return house === null ? ROLE_WORDS[role] : `${ROLE_WORDS[role]}, ${house.name}`
}
