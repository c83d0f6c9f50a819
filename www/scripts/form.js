"use strict";

/** The description as a whole: made anew from the scenario whenever its shape changes. */
const form = {
  /** Boxes whose contents are made from the scenario. */
  made: ["layers", "start", "faces", "ready_when", "must_not", "probes"],

  /** How long after a letter a choice may still be under way, ms. */
  pause: 900,

  /** When a letter was last typed in a choice, ms. */
  lettered: -Infinity,

  /** @type {ReturnType<typeof setTimeout> | undefined} */
  waiting: undefined,

  /**
   * Makes the form anew; what was open stays open, and the focus stays where it was or goes where it is told.
   * While somebody is spelling out a choice, its list stays and all waits for them.
   * @param {string} [focus] id of a control
   */
  render(focus) {
    clearTimeout(form.waiting);
    form.waiting = undefined;
    const rest = form.lettered + form.pause - performance.now();
    const spelling = document.activeElement instanceof HTMLSelectElement;
    if (rest > 0 && spelling) {
      form.waiting = setTimeout(() => form.flush(), rest);
    } else {
      form.make(focus);
    }
  },

  /** Makes the form anew at once, if it is waiting to be. */
  flush() {
    if (form.waiting === undefined) return;
    form.lettered = -Infinity;
    form.render();
  },

  /** @param {KeyboardEvent} event */
  key(event) {
    const letter = event.key.length === 1 && !event.ctrlKey && !event.metaKey;
    if (letter && event.target instanceof HTMLSelectElement) {
      form.lettered = performance.now();
    } else {
      form.flush();
    }
  },

  /**
   * @param {string} [focus] id of a control
   */
  make(focus) {
    const wanted = focus ?? document.activeElement?.id ?? "";
    const open = form.openDetails();
    fields.forget();
    for (const id of form.made) dom.byId(id, HTMLElement).replaceChildren();
    form.bindFixed();
    layers.render();
    start.render();
    faces.render();
    conditions.render();
    probes.render();
    for (const details of dom.all(form.element(), "details")) {
      if (details instanceof HTMLDetailsElement) {
        details.open = open.has(details.id);
      }
    }
    form.focus(wanted, focus !== undefined);
  },

  /**
   * @param {string} id
   * @param {boolean} intoView
   */
  focus(id, intoView) {
    const target = id === "" ? null : document.getElementById(id);
    const more = target?.closest("details");
    if (more) more.open = true;
    if (target === null || target === document.activeElement) return;
    target.focus({ preventScroll: !intoView });
  },

  listen() {
    document.addEventListener("keydown", form.key, { capture: true });
  },

  /** @returns {HTMLElement} */
  element() {
    return dom.byId("description", HTMLElement);
  },

  /** @returns {Set<string>} */
  openDetails() {
    return new Set(
      dom.all(form.element(), "details[open]").map((details) => details.id),
    );
  },

  /**
   * What is open follows what it belongs to when two change places.
   * @param {string} a
   * @param {string} b
   */
  swapOpen(a, b) {
    const [one, other] = [a, b].map((path) =>
      document.getElementById(`more${path}`),
    );
    if (
      !(one instanceof HTMLDetailsElement) ||
      !(other instanceof HTMLDetailsElement)
    )
      return;
    [one.open, other.open] = [other.open, one.open];
  },

  /**
   * The fields that stand in the page itself are bound anew from what they were at first.
   * @type {Map<HTMLElement, DocumentFragment> | null}
   */
  fixed: null,

  bindFixed() {
    form.fixed ??= form.keepFixed();
    for (const [box, first] of form.fixed) {
      delete box.dataset["path"];
      box.classList.remove("offer");
      box.replaceChildren(first.cloneNode(true));
    }
    for (const message of dom.all(document, ".message[data-message]"))
      message.removeAttribute("id");
    fields.bind(document, "");
  },

  /** @returns {Map<HTMLElement, DocumentFragment>} */
  keepFixed() {
    const kept = new Map();
    for (const box of dom.all(document, ".field[data-at]")) {
      const first = document.createDocumentFragment();
      first.append(...[...box.childNodes].map((node) => node.cloneNode(true)));
      kept.set(box, first);
    }
    return kept;
  },
};
