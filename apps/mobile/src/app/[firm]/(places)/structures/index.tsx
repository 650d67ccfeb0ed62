import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('structures/structures-screen');
