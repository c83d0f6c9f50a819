"use strict";

/** Open, save, drop, examples; and what is remembered between visits. */
const files = {
  /** @type {Example[]} */
  examples: [],

  /** An item about which little is said yet. @returns {Scenario} */
  empty() {
    return {
      stillheat: 1,
      item: { shape: "cylinder", layers: [{ material: "water" }] },
      start: { uniform_c: 80 },
      surroundings: {
        outer: [
          {
            temperature_c: 20,
            film_w_per_m2_k: { value: 7, low: 5, high: 10 },
          },
        ],
      },
      ready_when: [],
    };
  },

  /** @param {string} text @param {string} name */
  take(text, name) {
    let scenario;
    try {
      scenario = JSON.parse(text);
    } catch {
      scenario = null;
    }
    const item = scenario?.item;
    const shaped =
      scenario !== null &&
      typeof scenario === "object" &&
      scenario.stillheat !== undefined &&
      Array.isArray(item?.layers);
    if (!shaped) {
      const problem = core.page.solve(text).problems[0];
      const words = problem
        ? `${problem.path} ${problem.message}. ${problem.hint}`
        : "this is no scenario";
      answer.text("announce", `${name} was not opened: ${words}`);
      const place = /** @type {HTMLElement} */ (
        document.getElementById("answer-problems")
      );
      place.hidden = false;
      place.replaceChildren(
        answer.paragraph(`${name} was not opened: ${words}`),
      );
      return;
    }
    model.replace(scenario);
  },

  /** @param {File} file */
  async read(file) {
    if (file.size > 1_000_000) {
      files.take("", file.name);
      return;
    }
    files.take(await file.text(), file.name);
  },

  save() {
    const text = `${JSON.stringify(model.scenario, null, 2)}\n`;
    const title = String(model.get("/title") ?? "");
    const name =
      title
        .toLowerCase()
        .replaceAll(/[^a-z0-9]+/g, "-")
        .replaceAll(/^-+|-+$/g, "") || "stillheat";
    const link = document.createElement("a");
    link.href = URL.createObjectURL(
      new Blob([text], { type: "application/json" }),
    );
    link.download = `${name}.json`;
    link.click();
    URL.revokeObjectURL(link.href);
  },

  /** Remembers the state, where the browser allows it. */
  keep() {
    try {
      const kept = {
        scenario: model.scenario,
        drafts: Object.fromEntries(model.drafts),
        us: core.us,
      };
      localStorage.setItem("stillheat", JSON.stringify(kept));
    } catch {
      // Not allowed here: the page works without.
    }
  },

  /** @returns {Kept | null} */
  kept() {
    try {
      const kept = JSON.parse(localStorage.getItem("stillheat") ?? "null");
      return kept && Array.isArray(kept.scenario?.item?.layers) ? kept : null;
    } catch {
      return null;
    }
  },

  listen() {
    const input = /** @type {HTMLInputElement} */ (
      document.getElementById("file")
    );
    document
      .getElementById("open")
      ?.addEventListener("click", () => input.click());
    input.addEventListener("change", () => {
      const file = input.files?.[0];
      input.value = "";
      if (file) void files.read(file);
    });
    document
      .getElementById("save")
      ?.addEventListener("click", () => files.save());
    document
      .getElementById("print")
      ?.addEventListener("click", () => window.print());
    document.getElementById("new")?.addEventListener("click", () => {
      model.replace(files.empty());
      document.getElementById("shape")?.focus();
    });
    files.drop();
    files.listExamples();
  },

  listExamples() {
    const select = /** @type {HTMLSelectElement} */ (
      document.getElementById("examples")
    );
    files.examples = wasm_bindgen.examples();
    for (const example of files.examples)
      select.append(new Option(example.title, example.id));
    select.addEventListener("change", () => {
      const example = files.examples.find((one) => one.id === select.value);
      select.value = "";
      if (example) files.take(example.text, example.title);
    });
  },

  drop() {
    document.addEventListener("dragover", (event) => {
      event.preventDefault();
      document.body.classList.add("dropping");
    });
    document.addEventListener("dragleave", (event) => {
      if (!event.relatedTarget) document.body.classList.remove("dropping");
    });
    document.addEventListener("drop", (event) => {
      event.preventDefault();
      document.body.classList.remove("dropping");
      const file = event.dataTransfer?.files[0];
      if (file) void files.read(file);
    });
  },
};
