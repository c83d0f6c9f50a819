"use strict";

/**
 * @typedef {object} Step
 * @property {Json} tree the scenario before the change
 * @property {string | null} opened its text, if it stood so in a file
 * @property {string} path the place that was changed
 * @property {string} label the change in words
 * @property {number} at when, ms
 */

/** One history of the whole description. Typing in one field without a pause is one step. */
const undo = {
  /** A pause in typing after which a new step begins, ms. */
  pause: 1500,
  most: 500,

  /** @type {Step[]} */
  past: [],
  /** @type {Step[]} */
  future: [],

  /**
   * Remembers the scenario as it is before a change.
   * @param {string} path
   * @param {string} label
   * @param {boolean} typing
   */
  remember(path, label, typing) {
    const now = performance.now();
    const last = undo.past.at(-1);
    undo.future = [];
    if (
      typing &&
      last !== undefined &&
      last.path === path &&
      now - last.at < undo.pause
    ) {
      last.at = now;
    } else {
      const { tree, opened } = scenario;
      undo.past.push({
        tree,
        opened,
        path,
        label,
        at: typing ? now : -Infinity,
      });
      if (undo.past.length > undo.most) undo.past.shift();
    }
    undo.show();
  },

  back() {
    undo.go(undo.past, undo.future, "Undone");
  },

  forth() {
    undo.go(undo.future, undo.past, "Redone");
  },

  /**
   * @param {Step[]} from
   * @param {Step[]} to
   * @param {string} word
   */
  go(from, to, word) {
    const step = from.pop();
    if (step === undefined) return;
    const { tree, opened } = scenario;
    to.push({ ...step, tree, opened, at: -Infinity });
    scenario.tree = step.tree;
    scenario.opened = step.opened;
    form.render();
    messages.point(step.path);
    undo.show();
    schedule.request();
    announce.now(`${word}: ${step.label}`);
  },

  show() {
    dom.byId("undo", HTMLButtonElement).disabled = undo.past.length === 0;
    dom.byId("redo", HTMLButtonElement).disabled = undo.future.length === 0;
  },

  /**
   * The keys for it work everywhere, in a field too: there is one history, so that no keystroke does two things.
   * @param {KeyboardEvent} event
   */
  key(event) {
    if (!(event.ctrlKey || event.metaKey) || event.altKey) return;
    const key = event.key.toLowerCase();
    const forth =
      (key === "z" && event.shiftKey) || (key === "y" && !event.shiftKey);
    const back = key === "z" && !event.shiftKey;
    if (!back && !forth) return;
    event.preventDefault();
    if (back) undo.back();
    else undo.forth();
  },

  /**
   * The browser's own undo, from its menu, is the same one.
   * @param {InputEvent} event
   */
  menu(event) {
    if (event.inputType !== "historyUndo" && event.inputType !== "historyRedo")
      return;
    event.preventDefault();
    if (event.inputType === "historyUndo") undo.back();
    else undo.forth();
  },

  listen() {
    dom.byId("undo", HTMLButtonElement).addEventListener("click", undo.back);
    dom.byId("redo", HTMLButtonElement).addEventListener("click", undo.forth);
    document.addEventListener("keydown", undo.key);
    document.addEventListener("beforeinput", undo.menu);
  },
};
