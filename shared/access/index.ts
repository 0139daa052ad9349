export { RIGHTS, can, clientIdsOf, isOfWorkshop, millIdsOf } from './rights'
export type { Actor, Facts, Right, RoleOfPerson } from './rights'
