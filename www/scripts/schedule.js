"use strict";

/** When the core is asked: once before the next picture of the screen, however much was typed. */
const schedule = {
  frame: 0,

  /** How long after the last change the page is kept, ms. */
  rest: 400,

  /** @type {ReturnType<typeof setTimeout> | undefined} */
  keeping: undefined,

  /** Something changed; the answer comes in the same frame. */
  request() {
    if (schedule.frame === 0)
      schedule.frame = requestAnimationFrame(schedule.answer);
    clearTimeout(schedule.keeping);
    schedule.keeping = setTimeout(store.keep, schedule.rest);
  },

  answer() {
    schedule.frame = 0;
    answer.ask(scenario.text());
  },

  /** The page may be closed before the rest is over. */
  listen() {
    window.addEventListener("pagehide", store.keep);
  },
};
