"use strict";

/** What is wrong or still missing: at the field it belongs to, in the words of the page. */
const messages = {
  /**
   * Where messages go that belong to no single field, by the place they are about.
   * @type {Map<string, HTMLElement>}
   */
  groups: new Map(),

  /**
   * What the page calls the keys of the file.
   * @type {Map<string, string> | null}
   */
  labels: null,

  /**
   * Makes the messages inside `root` those of places below `base`.
   * @param {ParentNode} root
   * @param {string} base
   */
  bind(root, base) {
    for (const message of dom.all(root, ".message[data-message]:not([id])")) {
      const path = base + (message.dataset["message"] ?? "");
      message.id = `group${path}`;
      messages.groups.set(path, message);
    }
  },

  /**
   * Puts every problem where it belongs.
   * @param {Problem[]} problems
   */
  report(problems) {
    for (const group of messages.groups.values()) group.textContent = "";
    for (const field of fields.known.values()) {
      messages.complain(field, field.trouble);
    }
    for (const problem of problems) {
      const { field, group } = messages.nearest(problem.path);
      const said = messages.words(problem);
      if (field === undefined) {
        if (group !== undefined) group.textContent = said || "Still needed";
      } else if (field.trouble === "") {
        messages.complain(field, said);
        messages.want(field, messages.isNeeded(problem));
      }
    }
  },

  /**
   * @param {Field} field
   * @param {string} said empty where there is nothing to say
   */
  complain(field, said) {
    if (field.message.textContent !== said) field.message.textContent = said;
    field.message.classList.remove("needed");
    if (said === "") field.control.removeAttribute("aria-invalid");
    else field.control.setAttribute("aria-invalid", "true");
    messages.want(field, false);
    const more = field.box.closest("details");
    if (said !== "" && more !== null) more.open = true;
  },

  /**
   * Something that is still to be entered is no mistake.
   * @param {Field} field
   * @param {boolean} wanted
   */
  want(field, wanted) {
    const { control, message } = field;
    const said = "still needed";
    if (!(control instanceof HTMLSelectElement)) {
      if (wanted) control.placeholder = said;
      else if (control.placeholder === said) control.placeholder = "";
    }
    if (!wanted) return;
    message.classList.add("needed");
    control.removeAttribute("aria-invalid");
  },

  /**
   * Is this only something that is not there yet?
   * @param {Problem} problem
   * @returns {boolean}
   */
  isNeeded(problem) {
    return problem.kind === "needed" || scenario.get(problem.path) === "";
  },

  /**
   * A problem in the words of the page; empty where "still needed" says it all.
   * @param {Problem} problem
   * @returns {string}
   */
  words(problem) {
    const own = messages.nearest(problem.path).field?.trouble;
    if (own) return messages.sentence(own);
    if (scenario.get(problem.path) === "") return "";
    const said = messages.sentence(messages.inLabels(problem.message));
    return `${said} ${problem.hint}`.trim();
  },

  /**
   * @param {string} said
   * @returns {string}
   */
  sentence(said) {
    return `${said.charAt(0).toUpperCase()}${said.slice(1)}${/[.?!]$/.test(said) ? "" : "."}`;
  },

  /**
   * The core names the keys of the file; here they have labels.
   * @param {string} said
   * @returns {string}
   */
  inLabels(said) {
    messages.labels ??= messages.collectLabels();
    return said.replace(/\b[a-z]+(?:_[a-z0-9]+)+\b/g, (key) => {
      const label = messages.labels?.get(key);
      return label === undefined ? key : `“${label}”`;
    });
  },

  /** @returns {Map<string, string>} */
  collectLabels() {
    const labels = new Map();
    const roots = [...document.querySelectorAll("template")].map(
      (template) => template.content,
    );
    for (const root of roots) {
      for (const box of dom.all(root, "[data-at], [data-over]")) {
        const { at, over = at, name } = box.dataset;
        labels.set(over, name ?? dom.words(box.querySelector("label")));
      }
    }
    for (const [box, first] of form.fixed ?? []) {
      const key = box.dataset["at"]?.split("/").pop();
      labels.set(key, dom.words(first.querySelector("label")));
    }
    for (const option of document.querySelectorAll("#start-kind option")) {
      labels.set(option.getAttribute("value"), dom.words(option));
    }
    return labels;
  },

  /**
   * The field or the group that shows a place, or what holds it.
   * @param {string} path
   * @returns {{ field?: Field, group?: HTMLElement }}
   */
  nearest(path) {
    for (let at = path; ; at = pointer.parent(at)) {
      const field = fields.known.get(at);
      if (field !== undefined) return { field };
      const group = messages.groups.get(at);
      if (group !== undefined) return { group };
      if (at === "") return {};
    }
  },

  /**
   * The control to go to for a place.
   * @param {string} path
   * @returns {HTMLElement | undefined}
   */
  control(path) {
    const { field, group } = messages.nearest(path);
    if (field !== undefined) return field.control;
    const holder = group?.closest(".row, fieldset");
    if (!holder) return undefined;
    return dom.all(holder, "input, select, button")[0];
  },

  /**
   * What a place is called on the page, with what it belongs to.
   * @param {string} path
   * @returns {string} "Layer 2: Thickness", "How does it start? Temperature"
   */
  name(path) {
    const { field, group } = messages.nearest(path);
    const holder = (field?.box ?? group)?.closest("fieldset");
    const whose = dom.words(holder?.querySelector("legend") ?? null);
    const label = field?.label ?? "";
    if (whose === "" || label === "") return whose + label;
    return `${whose}${whose.endsWith("?") ? "" : ":"} ${label}`;
  },

  /**
   * Brings a place into view and marks it for a moment.
   * @param {string} path
   */
  point(path) {
    const box = messages.nearest(path).field?.box;
    if (box === undefined) return;
    box.scrollIntoView({ block: "nearest" });
    box.classList.add("changed");
    setTimeout(() => box.classList.remove("changed"), 1500);
  },
};
