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
async function tabTo(tab, name) {
  for (let i = 0; i < 250; i += 1) {
    await tab.keyboard.press("Tab");
    const found = await tab.evaluate(() => {
      const at = document.activeElement;
      const label = at?.id ? document.querySelector(`label[for="${at.id}"]`) : null;
      return at?.getAttribute("aria-label") ?? label?.textContent ?? at?.textContent ?? "";
    });
    if (found.trim() === name) return;
  }
  assert.fail(`no way by Tab to ${name}`);
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
  await tabTo(tab, "Throughout");
  await write(tab, "180 °C");
  await tabTo(tab, "Add a condition");
  await tab.keyboard.press("Enter");
  await tabTo(tab, "Limit");
  await write(tab, "45 °C");
  await answered(tab);
  const told = await headline(tab);
  assert.match(told, /^Ready .* after the stop$/);

  const coming = tab.waitForEvent("download");
  await tab.keyboard.press("Control+S");
  const file = path.join(pictures, "by-keyboard.json");
  await (await coming).saveAs(file);
  const saved = JSON.parse(readFileSync(file, "utf8"));
  assert.equal(saved.item.layers[0].thickness_m, 0.15);
  assert.equal(saved.start.uniform_c, 180);

  const again = await visit(browser);
  const chooser = again.tab.waitForEvent("filechooser");
  await tabTo(again.tab, "Open");
  await again.tab.keyboard.press("Enter");
  await (await chooser).setFiles(file);
  await answered(again.tab);
  assert.equal(await headline(again.tab), told);
  assert.deepEqual([...heard, ...again.heard], []);
  await context.close();
  await again.context.close();
});

test("what is typed wrong keeps standing with its message, and the last answer stays beside it", async () => {
  const { context, tab, heard } = await visit(browser);
  const before = await headline(tab);
  const field = tab.getByLabel("Thickness").first();
  await field.fill("four hundred");
  await answered(tab);
  assert.equal(await field.inputValue(), "four hundred");
  assert.equal(await field.getAttribute("aria-invalid"), "true");
  assert.equal(await headline(tab), before);
  assert.ok(await tab.locator("#answer.stale").count());
  await tab.reload();
  await answered(tab);
  assert.equal(await tab.getByLabel("Thickness").first().inputValue(), "four hundred");
  await tab.getByLabel("Thickness").first().fill("-400 mm");
  await answered(tab);
  assert.match(await tab.locator(".problem").filter({ hasText: "thickness" }).first().innerText(), /above 0/);
  await tab.getByLabel("Thickness").first().fill("400 mm");
  await answered(tab);
  assert.equal(await headline(tab), before);
  assert.deepEqual(heard, []);
  await context.close();
});

test("undo and redo go back and forth over fields and layers", async () => {
  const { context, tab, heard } = await visit(browser);
  const before = await headline(tab);
  await tab.getByRole("button", { name: "Remove lagging" }).click();
  await answered(tab);
  const without = await headline(tab);
  assert.notEqual(without, before);
  await tab.getByRole("button", { name: "Undo" }).click();
  await answered(tab);
  assert.equal(await headline(tab), before);
  await tab.getByRole("button", { name: "Redo" }).click();
  await answered(tab);
  assert.equal(await headline(tab), without);
  await tab.getByRole("button", { name: "Move wall inwards" }).click();
  await answered(tab);
  assert.deepEqual(heard, []);
  await context.close();
});

test("every example is answered, and saving it changes no byte of meaning", async () => {
  const { context, tab, heard } = await visit(browser);
  const values = await tab
    .locator("#examples option")
    .evaluateAll((options) => options.map((option) => option.value).filter((value) => value));
  assert.ok(values.length >= 4);
  for (const value of values) {
    await tab.selectOption("#examples", value);
    await answered(tab);
    assert.doesNotMatch(await headline(tab), /No answer/, value);
    assert.equal(await tab.locator("[aria-invalid]").count(), 0, value);
    const coming = tab.waitForEvent("download");
    await tab.getByRole("button", { name: "Save" }).click();
    const file = path.join(pictures, `${value}.json`);
    await (await coming).saveAs(file);
    const original = readFileSync(path.join(pictures, "../../src/scenario/examples", `${value}.json`), "utf8");
    assert.deepEqual(JSON.parse(readFileSync(file, "utf8")), JSON.parse(original), value);
    await tab.screenshot({ path: path.join(pictures, `${value}.png`), fullPage: true });
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
  await tab.locator("#answer-problems").waitFor({ state: "visible" });
  assert.match(await tab.locator("#answer-problems").innerText(), /line 2/);
  assert.equal(await headline(tab), before);
  assert.deepEqual(heard, []);
  await context.close();
});
