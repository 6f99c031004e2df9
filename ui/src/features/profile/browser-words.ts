/** The newer name first: most browsers also carry the names of those they descend from. */
const browsers: readonly (readonly [RegExp, string])[] = [
  [/Edg(?:e|A|iOS)?\/(\d+)/, 'Edge'],
  [/OPR\/(\d+)/, 'Opera'],
  [/(?:Firefox|FxiOS)\/(\d+)/, 'Firefox'],
  [/(?:Headless)?(?:Chrome|CriOS)\/(\d+)/, 'Chrome'],
  [/Version\/(\d+)[\d.]* .*Safari\//, 'Safari'],
];

const systems: readonly (readonly [RegExp, string])[] = [
  [/Windows/, 'Windows'],
  [/Android/, 'Android'],
  [/iPhone|iPad/, 'iOS'],
  [/Mac OS X/, 'macOS'],
  [/Linux|X11/, 'Linux'],
];

/** A browser's long line about itself in words; what is not known is shown as it came. */
export function browserWords(userAgent: string): string {
  const browser = browsers
    .map(([sign, name]) => [sign.exec(userAgent)?.[1], name] as const)
    .find(([at]) => at);
  if (!browser) return userAgent;
  const system = systems.find(([sign]) => sign.test(userAgent))?.[1];
  return `${browser[1]} ${browser[0]}${system ? ` on ${system}` : ''}`;
}
