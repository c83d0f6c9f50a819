"use strict";

/** What is kept from one opening of the page to the next, where the browser allows it. */
const store = {
  key: "stillheat",

  /** @type {System} */
  system: "metric",

  /** @returns {Kept} the scenario kept last, and the last that had an answer */
  load() {
    const text = (/** @type {unknown} */ kept) =>
      typeof kept === "string" ? kept : "";
    try {
      const kept = JSON.parse(localStorage.getItem(store.key) ?? "{}");
      if (kept.system === "us") store.system = "us";
      return { text: text(kept.text), answered: text(kept.answered) };
    } catch {
      return { text: "", answered: "" };
    }
  },

  /** Keeps the scenario with everything that is typed, readable or not. */
  keep() {
    /** @type {Kept & { system: System }} */
    const kept = {
      text: scenario.text(),
      answered: answer.text,
      system: store.system,
    };
    try {
      localStorage.setItem(store.key, JSON.stringify(kept));
    } catch {
      // Not allowed here, or full: the page works without it.
    }
  },
};
