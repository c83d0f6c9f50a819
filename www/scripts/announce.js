"use strict";

/** What a screen reader says, once things have come to rest. */
const announce = {
  /** How long nothing new may come before it is said, ms. */
  rest: 900,

  /** @type {ReturnType<typeof setTimeout> | undefined} */
  timer: undefined,
  said: "",

  /**
   * Says it when nothing newer comes for a while, and only if it is not what was said last.
   * @param {string} words
   */
  soon(words) {
    clearTimeout(announce.timer);
    announce.timer = setTimeout(() => {
      if (words !== announce.said) announce.now(words);
    }, announce.rest);
  },

  /**
   * @param {string} words
   */
  now(words) {
    announce.said = words;
    dom.byId("announce", HTMLElement).textContent = words;
  },
};
