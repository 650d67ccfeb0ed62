export { ResetPasswordScreen as default } from '../../features/account/reset-password-screen.tsx';
