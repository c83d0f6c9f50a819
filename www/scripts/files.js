"use strict";

/** Opening and saving: files stay between the user and the browser. */
const files = {
  /** What a new description begins with: what is needed, still to be filled in. @type {Json} */
  empty: {
    stillheat: 1,
    item: { shape: "cylinder", layers: [{ material: "", thickness_m: "" }] },
    start: { uniform_c: "" },
    surroundings: { outer: [{ temperature_c: "", film_w_per_m2_k: "" }] },
    ready_when: [{ what: "hottest", below_c: "" }],
  },

  /**
   * Opens the text of a file, unless it is no scenario at all; then what is on the page stays.
   * @param {string} text
   * @param {string} name
   */
  open(text, name) {
    const solution = core.solve(text);
    const textual = (solution?.problems ?? []).filter(
      ({ kind }) => kind === "text",
    );
    const tree = files.parse(text);
    if (textual.length > 0 || !pointer.isObject(tree)) {
      const why = textual
        .map(({ message, hint }) => `${message}. ${hint}`.trim())
        .join(" ");
      files.say(
        `${name} was not opened: ${why || "it is no scenario."} What was on the page is still there.`,
      );
      return;
    }
    files.say("");
    answer.forget();
    scenario.replace(tree, text, `${name} opened`);
    announce.now(`${name} opened`);
  },

  /**
   * @param {string} text
   * @returns {Json | undefined}
   */
  parse(text) {
    try {
      return JSON.parse(text);
    } catch {
      return undefined;
    }
  },

  /**
   * A notice above the page; empty takes it away.
   * @param {string} words
   */
  say(words) {
    dom.byId("notice", HTMLElement).hidden = words === "";
    dom.byId("notice-words", HTMLElement).textContent = words;
  },

  /** @param {File | undefined} file */
  async take(file) {
    if (file === undefined) return;
    const most = core.ask((_, door) => door.most_bytes(), 0);
    if (file.size > most) {
      files.say(
        `${file.name} was not opened: it has ${file.size} bytes; at most ${most} are taken.`,
      );
      return;
    }
    files.open(await file.text(), file.name);
  },

  save() {
    const blob = new Blob([scenario.text()], { type: "application/json" });
    const link = dom.make("a");
    link.href = URL.createObjectURL(blob);
    link.download = `${files.fileName()}.json`;
    link.click();
    // The download has its own hold on the data soon after.
    setTimeout(() => URL.revokeObjectURL(link.href), 10_000);
    announce.now(`Saved as ${link.download}`);
  },

  /** @returns {string} the title, as far as it can be the name of a file */
  fileName() {
    const title = String(scenario.get("/title") ?? "");
    const name = title
      .replace(/[^\p{L}\p{N}]+/gu, "-")
      .replace(/^-+|-+$/g, "")
      .slice(0, 60);
    return name === "" ? "scenario" : name.toLowerCase();
  },

  startNew() {
    files.say("");
    answer.forget();
    scenario.replace(files.empty, null, "New description");
    document.getElementById(fields.id("/item/shape"))?.focus();
  },

  /** @returns {Example[]} */
  examples() {
    return core.ask((_, door) => door.examples(), []);
  },

  showExamples() {
    const dialog = dom.byId("examples-dialog", HTMLDialogElement);
    const rows = files.examples().map(({ title, about, text }) => {
      const row = dom.make("li");
      const pick = dom.button(title, () => {
        dialog.close();
        files.open(text, title);
      });
      row.append(pick, dom.make("p", about, "note"));
      return row;
    });
    dom.byId("examples-list", HTMLElement).replaceChildren(...rows);
    dialog.showModal();
  },

  /** @param {KeyboardEvent} event */
  key(event) {
    if (!(event.ctrlKey || event.metaKey) || event.altKey || event.shiftKey)
      return;
    const key = event.key.toLowerCase();
    if (key !== "s" && key !== "o") return;
    event.preventDefault();
    if (key === "s") files.save();
    else dom.byId("file", HTMLInputElement).click();
  },

  listen() {
    const input = dom.byId("file", HTMLInputElement);
    const press = (/** @type {string} */ id, /** @type {() => void} */ act) =>
      dom.byId(id, HTMLButtonElement).addEventListener("click", act);
    press("open", () => input.click());
    press("save", files.save);
    press("new", files.startNew);
    press("examples", files.showExamples);
    press("notice-close", () => files.say(""));
    input.addEventListener("change", () => {
      void files.take(input.files?.[0]);
      // The same file can be opened again.
      input.value = "";
    });
    document.addEventListener("keydown", files.key);
    files.listenToDrops();
  },

  /** A file may be dropped anywhere on the page. */
  listenToDrops() {
    const sign = dom.byId("drop", HTMLElement);
    const carries = (/** @type {DragEvent} */ event) =>
      event.dataTransfer?.types.includes("Files") ?? false;
    window.addEventListener("dragover", (event) => {
      if (!carries(event)) return;
      event.preventDefault();
      sign.hidden = false;
    });
    window.addEventListener("dragleave", (event) => {
      if (event.relatedTarget === null) sign.hidden = true;
    });
    window.addEventListener("drop", (event) => {
      sign.hidden = true;
      if (!carries(event)) return;
      event.preventDefault();
      void files.take(event.dataTransfer?.files[0]);
    });
  },
};
