export { can, type Access, type Action, type Actor, type Role, ROLES, isRole } from './access';
