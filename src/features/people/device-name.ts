/** Browsers by the word that tells them apart, the telling ones first: most claim to be others too. */
const browsers: [mark: RegExp, name: string][] = [
  [/\bEdgA?\/|\bEdgiOS\//, 'Edge'],
  [/\bOPR\/|\bOPiOS\//, 'Opera'],
  [/\bSamsungBrowser\//, 'Samsung'],
  [/\bFirefox\/|\bFxiOS\//, 'Firefox'],
  [/\bChrome\/|\bCriOS\//, 'Chrome'],
  [/\bSafari\//, 'Safari'],
];

const systems: [mark: RegExp, name: string][] = [
  [/\biPhone\b/, 'iPhone'],
  [/\biPad\b/, 'iPad'],
  [/\bAndroid\b/, 'Android'],
  [/\bWindows\b/, 'Windows'],
  [/\bCrOS\b/, 'ChromeOS'],
  [/\bMacintosh\b/, 'Mac'],
  [/\bLinux\b/, 'Linux'],
];

function firstName(marks: [RegExp, string][], description: string): string | null {
  return marks.find(([mark]) => mark.test(description))?.[1] ?? null;
}

/** What a browser says of itself, as its owner knows it; null for a part that it does not say. */
export function nameDevice(description: string): { browser: string | null; system: string | null } {
  return { browser: firstName(browsers, description), system: firstName(systems, description) };
}
