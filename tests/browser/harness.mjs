// Opens the built file off the disk in a real browser and watches what it does.

import { existsSync, mkdirSync } from "node:fs";
import path from "node:path";
import { fileURLToPath, pathToFileURL } from "node:url";
import { chromium } from "playwright-core";

export const root = path.resolve(path.dirname(fileURLToPath(import.meta.url)), "../..");
export const page = pathToFileURL(path.join(root, "dist/stillheat.html")).href;
export const pictures = path.join(root, "target/browser");
mkdirSync(pictures, { recursive: true });

const flags = [
  "--no-sandbox",
  "--disable-gpu",
  "--no-first-run",
  "--disable-background-networking",
  "--disable-component-update",
  "--disable-sync",
];

/** The path of a program. */
export function program(name) {
  const folders = (process.env.PATH ?? "").split(path.delimiter);
  const found = folders.map((folder) => path.join(folder, name)).find((file) => existsSync(file));
  if (!found) throw new Error(`${name} is not installed`);
  return found;
}

/** Chromium for a whole file of tests. */
export function launch() {
  return chromium.launch({ executablePath: program("chromium"), args: flags });
}

/**
 * A fresh visit: nothing remembered, every console message and every request but that of the file itself collected.
 */
export async function visit(browser, options = {}) {
  const { width = 1440, height = 900, scheme = "light" } = options;
  const context = await browser.newContext({
    viewport: { width, height },
    colorScheme: scheme,
    acceptDownloads: true,
    reducedMotion: "reduce",
  });
  const tab = await context.newPage();
  const heard = [];
  tab.on("console", (message) => heard.push(`console: ${message.text()}`));
  tab.on("pageerror", (error) => heard.push(`error: ${error.message}`));
  tab.on("request", (request) => {
    const address = request.url();
    if (address !== page && !address.startsWith("data:") && !address.startsWith("blob:")) heard.push(`request: ${address}`);
  });
  await tab.goto(page);
  await answered(tab);
  return { context, tab, heard };
}

/** Waits until the first answer is shown, and that to what was done last. */
export async function answered(tab) {
  await tab.waitForFunction(() => performance.getEntriesByName("stillheat-answer").length > 0);
  await tab.evaluate(() => new Promise((done) => window.requestAnimationFrame(() => window.requestAnimationFrame(done))));
}

/** The big line of the answer. */
export function headline(tab) {
  return tab.locator("#answer-headline").innerText();
}
