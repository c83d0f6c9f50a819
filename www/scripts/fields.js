"use strict";

/**
 * Fields of the form and the places in the scenario that they show.
 *
 * A field is a `.field` box with a label and one control. Its place is `data-at`, below the place of what it
 * belongs to; `data-kind` says how its text is read. `data-optional` holds the words of the button that asks for
 * it; until then it is not there. `data-words` offers everyday choices.
 */
const fields = {
  /** @type {Map<string, Field>} */
  known: new Map(),

  /**
   * Where messages go that belong to no single field.
   * @type {Map<string, HTMLElement>}
   */
  groups: new Map(),

  /**
   * What was typed, so that a field keeps it when the form is made anew.
   * @type {Map<string, { text: string, value: Json | undefined }>}
   */
  typed: new Map(),

  forget() {
    fields.known.clear();
    fields.groups.clear();
  },

  /**
   * @param {string} path
   * @returns {string} id of the control that shows this place
   */
  id(path) {
    return `at${path}`;
  },

  /**
   * Binds all fields inside `root` that are not bound yet to places below `base`.
   * @param {ParentNode} root
   * @param {string} base
   */
  bind(root, base) {
    for (const box of dom.all(root, ".field[data-at]:not([data-path])")) {
      const at = box.dataset["at"] ?? "";
      fields.bindBox(box, at === "" ? base : `${base}/${at}`);
    }
    for (const message of dom.all(root, ".message[data-message]:not([id])")) {
      const path = base + (message.dataset["message"] ?? "");
      message.id = `group${path}`;
      fields.groups.set(path, message);
    }
  },

  /**
   * @param {HTMLElement} box
   * @param {string} path
   */
  bindBox(box, path) {
    box.dataset["path"] = path;
    if (box.dataset["optional"] && scenario.get(path) === undefined) {
      fields.offer(box, path, box.dataset["optional"], "");
      return;
    }
    const field = fields.add(box, path);
    if (box.dataset["optional"]) box.append(fields.leaveOut(field.label, path));
    if (field.control instanceof HTMLSelectElement) fields.bindChoice(field);
    else if (box.dataset["kind"] === "text")
      fields.bindText(field, field.control);
    else fields.bindQuantity(field, field.control);
  },

  /**
   * A button in the place of something that is only there when asked for.
   * @param {HTMLElement} box
   * @param {string} path
   * @param {string} words
   * @param {Json} first what stands there once it is asked for
   */
  offer(box, path, words, first) {
    const ask = () =>
      scenario.reshape(
        words.replace("…", ""),
        path,
        () => scenario.set(path, first),
        fields.id(path),
      );
    const button = dom.button(words, ask, "quiet");
    button.id = `${fields.id(path)}-ask`;
    box.classList.add("offer");
    box.replaceChildren(button);
  },

  /**
   * @param {string} label
   * @param {string} path
   * @returns {HTMLButtonElement}
   */
  leaveOut(label, path) {
    const out = () =>
      scenario.reshape(
        `${label} left out`,
        path,
        () => scenario.set(path, undefined),
        `${fields.id(path)}-ask`,
      );
    const button = dom.button("×", out, "quiet out");
    button.setAttribute("aria-label", `Leave out: ${label}`);
    return button;
  },

  /**
   * Names the control, ties label, message and what was understood to it, and remembers it.
   * @param {HTMLElement} box
   * @param {string} path
   * @returns {Field}
   */
  add(box, path) {
    const control = box.querySelector("input, select, textarea");
    const label = dom.find(box, "label", HTMLLabelElement);
    if (
      !(control instanceof HTMLInputElement) &&
      !(control instanceof HTMLSelectElement) &&
      !(control instanceof HTMLTextAreaElement)
    ) {
      throw new Error(`the field ${path} has no control`);
    }
    box.dataset["path"] = path;
    control.id = fields.id(path);
    label.htmlFor = control.id;
    const understood = dom.make("span", "", "understood");
    understood.id = `${control.id}-understood`;
    const message = dom.make("p", "", "message");
    message.id = `${control.id}-message`;
    label.after(understood);
    box.append(message);
    control.setAttribute("aria-describedby", `${understood.id} ${message.id}`);
    const field = {
      path,
      box,
      control,
      message,
      trouble: "",
      label: dom.words(label),
    };
    fields.known.set(path, field);
    return field;
  },

  /**
   * A choice between given words.
   * @param {Field} field
   */
  bindChoice(field) {
    const { control, path, box, label } = field;
    const value = scenario.get(path);
    control.value = String(value ?? box.dataset["default"] ?? "");
    control.addEventListener("change", () =>
      scenario.reshape(
        label,
        path,
        () => scenario.set(path, control.value),
        control.id,
      ),
    );
  },

  /**
   * Plain words; empty is the same as not there.
   * @param {Field} field
   * @param {HTMLInputElement | HTMLTextAreaElement} control
   */
  bindText(field, control) {
    const value = scenario.get(field.path);
    control.value = value === undefined ? "" : String(value);
    control.addEventListener("input", () =>
      scenario.type(
        field.path,
        control.value === "" ? undefined : control.value,
        field.label,
      ),
    );
  },

  /**
   * A quantity, written as on paper.
   * @param {Field} field
   * @param {HTMLInputElement | HTMLTextAreaElement} control
   */
  bindQuantity(field, control) {
    control.spellcheck = false;
    control.autocomplete = "off";
    control.setAttribute("autocapitalize", "off");
    fields.show(field);
    control.addEventListener("input", () => fields.take(field));
    control.addEventListener("keydown", (event) => {
      if (event instanceof KeyboardEvent) fields.stepKey(field, event);
    });
    if (field.box.dataset["words"])
      fields.offerWords(field, field.box.dataset["words"]);
  },

  /**
   * Shows the value of the scenario: as it was typed where that is still it, else as the core writes it.
   * @param {Field} field
   */
  show(field) {
    const value = scenario.get(field.path);
    const raw = fields.raw(value);
    const typed = fields.typed.get(field.path);
    if (raw !== undefined) field.control.value = raw;
    else if (typed !== undefined && pointer.same(typed.value, value))
      field.control.value = typed.text;
    else
      field.control.value =
        value === undefined
          ? ""
          : core.write(value, field.box.dataset["kind"] ?? "");
    fields.understand(field);
  },

  /**
   * The text of a value that could not be read.
   * @param {Json | undefined} value
   * @returns {string | undefined}
   */
  raw(value) {
    if (typeof value === "string") return value;
    if (pointer.isObject(value) && typeof value["at_s"] === "string")
      return value["at_s"];
    return undefined;
  },

  /**
   * Takes what was typed into the scenario.
   * @param {Field} field
   */
  take(field) {
    const reading = fields.understand(field);
    const text = field.control.value;
    const old = scenario.get(field.path);
    /** @type {Json} */
    let value = text.trim() === "" ? "" : text;
    if (reading !== null && "written" in reading) value = reading.written;
    // A table keeps what stands beside its points.
    if (pointer.isObject(old) && "at_s" in old) {
      value = pointer.isObject(value)
        ? { ...old, ...value }
        : { ...old, at_s: value };
    }
    fields.typed.set(field.path, { text, value });
    fields.matchWords(field, value);
    scenario.type(field.path, value, field.label);
  },

  /**
   * Reads the text of a field; says beside it what was understood where that differs, else why it was not.
   * @param {Field} field
   * @returns {Reading | null} null for an empty field
   */
  understand(field) {
    const text = field.control.value;
    const reading =
      text.trim() === ""
        ? null
        : core.read(text, field.box.dataset["kind"] ?? "");
    const understood =
      reading !== null && "understood" in reading ? reading.understood : "";
    const plain = (/** @type {string} */ words) => words.replace(/\s+/g, "");
    const differs = understood !== "" && plain(understood) !== plain(text);
    dom.find(field.box, ".understood", HTMLElement).textContent = differs
      ? `= ${understood}`
      : "";
    field.trouble =
      reading !== null && "message" in reading ? reading.message : "";
    return reading;
  },

  /**
   * The arrow keys step a number.
   * @param {Field} field
   * @param {KeyboardEvent} event
   */
  stepKey(field, event) {
    const up = event.key === "ArrowUp" || event.key === "PageUp";
    if (!up && event.key !== "ArrowDown" && event.key !== "PageDown") return;
    if (event.ctrlKey || event.metaKey || event.altKey) return;
    const large = event.shiftKey || event.key.startsWith("Page");
    const stepped = core.step(
      field.control.value,
      field.box.dataset["kind"] ?? "",
      up,
      large,
    );
    if (stepped === undefined) return;
    event.preventDefault();
    field.control.value = stepped;
    fields.take(field);
  },

  /**
   * Everyday choices in words beside a quantity that nobody measures.
   * @param {Field} field
   * @param {string} kind
   */
  offerWords(field, kind) {
    const words = dom.copy("words-template");
    const select = dom.find(words, "select", HTMLSelectElement);
    const label = dom.find(words, "label", HTMLLabelElement);
    const source = dom.find(words, ".source", HTMLElement);
    select.id = `${field.control.id}-words`;
    label.htmlFor = select.id;
    label.textContent = `${field.label}, in words`;
    const choices = core.choices(kind);
    for (const [i, choice] of choices.entries()) {
      const range = core.write(choice.written, field.box.dataset["kind"] ?? "");
      select.append(new Option(`${choice.words}: ${range}`, String(i)));
    }
    select.addEventListener("change", () => {
      const choice = choices[Number(select.value)];
      if (select.value === "" || choice === undefined) return;
      scenario.type(field.path, choice.written, field.label);
      fields.show(field);
      source.textContent = choice.source;
    });
    field.message.before(words);
    fields.matchWords(field, scenario.get(field.path));
  },

  /**
   * Shows which of the everyday choices a value is, if one.
   * @param {Field} field
   * @param {Json | undefined} value
   */
  matchWords(field, value) {
    const kind = field.box.dataset["words"];
    if (kind === undefined) return;
    const choices = core.choices(kind);
    const at = choices.findIndex((choice) =>
      pointer.same(choice.written, value),
    );
    dom.find(field.box, "select.words", HTMLSelectElement).value =
      at < 0 ? "" : String(at);
    dom.find(field.box, ".source", HTMLElement).textContent =
      choices[at]?.source ?? "";
  },

  /**
   * Puts every problem at the field it belongs to, or at what holds it.
   * @param {Problem[]} problems
   */
  report(problems) {
    for (const message of fields.groups.values()) message.textContent = "";
    for (const field of fields.known.values())
      fields.complain(field, field.trouble, false);
    for (const problem of problems) {
      if (problem.severity !== "error") continue;
      const place = fields.nearest(problem.path);
      const needed = problem.kind === "needed" || fields.isEmpty(problem.path);
      const words = needed
        ? fields.wanted(problem)
        : `${problem.message}. ${problem.hint}`.trim();
      if (place.field !== undefined) {
        if (place.field.trouble === "")
          fields.complain(place.field, words, needed);
      } else if (place.group !== undefined) {
        place.group.textContent = words;
      }
    }
  },

  /**
   * @param {Field} field
   * @param {string} words
   * @param {boolean} needed
   */
  complain(field, words, needed) {
    field.message.textContent = words;
    field.message.classList.toggle("needed", needed);
    if (words !== "" && !needed)
      field.control.setAttribute("aria-invalid", "true");
    else field.control.removeAttribute("aria-invalid");
    const more = field.box.closest("details");
    if (words !== "" && more !== null) more.open = true;
  },

  /**
   * Is there nothing yet at this place?
   * @param {string} path
   * @returns {boolean}
   */
  isEmpty(path) {
    return scenario.get(path) === "";
  },

  /**
   * @param {Problem} problem
   * @returns {string}
   */
  wanted(problem) {
    const what = problem.kind === "needed" ? problem.message : "";
    return what === "" ? "Still needed" : `Still needed: ${what}`;
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
      const group = fields.groups.get(at);
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
    const place = fields.nearest(path);
    if (place.field !== undefined) return place.field.control;
    const holder = place.group?.closest("fieldset, .row");
    return holder === null || holder === undefined
      ? undefined
      : dom.all(holder, "input, select, button")[0];
  },

  /**
   * What a place is called on the page, with what it belongs to: "Layer 2, Thickness".
   * @param {string} path
   * @returns {string}
   */
  name(path) {
    const place = fields.nearest(path);
    const holder = (place.field?.box ?? place.group)?.closest("fieldset");
    const whose = dom.words(holder?.querySelector("legend") ?? null);
    return [whose, place.field?.label ?? ""]
      .filter((words) => words !== "")
      .join(": ");
  },

  /**
   * Brings a place into view and marks it for a moment.
   * @param {string} path
   */
  point(path) {
    const box = fields.nearest(path).field?.box;
    if (box === undefined) return;
    box.scrollIntoView({ block: "nearest" });
    box.classList.add("changed");
    setTimeout(() => box.classList.remove("changed"), 1500);
  },
};
