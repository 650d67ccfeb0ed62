import { deferredScreen } from '../../features/deferred-screen.ts';

export default deferredScreen('verification/verify-screen');
