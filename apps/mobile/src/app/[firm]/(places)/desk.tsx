import { deferredScreen } from '../../../features/deferred-screen.ts';

export default deferredScreen('desk/desk-screen');
