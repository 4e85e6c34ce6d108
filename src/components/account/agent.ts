const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/Edg\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/Firefox\//, 'Firefox'],
  [/Chrome\/|Chromium\/|HeadlessChrome\//, 'Chrome or Chromium'],
  [/Safari\//, 'Safari'],
];
const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/Android/, 'Android'],
  [/iPhone|iPad/, 'iOS'],
  [/Windows/, 'Windows'],
  [/Mac OS X|Macintosh/, 'macOS'],
  [/CrOS/, 'ChromeOS'],
  [/Linux|X11/, 'Linux'],
];

const first = (table: readonly (readonly [RegExp, string])[], agent: string) => table.find(([sign]) => sign.test(agent))?.[1];

/** A user-agent line in words a person recognises their own device by: "Firefox on Linux". */
export function describeAgent(agent: string): string {
  const browser = first(BROWSERS, agent);
  const system = first(SYSTEMS, agent);
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? system ?? 'An unknown program';
}
