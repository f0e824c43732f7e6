/** What a browser calls itself, in the words of its owner. */

const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/iPhone/, 'an iPhone'],
  [/iPad/, 'an iPad'],
  [/Android/, 'Android'],
  [/Windows/, 'Windows'],
  [/Mac OS X/, 'a Mac'],
  [/CrOS/, 'ChromeOS'],
  [/Linux/, 'Linux'],
];
// the first that fits: most browsers also call themselves by the names of others
const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/Firefox\//, 'Firefox'],
  [/Edg\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/Chrom(e|ium)\//, 'Chrome or Chromium'],
  [/Safari\//, 'Safari'],
];

const nameIn = (names: readonly (readonly [RegExp, string])[], device: string): string | undefined => names.find(([pattern]) => pattern.test(device))?.[1];

/** As "Firefox on Android"; a plain word for one that says nothing. */
export function deviceWords(device: string): string {
  const browser = nameIn(BROWSERS, device);
  const system = nameIn(SYSTEMS, device);
  if (browser === undefined && system === undefined) return 'A browser that does not say which';
  return `${browser ?? 'A browser'} on ${system ?? 'a system that it does not name'}`;
}
