export { RIGHTS, can, clientIdsOf, isEverGranted, isOfWorkshop, millIdsOf } from './rights'
export type { Actor, Facts, Right, RoleOfPerson } from './rights'
