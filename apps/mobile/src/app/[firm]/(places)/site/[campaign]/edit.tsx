import { deferredScreen } from '../../../../../features/deferred-screen.ts';

export default deferredScreen('campaigns/edit-campaign-screen');
