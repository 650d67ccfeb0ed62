import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('checking/check-revision-screen');
