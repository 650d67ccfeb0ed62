import { deferredScreen } from '../../../../../../features/deferred-screen.ts';

export default deferredScreen('cables/cable-form-screen');
