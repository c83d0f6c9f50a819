// The same file in Firefox: it opens off the disk and answers.

import assert from "node:assert/strict";
import path from "node:path";
import { after, before, test } from "node:test";
import { writeFileSync } from "node:fs";
import { Builder, By, until } from "selenium-webdriver";
import firefox from "selenium-webdriver/firefox.js";
import { page, pictures, program, root } from "./harness.mjs";

let driver;
before(async () => {
  const options = new firefox.Options().addArguments("-headless", "--width=1440", "--height=900").setBinary(program("firefox-esr"));
  const service = new firefox.ServiceBuilder(path.join(root, "target/tools/bin/geckodriver"));
  driver = await new Builder().forBrowser("firefox").setFirefoxOptions(options).setFirefoxService(service).build();
});
after(() => driver?.quit());

test("the first answer comes in Firefox too, and follows a keystroke", async () => {
  await driver.get(page);
  const line = await driver.wait(until.elementLocated(By.id("answer-headline")), 10_000);
  await driver.wait(until.elementTextMatches(line, /^Ready /), 10_000);
  const time = await driver.executeScript("return performance.getEntriesByName('stillheat-answer')[0].startTime");
  console.log(`first answer after ${Math.round(time)} ms`);
  const before = await line.getText();
  const field = await driver.findElement(By.css('#layers .layer:first-child input[data-path="/item/layers/0/thickness_m"]'));
  await field.clear();
  await field.sendKeys("300 mm");
  await driver.wait(async () => (await line.getText()) !== before, 5_000);
  assert.match(await line.getText(), /^Ready /);
  const drawn = await driver.executeScript(
    "const c = document.getElementById('curve'); return c.getContext('2d').getImageData(0, 0, c.width, c.height).data.some((v, i) => i % 4 !== 3 && v < 100)",
  );
  assert.ok(drawn, "the curve is drawn");
  writeFileSync(path.join(pictures, "firefox.png"), await driver.takeScreenshot(), "base64");
});
