export { StartScreen as default } from '../features/shell/start-screen.tsx';
