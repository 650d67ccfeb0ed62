import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('issued/issued-report-screen');
