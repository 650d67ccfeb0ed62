import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('campaigns/create-campaign-screen');
