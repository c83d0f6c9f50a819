"use strict";

/** Text fields for quantities: written as on paper, understood by the core, never lost. */
const fields = {
  /** An id that belongs to a path. @param {string} path */
  id(path) {
    return `f${path.replaceAll(/[^a-zA-Z0-9]/g, "-")}`;
  },

  /**
   * A fresh copy of a template's content.
   * @param {string} id
   * @returns {HTMLElement}
   */
  clone(id) {
    const template = /** @type {HTMLTemplateElement} */ (
      document.getElementById(id)
    );
    const holder = document.createElement("div");
    holder.append(template.content.cloneNode(true));
    return holder.childElementCount === 1
      ? /** @type {HTMLElement} */ (holder.firstElementChild)
      : holder;
  },

  /** @param {ParentNode} root @param {string} selector @returns {any} */
  in(root, selector) {
    return root.querySelector(selector);
  },

  /**
   * Ties every bare label in `root` to the control after it.
   * @param {HTMLElement} root
   * @param {string} path
   */
  label(root, path) {
    for (const label of root.querySelectorAll("label:not([for])")) {
      const control = /** @type {HTMLElement | null} */ (
        label.nextElementSibling
      );
      if (!control || !["SELECT", "INPUT"].includes(control.tagName)) continue;
      control.id = fields.id(`${path}/${control.className}`);
      /** @type {HTMLLabelElement} */ (label).htmlFor = control.id;
    }
  },

  /**
   * Brings every field below `root` to life; their places are below `base`.
   * @param {HTMLElement} root
   * @param {string} base
   */
  mount(root, base) {
    for (const field of root.querySelectorAll(".field")) {
      const element = /** @type {HTMLElement} */ (field);
      if (element.dataset["path"] === undefined) fields.mountOne(element, base);
    }
  },

  /** @param {HTMLElement} element @param {string} base */
  mountOne(element, base) {
    const key = element.dataset["field"] ?? "";
    const path = key.startsWith("/")
      ? key
      : key === ""
        ? base
        : `${base}/${key}`;
    element.dataset["path"] = path;
    const input = document.createElement("input");
    input.id =
      fields.id(path) +
      (element.dataset["table"] === undefined ? "" : "-table");
    input.dataset["path"] = path;
    input.type = "text";
    input.spellcheck = false;
    input.setAttribute(
      "aria-describedby",
      `${input.id}-understood ${input.id}-problem`,
    );
    if (element.dataset["text"] !== undefined) {
      input.classList.add("words");
      input.maxLength = Number(element.dataset["text"]);
    }
    if (element.dataset["optional"] !== undefined)
      input.placeholder = element.dataset["optional"];
    /** @type {HTMLLabelElement} */ (element.querySelector("label")).htmlFor =
      input.id;
    element.append(
      element.dataset["choices"] ? fields.withChoices(element, input) : input,
    );
    for (const name of ["understood", "problem", "source"]) {
      const line = document.createElement("p");
      line.className = name;
      line.id = `${input.id}-${name}`;
      element.append(line);
    }
    input.value = model.drafts.get(path) ?? fields.written(element, path);
    input.addEventListener("input", () => fields.typed(element, input));
    input.addEventListener(
      "focus",
      () => (input.dataset["before"] = input.value),
    );
    input.addEventListener("blur", () => (model.typing = ""));
    input.addEventListener("keydown", (event) =>
      fields.stepped(event, element, input),
    );
    fields.understand(element, input);
  },

  /** @param {HTMLElement} element @param {HTMLInputElement} input */
  withChoices(element, input) {
    const holder = document.createElement("div");
    const chooser = document.createElement("div");
    const select = document.createElement("select");
    holder.className = "entry";
    chooser.className = "chooser";
    const label = /** @type {HTMLElement} */ (element.querySelector("label"))
      .textContent;
    select.setAttribute("aria-label", `${label}: choose in words`);
    select.title = "Choose in words";
    select.append(new Option("Choose in words", ""));
    const choices = wasm_bindgen.choices(
      /** @type {string} */ (element.dataset["choices"]),
    );
    const kind = element.dataset["kind"] ?? "";
    choices.forEach((choice, i) => {
      const spread = {
        value: choice.likely,
        low: choice.low,
        high: choice.high,
      };
      select.append(
        new Option(`${choice.words}: ${core.write(spread, kind)}`, String(i)),
      );
    });
    select.addEventListener("change", () => {
      const choice = choices[Number(select.value)];
      if (select.value === "" || !choice) return;
      select.value = "";
      const spread = {
        value: choice.likely,
        low: choice.low,
        high: choice.high,
      };
      input.value = core.write(
        choice.low === choice.high ? choice.likely : spread,
        kind,
      );
      fields.typed(element, input);
      fields.in(element, ".source").textContent =
        `${choice.words}: ${choice.source}`;
      input.focus();
    });
    chooser.append(select);
    holder.append(input, chooser);
    return holder;
  },

  /**
   * What the scenario holds, as text.
   * @param {HTMLElement} element
   * @param {string} path
   * @returns {string}
   */
  written(element, path) {
    const value = model.get(path);
    const kind = element.dataset["kind"] ?? "";
    if (value === undefined || value === null) return "";
    if (element.dataset["text"] !== undefined) return String(value);
    if (element.dataset["table"] !== undefined) {
      return fields.writtenPairs(
        value.at_s,
        value[element.dataset["table"] ?? ""],
        "duration",
        kind,
      );
    }
    if (element.dataset["property"] !== undefined && value.at_c !== undefined) {
      return fields.writtenPairs(value.at_c, value.values, "temperature", kind);
    }
    if (
      element.dataset["property"] !== undefined &&
      value.polynomial_in_c !== undefined
    ) {
      return "a polynomial, see the file";
    }
    return core.write(value, kind);
  },

  /** @param {number[]} at @param {number[]} values @param {string} atKind @param {string} kind */
  writtenPairs(at, values, atKind, kind) {
    if (!Array.isArray(at) || !Array.isArray(values)) return "";
    return wasm_bindgen.write_pairs(
      new Float64Array(at),
      new Float64Array(values),
      atKind,
      kind,
      core.us,
    );
  },

  /**
   * What a text says, as a value of the file, or the problem with it.
   * @param {HTMLElement} element
   * @param {string} text
   * @param {string} path
   * @returns {{ value?: Json, problem?: string }}
   */
  meant(element, text, path) {
    const kind = element.dataset["kind"] ?? "";
    if (text.trim() === "") return {};
    if (element.dataset["text"] !== undefined) return { value: text };
    if (element.dataset["table"] !== undefined) {
      const pairs = wasm_bindgen.read_pairs(text, "duration", kind, core.us);
      if (pairs.problem !== undefined) return { problem: pairs.problem };
      const before = model.get(path);
      const table = /** @type {{ [key: string]: Json }} */ ({
        at_s: pairs.at ?? [],
        [element.dataset["table"] ?? ""]: pairs.values ?? [],
      });
      if (before?.repeats_every_s !== undefined)
        table["repeats_every_s"] = before.repeats_every_s;
      return { value: table };
    }
    if (element.dataset["property"] !== undefined && text.includes(":")) {
      const pairs = wasm_bindgen.read_pairs(text, "temperature", kind, core.us);
      if (pairs.problem !== undefined) return { problem: pairs.problem };
      return { value: { at_c: pairs.at ?? [], values: pairs.values ?? [] } };
    }
    const read = core.read(text, kind);
    if (read.problem !== undefined) return { problem: read.problem };
    const value = /** @type {number} */ (read.value);
    if (typeof read.low === "number" && typeof read.high === "number") {
      return { value: { value, low: read.low, high: read.high } };
    }
    return { value };
  },

  /** @param {HTMLElement} element @param {HTMLInputElement} input */
  typed(element, input) {
    const path = /** @type {string} */ (input.dataset["path"]);
    const meant = fields.meant(element, input.value, path);
    fields.in(element, ".source").textContent = "";
    model.change(
      () => {
        if (meant.problem !== undefined) {
          model.drafts.set(path, input.value);
          return;
        }
        model.drafts.delete(path);
        const setting = () => model.set(path, meant.value);
        if (path.endsWith("/name")) model.renaming(setting);
        else setting();
      },
      { typing: path },
    );
    fields.understand(element, input);
  },

  /** Shows beside the field what was understood, where that reads differently. @param {HTMLElement} element @param {HTMLInputElement} input */
  understand(element, input) {
    const path = /** @type {string} */ (input.dataset["path"]);
    const draft = model.drafts.get(path);
    const line = fields.in(element, ".understood");
    line.textContent = "";
    if (draft !== undefined) {
      fields.complain(input, fields.meant(element, draft, path).problem ?? "");
      return;
    }
    const written = fields.written(element, path);
    const same = (/** @type {string} */ text) => text.replaceAll(/\s/g, "");
    const typed = same(input.value);
    // The bare number of a shown unit is understood as it stands.
    const bare =
      typed !== "" && same(written).startsWith(typed) && /[0-9]$/.test(typed);
    if (typed !== "" && typed !== same(written) && !bare)
      line.textContent = `understood as ${written}`;
  },

  /** @param {KeyboardEvent} event @param {HTMLElement} element @param {HTMLInputElement} input */
  stepped(event, element, input) {
    if (event.key !== "ArrowUp" && event.key !== "ArrowDown") return;
    const kind = element.dataset["kind"];
    if (kind === undefined) return;
    const next = wasm_bindgen.step_quantity(
      input.value,
      kind,
      core.us,
      event.key === "ArrowUp",
      event.shiftKey,
    );
    if (next === undefined) return;
    event.preventDefault();
    input.value = next;
    fields.typed(element, input);
  },

  /** @param {HTMLInputElement} input @param {string} words */
  complain(input, words) {
    const line = document.getElementById(`${input.id}-problem`);
    if (line) line.textContent = words;
    if (words === "") input.removeAttribute("aria-invalid");
    else input.setAttribute("aria-invalid", "true");
  },

  /**
   * Puts each problem at the field it belongs to; gives back what found none.
   * @param {Problem[]} problems
   * @returns {Problem[]}
   */
  place(problems) {
    const inputs = /** @type {HTMLInputElement[]} */ ([
      ...document.querySelectorAll("input[data-path]"),
    ]);
    const left = new Set(problems);
    for (const input of inputs) {
      const path = input.dataset["path"];
      if (path !== undefined && model.drafts.has(path)) continue;
      const own = problems.filter(
        (one) => one.path === path || one.path.startsWith(`${path}/`),
      );
      const words = own.map((one) =>
        [one.message, one.hint].filter((part) => part !== "").join(". "),
      );
      if (input.closest(".field")) fields.complain(input, words.join("; "));
      if (input.closest("[hidden]")) continue;
      for (const one of own) left.delete(one);
    }
    return [...left];
  },

  /** The field nearest to a path. @param {string} path @returns {HTMLElement | null} */
  nearest(path) {
    for (let at = path; at !== ""; at = at.slice(0, at.lastIndexOf("/"))) {
      const found = document.querySelector(`[data-path^="${CSS.escape(at)}"]`);
      if (found)
        return found.matches("input, select, button")
          ? /** @type {HTMLElement} */ (found)
          : fields.in(found, "input, select, button");
    }
    return null;
  },
};
