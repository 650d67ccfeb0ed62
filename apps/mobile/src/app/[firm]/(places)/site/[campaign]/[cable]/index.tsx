import { deferredScreen } from '../../../../../../features/deferred-screen.ts';

export default deferredScreen('site/entry-screen');
