const BROWSERS: readonly (readonly [RegExp, string])[] = [
  [/Edg\//, 'Edge'],
  [/OPR\//, 'Opera'],
  [/SamsungBrowser\//, 'Samsung Internet'],
  [/Firefox\/|FxiOS\//, 'Firefox'],
  [/CriOS\/|Chrome\//, 'Chrome'],
  [/Safari\//, 'Safari'],
]
const SYSTEMS: readonly (readonly [RegExp, string])[] = [
  [/iPhone/, 'iPhone'],
  [/iPad/, 'iPad'],
  [/Android/, 'Android'],
  [/Windows/, 'Windows'],
  [/Mac OS X/, 'Mac'],
  [/CrOS/, 'Chromebook'],
  [/Linux/, 'Linux'],
]

const first = (table: readonly (readonly [RegExp, string])[], text: string): string | null =>
  table.find(([pattern]) => pattern.test(text))?.[1] ?? null

/** What a person would call the browser and the machine of a user agent, each or both null where it does not say. */
export const parseDevice = (
  userAgent: string | null,
): Readonly<{ browser: string | null; system: string | null }> => ({
  browser: first(BROWSERS, userAgent ?? ''),
  system: first(SYSTEMS, userAgent ?? ''),
})
