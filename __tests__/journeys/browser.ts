import { chromium, type Browser, type BrowserContext, type Page } from "playwright-core";

/** Sizes at which every screen is tried. */
export const viewports = { phone: { width: 390, height: 844 }, wide: { width: 1440, height: 900 } } as const;
export type Viewport = keyof typeof viewports;

/** What the browser hears: a wav file, nothing plugged in, or a person who refuses. */
export type Microphone = { wav: string } | "none" | "refused";

/**
 * What Chromium shall leave out. Its address bar is a page of its own for every window, which nobody sees here and which took
 * half of the processor; the rest is what Playwright leaves out, for the browser heeds only the last list.
 */
const without = [
  ...["PreloadTopChromeWebUI", "WebUIOmniboxPopup", "WebUIOmniboxAimPopup", "WebUIOmniboxFullPopup", "AimEnabled"],
  ...["AvoidUnnecessaryBeforeUnloadCheckSync", "DestroyProfileOnBrowserClose", "HttpsUpgrades", "LensOverlay"],
  ...["HttpsFirstBalancedModeAutoEnable", "MediaRouter", "PaintHolding", "ThirdPartyStoragePartitioning"],
  ...["AvoidCorsURLLoaderRestartOnRedirect", "OptimizationHints", "NetworkTimeServiceQuerying", "PreconnectToSearch"],
];
const quiet = [
  ...["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking"],
  ...["--disable-component-update", "--disable-sync", "--autoplay-policy=no-user-gesture-required"],
  `--disable-features=${without.join(",")}`,
];

/** Debian's Chromium with the given microphone. The wav is played once, from the moment the page asks for the microphone. */
export function launchBrowser(microphone: Microphone): Promise<Browser> {
  const hearing =
    microphone === "none"
      ? ["--use-fake-ui-for-media-stream"]
      : microphone === "refused"
        ? ["--use-fake-device-for-media-stream", "--deny-permission-prompts"]
        : [
            "--use-fake-ui-for-media-stream",
            "--use-fake-device-for-media-stream",
            `--use-file-for-fake-audio-capture=${microphone.wav}%noloop`,
          ];
  return chromium.launch({ executablePath: "/usr/bin/chromium", headless: true, args: [...quiet, ...hearing] });
}

/** One person's browser: its profile, a page, and the errors that the page met. */
export interface Profile {
  context: BrowserContext;
  page: Page;
  errors: string[];
}

/** A fresh browser profile, with errors of the page collected. */
export async function openProfile(
  browser: Browser,
  address: string,
  viewport: Viewport,
  colorScheme: "light" | "dark" = "light",
): Promise<Profile> {
  const context = await browser.newContext({ baseURL: address, viewport: viewports[viewport], colorScheme });
  const page = await context.newPage();
  page.setDefaultTimeout(20_000);
  const errors: string[] = [];
  page.on("pageerror", (error) => errors.push(error.message));
  page.on("console", (message) => {
    if (message.type() === "error" && /Content Security Policy|Uncaught/.test(message.text()))
      errors.push(message.text());
  });
  return { context, page, errors };
}
