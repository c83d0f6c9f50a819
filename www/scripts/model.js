"use strict";

/** The scenario as it stands, what is typed and not yet understood, and how to go back. */
const model = {
  /** @type {Scenario} */
  scenario: {},
  /** Text that was not understood, by path: kept as typed. @type {Map<string, string>} */
  drafts: new Map(),
  /** @type {string[]} */
  past: [],
  /** @type {string[]} */
  future: [],
  /** The field whose typing is one step of undo. */
  typing: "",
  /** Called after every change; `structure` where fields came or went. @type {(structure: boolean) => void} */
  changed: () => {},

  snapshot() {
    return JSON.stringify({
      scenario: model.scenario,
      drafts: Object.fromEntries(model.drafts),
    });
  },

  /** @param {string} text */
  restore(text) {
    const kept = JSON.parse(text);
    model.scenario = kept.scenario;
    model.drafts = new Map(Object.entries(kept.drafts));
  },

  /**
   * Changes the scenario; one step of undo, or part of the step of typing into one field.
   * @param {() => void} change
   * @param {{ structure?: boolean, typing?: string }} [about]
   */
  change(change, about = {}) {
    const goesOn = about.typing !== undefined && about.typing === model.typing;
    if (!goesOn) {
      model.past.push(model.snapshot());
      if (model.past.length > 200) model.past.shift();
    }
    model.future = [];
    model.typing = about.typing ?? "";
    change();
    model.changed(about.structure ?? false);
  },

  /**
   * Another scenario altogether; can be undone.
   * @param {Scenario} scenario
   */
  replace(scenario) {
    model.change(
      () => {
        model.scenario = scenario;
        model.drafts = new Map();
      },
      { structure: true },
    );
  },

  undo() {
    const before = model.past.pop();
    if (before === undefined) return;
    model.future.push(model.snapshot());
    model.restore(before);
    model.typing = "";
    model.changed(true);
  },

  redo() {
    const after = model.future.pop();
    if (after === undefined) return;
    model.past.push(model.snapshot());
    model.restore(after);
    model.typing = "";
    model.changed(true);
  },

  /**
   * Forgets what was typed below a path that goes or moves.
   * @param {string} path
   */
  forget(path) {
    for (const key of [...model.drafts.keys()]) {
      if (key === path || key.startsWith(`${path}/`)) model.drafts.delete(key);
    }
  },

  /** @param {string} path @returns {any} */
  get(path) {
    return pointer.get(model.scenario, path);
  },

  /** @param {string} path @param {Json | undefined} value */
  set(path, value) {
    pointer.set(model.scenario, path, value);
  },

  /** A deep copy. @template T @param {T} value @returns {T} */
  copy(value) {
    return JSON.parse(JSON.stringify(value));
  },

  /** What a layer is called, as the core has it. @param {number} i @returns {string} */
  layerName(i) {
    const layer = model.get(`/item/layers/${i}`) ?? {};
    if (typeof layer.name === "string" && layer.name.trim() !== "")
      return layer.name;
    const material = core.materials.find((one) => one.id === layer.material);
    return material ? material.name : `layer ${i + 1}`;
  },

  /** @returns {string[]} */
  layerNames() {
    const layers = model.get("/item/layers");
    return Array.isArray(layers)
      ? layers.map((_, i) => model.layerName(i))
      : [];
  },

  /** Has the item an inner face? */
  hasInnerFace() {
    return (
      model.get("/item/shape") === "slab" ||
      (model.get("/item/inner_radius_m") ?? 0) > 0
    );
  },

  /**
   * Runs a change that may rename layers, and lets the conditions follow.
   * @param {() => void} change
   */
  renaming(change) {
    const before = model.layerNames();
    change();
    const after = model.layerNames();
    if (before.length !== after.length) return;
    for (const list of ["ready_when", "must_not"]) {
      for (const condition of model.get(`/${list}`) ?? []) {
        const at = before.indexOf(condition.of);
        if (at >= 0 && !["probe", "face"].includes(condition.what))
          condition.of = after[at];
      }
    }
  },
};
