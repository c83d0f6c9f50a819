// The job itself, as somebody would do it: by keyboard, with slips, saved and opened again.

import assert from "node:assert/strict";
import { readFileSync, writeFileSync } from "node:fs";
import path from "node:path";
import { after, before, test } from "node:test";
import { answered, headline, launch, pictures, visit } from "./harness.mjs";

let browser;
before(async () => {
  browser = await launch();
});
after(() => browser.close());

/** Goes by Tab to the control with this name, as somebody without a mouse does. */
async function tabTo(tab, ...names) {
  for (let i = 0; i < 250; i += 1) {
    await tab.keyboard.press("Tab");
    const found = await tab.evaluate(() => {
      const at = document.activeElement;
      const label = at?.id ? document.querySelector(`label[for="${at.id}"]`) : null;
      return at?.getAttribute("aria-label") ?? label?.textContent ?? at?.textContent ?? "";
    });
    if (names.includes(found.trim())) return;
  }
  assert.fail(`no way by Tab to ${names.join(" or ")}`);
}

/** Types over what stands in the field that has the focus. */
async function write(tab, text) {
  await tab.keyboard.press("Control+A");
  await tab.keyboard.type(text);
}

/** Chooses in a select that has the focus, by typing the beginning. */
async function choose(tab, text) {
  await tab.keyboard.type(text);
}

test("from an empty scenario to a saved file and back by keyboard alone", async () => {
  const { context, tab, heard } = await visit(browser);
  await tabTo(tab, "New");
  await tab.keyboard.press("Enter");
  await answered(tab);
  await tabTo(tab, "Material");
  await choose(tab, "Concrete");
  await tabTo(tab, "Thickness");
  await write(tab, "0,15 m");
  await tabTo(tab, "Temperature");
  await write(tab, "180 °C");
  await tabTo(tab, "Its temperature");
  await write(tab, "20");
  await tabTo(tab, "Film coefficient", "Film coefficient…");
  if (await tab.evaluate(() => document.activeElement.tagName === "BUTTON")) await tab.keyboard.press("Enter");
  await write(tab, "6 to 12");
  await tabTo(tab, "Limit");
  await write(tab, "45 °C");
  await answered(tab);
  const told = await headline(tab);
  assert.match(told, /^Ready .* after the stop$/, await tab.locator("#troubles").innerText());

  const coming = tab.waitForEvent("download");
  await tab.keyboard.press("Control+S");
  const file = path.join(pictures, "by-keyboard.json");
  await (await coming).saveAs(file);
  const saved = JSON.parse(readFileSync(file, "utf8"));
  assert.equal(saved.item.layers[0].thickness_m, 0.15);
  assert.equal(saved.start.uniform_c, 180);
  assert.deepEqual(saved.surroundings.outer[0].film_w_per_m2_k, { value: 9, low: 6, high: 12 });

  const again = await visit(browser);
  const chooser = again.tab.waitForEvent("filechooser");
  await tabTo(again.tab, "Open");
  await again.tab.keyboard.press("Enter");
  await (await chooser).setFiles(file);
  await again.tab.waitForFunction((line) => document.getElementById("answer-headline").textContent === line, told);
  assert.deepEqual([...heard, ...again.heard], []);
  await context.close();
  await again.context.close();
});

test("what is typed wrong keeps standing with its message, and the last answer stays beside it", async () => {
  const { context, tab, heard } = await visit(browser);
  const before = await headline(tab);
  const field = () => tab.getByLabel("Thickness").first();
  await field().fill("four hundred");
  await answered(tab);
  assert.equal(await field().inputValue(), "four hundred");
  assert.equal(await field().getAttribute("aria-invalid"), "true");
  assert.equal(await headline(tab), before);
  assert.ok(await tab.locator("#troubles").isVisible());
  await tab.reload();
  await answered(tab);
  assert.equal(await field().inputValue(), "four hundred");
  await field().fill("-400 mm");
  await answered(tab);
  const message = await field().evaluate((input) =>
    input
      .getAttribute("aria-describedby")
      .split(" ")
      .map((id) => document.getElementById(id)?.textContent ?? "")
      .join(" "),
  );
  assert.match(message, /at least|above 0/);
  await field().fill("400 mm");
  await answered(tab);
  assert.equal(await headline(tab), before);
  assert.deepEqual(heard, []);
  await context.close();
});

test("undo and redo go back and forth over fields and layers", async () => {
  const { context, tab, heard } = await visit(browser);
  const before = await headline(tab);
  const lagging = tab.locator("#layers > .layer").nth(2);
  await lagging.locator("summary").click();
  await lagging.getByRole("button", { name: "Remove" }).click();
  await answered(tab);
  const without = await headline(tab);
  assert.notEqual(without, before);
  await tab.getByRole("button", { name: "Undo" }).click();
  await answered(tab);
  assert.equal(await headline(tab), before);
  await tab.getByRole("button", { name: "Redo" }).click();
  await answered(tab);
  assert.equal(await headline(tab), without);
  assert.deepEqual(heard, []);
  await context.close();
});

test("every example is answered, and saving it changes no byte of meaning", async () => {
  const { context, tab, heard } = await visit(browser);
  const folder = path.join(pictures, "../../src/scenario/examples");
  for (const [name, title] of [
    ["wash-vessel", "Wash vessel, weekend stop"],
    ["furnace-wall", "Lined furnace, burner off, fan later"],
    ["bitumen-drum", "Drum of bitumen in the yard"],
    ["quenched-block", "Moulded block: water bath, then air"],
  ]) {
    await tab.getByRole("button", { name: "Examples" }).click();
    await tab.locator("#examples-dialog").getByText(title).click();
    await answered(tab);
    assert.match(await headline(tab), /Ready|May stand/, name);
    assert.equal(await tab.locator("[aria-invalid='true']").count(), 0, name);
    const coming = tab.waitForEvent("download");
    await tab.getByRole("button", { name: "Save" }).click();
    const file = path.join(pictures, `${name}.json`);
    await (await coming).saveAs(file);
    const original = readFileSync(path.join(folder, `${name}.json`), "utf8");
    assert.deepEqual(JSON.parse(readFileSync(file, "utf8")), JSON.parse(original), name);
    await tab.screenshot({ path: path.join(pictures, `${name}.png`), fullPage: true });
  }
  assert.deepEqual(heard, []);
  await context.close();
});

test("a damaged file is refused with its place, and what was there stays", async () => {
  const { context, tab, heard } = await visit(browser);
  const before = await headline(tab);
  const file = path.join(pictures, "damaged.json");
  writeFileSync(file, '{"stillheat": 1,\n  "item": {');
  await tab.setInputFiles("#file", file);
  await tab.locator("#notice").waitFor({ state: "visible" });
  assert.match(await tab.locator("#notice").innerText(), /line 2/);
  assert.equal(await headline(tab), before);
  assert.deepEqual(heard, []);
  await context.close();
});
