export { InvitationScreen as default } from '../../../features/account/invitation-screen.tsx';
