import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('firm/firm-screen');
