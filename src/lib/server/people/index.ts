export { signIn, signOut, type SignedInPerson } from './sign-in';
export { lucia, sessionOf, listSessions, endSession, type LiveSession } from './sessions';
export { hashPassword, verifyPassword } from './passwords';
export { changePassword, TOO_EASY, tooEasy } from './account';
export { requireCan } from './require';
export { addPerson, changeRoles, disablePerson, enablePerson, makePerson, randomPassword, team } from './team';
