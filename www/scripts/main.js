"use strict";

/** Starts the page. */
const main = {
  async start() {
    await core.start();
    const kept = store.load();
    const text = kept.text || (files.examples()[0]?.text ?? "");
    scenario.tree = files.parse(text) ?? files.empty;
    scenario.opened = text === "" ? null : text;
    form.render();
    main.listen();
    if (kept.answered !== "" && kept.answered !== text) {
      answer.ask(kept.answered);
    }
    schedule.answer();
    performance.mark("stillheat-answer");
  },

  listen() {
    for (const part of [
      form,
      undo,
      layers,
      start,
      probes,
      conditions,
      pictures,
      schedule,
      files,
    ])
      part.listen();
    dom
      .byId("description", HTMLFormElement)
      .addEventListener("submit", (event) => event.preventDefault());
    const system = dom.byId("system", HTMLSelectElement);
    system.value = store.system;
    system.addEventListener("change", () => {
      store.system = system.value === "us" ? "us" : "metric";
      fields.typed.clear();
      form.render();
      schedule.request();
    });
  },
};

void main.start();
