export { accountsRoutes } from './accounts-router';
export {
  findAssociation,
  findPeople,
  findPeopleByAddressOrNumber,
  findPerson,
  insertAssociation,
  searchPeople,
  updatePerson,
  type AssociationRow,
  type PersonRow,
} from './accounts-queries';
export { ensurePerson, type PersonFacts } from './ensure-person';
export { inviteFirstAdministrator } from './invite';
export { changeRoles } from './manage-people';
export { hashPassword } from './passwords';
export { checkPassword, findActor } from './sign-in';
