import { deferredScreen } from '../../../../features/deferred-screen.ts';

export default deferredScreen('structures/structure-form-screen');
