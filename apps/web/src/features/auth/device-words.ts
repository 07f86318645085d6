const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/\bEdg(?:A|iOS)?\//, 'Edge'],
  [/\bOPR\//, 'Opera'],
  [/\bSamsungBrowser\//, 'Samsung browser'],
  [/\bFirefox\/|\bFxiOS\//, 'Firefox'],
  [/\bCriOS\/|Chrom(?:e|ium)\//, 'Chrome or Chromium'],
  [/\bSafari\//, 'Safari'],
];
const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/\biPhone\b/, 'iPhone'],
  [/\biPad\b/, 'iPad'],
  [/\bAndroid\b/, 'Android'],
  [/\bWindows\b/, 'Windows'],
  [/\bMac OS X\b|\bMacintosh\b/, 'Mac'],
  [/\bCrOS\b/, 'ChromeOS'],
  [/\bLinux\b/, 'Linux'],
];

/** "Firefox on Windows", as far as the browser says it: a hint to recognise a device by, never a proof. */
export function deviceWords(userAgent: string | null): string {
  const [browser, system] = [BROWSERS, SYSTEMS].map((list) => list.find(([mark]) => mark.test(userAgent ?? ''))?.[1]);
  if (browser === undefined) return system ?? 'Unknown device';
  return system === undefined ? browser : `${browser} on ${system}`;
}
