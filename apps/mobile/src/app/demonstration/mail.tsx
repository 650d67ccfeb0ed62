import { deferredScreen } from '../../features/deferred-screen.ts';

export default deferredScreen('demonstration/mail-screen');
