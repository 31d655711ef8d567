const BROWSERS = [['Edg', 'Edge'], ['OPR', 'Opera'], ['SamsungBrowser', 'Samsung Internet'], ['Firefox', 'Firefox'], ['Chrome', 'Chrome'], ['Safari', 'Safari']] as const;
const SYSTEMS = [['iPhone', 'an iPhone'], ['iPad', 'an iPad'], ['Android', 'an Android phone or tablet'], ['Windows', 'Windows'], ['Mac OS', 'a Mac'], ['CrOS', 'a Chromebook'], ['Linux', 'Linux']] as const;

/** "Firefox on Windows" from what a browser says of itself; its own words when they say neither. */
export function deviceWords(userAgent: string): string {
  const browser = BROWSERS.find(([sign]) => userAgent.includes(sign))?.[1];
  const system = SYSTEMS.find(([sign]) => userAgent.includes(sign))?.[1];
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? userAgent.slice(0, 60);
}
