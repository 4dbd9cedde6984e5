import fs from "node:fs";
import { chromium, type Browser } from "playwright-core";

const places = ["/usr/bin/chromium", "/usr/bin/chromium-browser", "/usr/bin/google-chrome"];

/** Debian's Chromium, without a window; nothing in it talks to anybody but the pages under test. */
export function browserOptions() {
  return {
    executablePath: process.env.CHROMIUM_PATH ?? places.find((file) => fs.existsSync(file)),
    args: ["--no-sandbox", "--disable-gpu", "--disable-quic", "--no-first-run", "--disable-background-networking", "--disable-component-update", "--disable-sync"],
  };
}

export function openBrowser(): Promise<Browser> {
  return chromium.launch(browserOptions());
}
