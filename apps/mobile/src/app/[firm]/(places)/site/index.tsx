import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('site/site-screen');
