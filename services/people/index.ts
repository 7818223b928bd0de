import 'server-only';
export { acceptInvitation, readInvitation } from './accept-invitation';
export { type Added, addPerson, createFirstOwner } from './add-person';
export { askForLink } from './ask-for-link';
export { afterSignIn, answerAuth, currentActor, currentVisit } from './auth';
export { changePassword } from './change-password';
export { changeRoles } from './change-roles';
export { createAccount } from './create-account';
export { endSession, signOutEverywhere } from './end-sessions';
export { inviteStaff, sendNewWayIn } from './invite-staff';
export { type ChainReport, listChanges, verifyChanges } from './list-changes';
export { type DemoPersonView, listDemoPeople, signInDemo } from './sign-in-demo';
export { ownerOfYard } from './owner-of-yard';
export { signInWithLink } from './sign-in-with-link';
export { signInWithPassword } from './sign-in-with-password';
export {
  type LinkMailView,
  listPeople,
  readAccount,
  readInvitationForMail,
  readLinkForMail,
  readPersonForMail,
  readStaff,
} from './views';
export type { Visit } from './visit';
