const browsers = [
  ['Edg/', 'Edge'],
  ['Firefox/', 'Firefox'],
  ['Chrome/', 'Chrome'],
  ['Safari/', 'Safari'],
] as const;
const systems = ['iPhone', 'iPad', 'Android', 'Windows', 'Mac OS', 'Linux'] as const;

/** What a person would call the device that a browser says it runs on. */
export function deviceName(userAgent: string): string {
  // The order matters: Edge calls itself Chrome too, Chrome calls itself Safari, Android calls itself Linux.
  const browser = browsers.find(([sign]) => userAgent.includes(sign))?.[1];
  const system = systems.find((sign) => userAgent.includes(sign));
  if (!browser && !system) return 'A device that does not say what it is';
  return [browser ?? 'A browser', system].filter(Boolean).join(' on ');
}
