export { AppRoot as default } from '../features/shell/app-root.tsx';
export { ErrorScreen as ErrorBoundary } from '../features/shell/error-screen.tsx';
