import { expect, test } from 'vitest';
import { deviceName } from '../../apps/mobile/src/features/account/device-name.ts';

const chrome = 'Mozilla/5.0 (Linux; Android 15) AppleWebKit/537.36 (KHTML, like Gecko) Chrome/140.0.0.0 Mobile Safari/537.36';

test('names browser and system as people do', () => {
  expect(deviceName(chrome)).toBe('Chrome on Android');
  expect(deviceName(chrome.replace('Mobile Safari/537.36', 'Edg/140.0').replace('Linux; Android 15', 'Windows NT 10.0'))).toBe(
    'Edge on Windows',
  );
  expect(deviceName('Mozilla/5.0 (iPhone; CPU iPhone OS 19_0 like Mac OS X) AppleWebKit/605 Version/19.0 Mobile Safari/604')).toBe(
    'Safari on iPhone',
  );
  expect(deviceName('')).toBe('A device that does not say what it is');
});
