"use strict";

/** Starts the page and joins its parts. */
const main = {
  /** Builds the description anew; the focus stays where it was. */
  render() {
    const focused = document.activeElement?.id ?? "";
    const title = /** @type {HTMLInputElement} */ (
      document.getElementById("title")
    );
    if (document.activeElement !== title)
      title.value = model.get("/title") ?? "";
    layers.render();
    start.render();
    faces.render();
    watch.render();
    if (focused !== "" && document.activeElement?.id !== focused)
      document.getElementById(focused)?.focus();
  },

  buttons() {
    /** @type {HTMLButtonElement} */ (
      document.getElementById("undo")
    ).disabled = model.past.length === 0;
    /** @type {HTMLButtonElement} */ (
      document.getElementById("redo")
    ).disabled = model.future.length === 0;
  },

  /** Undo of the page, but not inside a field that was just typed into: there the browser's own. @param {KeyboardEvent} event */
  keys(event) {
    if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
    const key = event.key.toLowerCase();
    const back = key === "z" && !event.shiftKey;
    if (!back && key !== "y" && !(key === "z" && event.shiftKey)) {
      if (key === "s") {
        event.preventDefault();
        files.save();
      }
      return;
    }
    const at = document.activeElement;
    const typedInto =
      at instanceof HTMLInputElement &&
      at.dataset["before"] !== undefined &&
      at.dataset["before"] !== at.value;
    if (typedInto || at instanceof HTMLTextAreaElement) return;
    event.preventDefault();
    if (back) model.undo();
    else model.redo();
  },

  listen() {
    layers.listen();
    start.listen();
    watch.listen();
    pictures.listen();
    files.listen();
    document.addEventListener("keydown", (event) => main.keys(event));
    document
      .getElementById("undo")
      ?.addEventListener("click", () => model.undo());
    document
      .getElementById("redo")
      ?.addEventListener("click", () => model.redo());
    document
      .getElementById("description")
      ?.addEventListener("submit", (event) => event.preventDefault());
    const title = /** @type {HTMLInputElement} */ (
      document.getElementById("title")
    );
    title.addEventListener("input", () => {
      model.change(
        () => model.set("/title", title.value === "" ? undefined : title.value),
        { typing: "/title" },
      );
    });
    const system = /** @type {HTMLSelectElement} */ (
      document.getElementById("system")
    );
    system.value = core.us ? "us" : "metric";
    system.addEventListener("change", () => {
      core.us = system.value === "us";
      main.render();
      answer.soon();
      files.keep();
    });
  },

  run() {
    core.start();
    const kept = files.kept();
    core.us = kept?.us ?? false;
    main.listen();
    model.changed = (structure) => {
      if (structure) main.render();
      main.buttons();
      answer.soon();
      files.keep();
    };
    const first = files.examples[0];
    if (kept) {
      model.scenario = kept.scenario;
      model.drafts = new Map(Object.entries(kept.drafts ?? {}));
    } else model.scenario = first ? JSON.parse(first.text) : files.empty();
    main.render();
    answer.now();
  },
};

main.run();
