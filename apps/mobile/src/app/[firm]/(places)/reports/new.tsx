import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('reports/start-report-screen');
