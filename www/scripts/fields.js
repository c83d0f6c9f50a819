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
   * What was typed, so that a field keeps it when the form is made anew.
   * @type {Map<string, { text: string, value: Json | undefined }>}
   */
  typed: new Map(),

  forget() {
    fields.known.clear();
    messages.groups.clear();
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
    const unbound = ".field[data-at]:not([data-path])";
    for (const box of dom.all(root, unbound)) {
      const at = box.dataset["at"] ?? "";
      fields.bindBox(box, at === "" ? base : `${base}/${at}`);
    }
    messages.bind(root, base);
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
    return dom.cross(`Leave out: ${label}`, out);
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
    if (field.box.dataset["words"]) everyday.offer(field);
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
    everyday.match(field, value);
    scenario.type(field.path, value, field.label);
  },

  /**
   * Reads the text of a field; says beside it what was understood where that differs, else why it was not.
   * @param {Field} field
   * @returns {Reading | null} null for an empty field
   */
  understand(field) {
    const text = field.control.value;
    const kind = field.box.dataset["kind"] ?? "";
    const reading = text.trim() === "" ? null : core.read(text, kind);
    field.trouble =
      reading !== null && "message" in reading ? reading.message : "";
    const note = dom.find(field.box, ".understood", HTMLElement);
    note.textContent = fields.understood(field, reading);
    return reading;
  },

  /**
   * What was understood, where that differs from what is written.
   * @param {Field} field
   * @param {Reading | null} reading
   * @returns {string}
   */
  understood(field, reading) {
    if (reading === null || "message" in reading) return "";
    const { written, understood } = reading;
    if (field.box.dataset["moment"] !== undefined && Number(written) > 0) {
      const moment = core.ask((page) => page.moment(Number(written)), null);
      if (moment?.iso) return moment.words;
    }
    const plain = (/** @type {string} */ said) =>
      said.replace(/\s+/g, "").replaceAll("−", "-");
    const same = plain(understood) === plain(field.control.value);
    return same ? "" : `= ${understood}`;
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
};
