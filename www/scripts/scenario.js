"use strict";

/**
 * The scenario that is described on the page: the JSON of the file and nothing beside it.
 *
 * A text that cannot be read stands in the place of its number, as a string. So it survives undo, saving and
 * reloading, and the core names it like any other wrong value.
 */
const scenario = {
  /** @type {Json} */
  tree: {},

  /**
   * The text it was opened from, while nothing is changed.
   * @type {string | null}
   */
  opened: null,

  /** @returns {string} */
  text() {
    return scenario.opened ?? `${JSON.stringify(scenario.tree, null, 2)}\n`;
  },

  /**
   * @param {string} path
   * @returns {Json | undefined}
   */
  get(path) {
    return pointer.get(scenario.tree, path);
  },

  /**
   * The list at a place; empty where there is none.
   * @param {string} path
   * @returns {Json[]}
   */
  list(path) {
    const found = scenario.get(path);
    return Array.isArray(found) ? found : [];
  },

  /**
   * A change of one value while it is typed; the form stays as it is.
   * @param {string} path
   * @param {Json | undefined} value undefined takes it away
   * @param {string} label
   */
  type(path, value, label) {
    if (pointer.same(scenario.get(path), value)) return;
    undo.remember(path, label, true);
    scenario.set(path, value);
    schedule.request();
  },

  /**
   * A change after which the form looks different.
   * @param {string} label
   * @param {string} path the place that is changed
   * @param {() => void} change
   * @param {string} [focus] id of the control that has the focus afterwards
   */
  reshape(label, path, change, focus) {
    undo.remember(path, label, false);
    change();
    form.render(focus);
    schedule.request();
  },

  /**
   * Inside a change: another value at a place; undefined takes it away.
   * @param {string} path
   * @param {Json | undefined} value
   */
  set(path, value) {
    scenario.opened = null;
    scenario.tree =
      value === undefined
        ? pointer.remove(scenario.tree, path)
        : pointer.put(scenario.tree, path, value);
  },

  /**
   * Another scenario altogether.
   * @param {Json} tree
   * @param {string | null} opened
   * @param {string} label
   */
  replace(tree, opened, label) {
    undo.remember("", label, false);
    scenario.tree = tree;
    scenario.opened = opened;
    pictures.followAnswer();
    form.render();
    schedule.request();
  },
};
