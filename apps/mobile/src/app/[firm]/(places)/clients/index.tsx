import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('clients/clients-screen');
