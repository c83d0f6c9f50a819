"use strict";

/** What is kept from one opening of the page to the next, where the browser allows it. */
const store = {
  key: "stillheat",

  /** @type {System} */
  system: "metric",

  /** @returns {{ text: string } | null} the scenario kept last, if one was */
  load() {
    try {
      const kept = JSON.parse(localStorage.getItem(store.key) ?? "null");
      if (kept?.system === "us") store.system = "us";
      return typeof kept?.text === "string" ? { text: kept.text } : null;
    } catch {
      return null;
    }
  },

  /** Keeps the scenario with everything that is typed, readable or not. */
  keep() {
    try {
      localStorage.setItem(
        store.key,
        JSON.stringify({ text: scenario.text(), system: store.system }),
      );
    } catch {
      // Not allowed here, or full: the page works without it.
    }
  },
};
