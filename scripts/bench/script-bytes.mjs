import { findCommand } from "../lib/commands.mjs";
import { inPairs } from "./measure.mjs";

/** Opens a page with an empty cache and adds up the scripts, compressed as they were sent. */
async function scriptBytes(browser, { address, cookie }) {
  const context = await browser.newContext();
  try {
    if (cookie) {
      const [name, value] = cookie.split(/=(.*)/s);
      await context.addCookies([{ name, value, url: address }]);
    }
    const page = await context.newPage();
    const session = await context.newCDPSession(page);
    await session.send("Network.enable");
    const scripts = new Set();
    let bytes = 0;
    session.on("Network.responseReceived", ({ requestId, type }) => {
      if (type === "Script") scripts.add(requestId);
    });
    session.on("Network.loadingFinished", ({ requestId, encodedDataLength }) => {
      if (scripts.has(requestId)) bytes += encodedDataLength;
    });
    const answer = await page.goto(address, { waitUntil: "networkidle" });
    if (!answer?.ok() || page.url() !== address) throw new Error(`${address} led to ${page.url()}`);
    return bytes;
  } finally {
    await context.close();
  }
}

/** JavaScript of the case list against that of the framework's empty page. */
export async function measureScriptBytes(portal, yardstickBase) {
  const { chromium } = await import("playwright-core");
  const browser = await chromium.launch({
    executablePath: findCommand("chromium"),
    args: ["--no-sandbox", "--disable-gpu", "--disable-dev-shm-usage"],
  });
  try {
    const list = { address: `${portal.base}/cases`, cookie: portal.cookie };
    const empty = { address: `${yardstickBase}/` };
    const found = await inPairs(
      {
        product: () => scriptBytes(browser, list),
        yardstick: () => scriptBytes(browser, empty),
      },
      { pairs: 2, warmUps: 1 },
    );
    const what = "JavaScript of the case list, as sent";
    return { letter: "f", what, against: "the framework's empty page", unit: "bytes", ...found };
  } finally {
    await browser.close();
  }
}
