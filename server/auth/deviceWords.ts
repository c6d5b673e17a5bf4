const browsers: [RegExp, string][] = [
  [/\bEdgA?\//, "Edge"],
  [/\bOPR\//, "Opera"],
  [/\bSamsungBrowser\//, "Samsung Internet"],
  [/\b(?:Firefox|FxiOS)\//, "Firefox"],
  [/\b(?:Chrome|CriOS|Chromium)\//, "Chrome"],
  [/\bVersion\/.*Safari\//, "Safari"],
];
const systems: [RegExp, string][] = [
  [/\bAndroid\b/, "Android"],
  [/\biPhone\b/, "iPhone"],
  [/\biPad\b/, "iPad"],
  [/\bCrOS\b/, "ChromeOS"],
  [/\bWindows\b/, "Windows"],
  [/\bMac OS X\b/, "Mac"],
  [/\bLinux\b/, "Linux"],
];

/** What a User-Agent header says, in words that tell one's own devices apart. Nothing else of it is kept. */
export function deviceWords(userAgent: string | undefined): string {
  const first = (list: [RegExp, string][]) => list.find(([pattern]) => pattern.test(userAgent ?? ""))?.[1];
  const browser = first(browsers);
  const system = first(systems);
  if (browser && system) return `${browser} on ${system}`;
  return browser ?? (system ? `A program on ${system}` : "Unknown device");
}
