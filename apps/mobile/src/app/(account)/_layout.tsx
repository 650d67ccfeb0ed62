export { AccountLayout as default } from '../../features/account/account-layout.tsx';
