export { ForgotPasswordScreen as default } from '../../features/account/forgot-password-screen.tsx';
