"use strict";

/** Conditions to reach, limits not to cross, places to watch. */
const watch = {
  /** The key of the limit and the kind of its quantity. @param {any} condition @returns {[string, string]} */
  limit(condition) {
    if (condition.what === "difference")
      return ["below_k", "temperature_difference"];
    if (condition.what === "rate") return ["below_k_per_h", "rate"];
    return [
      condition.above_c === undefined ? "below_c" : "above_c",
      "temperature",
    ];
  },

  render() {
    watch.list("ready-when", "/ready_when");
    watch.list("must-not", "/must_not");
    const probes = model.get("/probes") ?? [];
    const place = /** @type {HTMLElement} */ (
      document.getElementById("probes")
    );
    place.replaceChildren(
      .../** @type {any[]} */ (probes).map((_, i) => watch.probe(i)),
    );
    const more = /** @type {HTMLDetailsElement} */ (
      document.getElementById("more")
    );
    more.open =
      more.open ||
      probes.length > 0 ||
      model.get("/look_ahead_s") !== undefined;
    const field = fields.in(more, '[data-field="/look_ahead_s"]');
    for (const child of [...field.children])
      if (child.tagName !== "LABEL") child.remove();
    delete field.dataset["path"];
    fields.mount(more, "");
    const notes = /** @type {HTMLTextAreaElement} */ (
      document.getElementById("notes")
    );
    if (document.activeElement !== notes)
      notes.value = model.get("/notes") ?? "";
  },

  /** @param {string} id @param {string} path */
  list(id, path) {
    const list = /** @type {HTMLElement} */ (document.getElementById(id));
    list.dataset["path"] = path;
    const all = model.get(path) ?? [];
    list.replaceChildren(
      .../** @type {any[]} */ (all).map((_, i) =>
        watch.condition(`${path}/${i}`, id),
      ),
    );
  },

  /** @param {string} path @param {string} list @returns {HTMLElement} */
  condition(path, list) {
    const condition = model.get(path);
    const element = fields.clone("condition-template");
    element.dataset["path"] = path;
    const subject = fields.in(element, ".subject");
    watch.subjects(subject, condition);
    subject.dataset["path"] = `${path}/what`;
    subject.addEventListener("change", () =>
      watch.changeSubject(path, subject.value, subject.id),
    );
    const sense = fields.in(element, ".sense");
    const [key, kind] = watch.limit(condition);
    sense.value = key === "above_c" ? "above" : "below";
    sense.disabled = kind !== "temperature";
    sense.addEventListener("change", () => {
      model.change(
        () => {
          const to = sense.value === "above" ? "above_c" : "below_c";
          model.set(`${path}/${to}`, condition[key]);
          model.set(`${path}/${key}`, undefined);
          model.forget(path);
        },
        { structure: true },
      );
      document.getElementById(sense.id)?.focus();
    });
    const remove = fields.in(element, ".remove");
    remove.setAttribute(
      "aria-label",
      `Remove ${subject.selectedOptions[0]?.textContent ?? "this"}`,
    );
    remove.addEventListener("click", () => {
      model.change(
        () => {
          model.set(path, undefined);
          model.forget(path.slice(0, path.lastIndexOf("/")));
        },
        { structure: true },
      );
      document
        .getElementById(list === "ready-when" ? "add-ready" : "add-limit")
        ?.focus();
    });
    const field = fields.in(element, ".field");
    field.dataset["field"] = key;
    field.dataset["kind"] = kind;
    fields.label(element, path);
    fields.mount(element, path);
    return element;
  },

  /** @param {HTMLSelectElement} select @param {any} condition */
  subjects(select, condition) {
    /** @param {string} label @param {[string, string][]} options */
    const group = (label, options) => {
      const element = document.createElement("optgroup");
      element.label = label;
      for (const [value, words] of options)
        element.append(new Option(words, value));
      select.append(element);
    };
    /** @param {string} of @param {string} name @returns {[string, string][]} */
    const region = (of, name) => [
      [`hottest|${of}`, `hottest of ${name}`],
      [`coldest|${of}`, `coldest of ${name}`],
      [`mean|${of}`, `mean of ${name}`],
      [`difference|${of}`, `hottest minus coldest of ${name}`],
      [`rate|${of}`, `change of the mean of ${name}`],
    ];
    const names = [...new Set(model.layerNames())];
    for (const name of names) group(name, region(name, name));
    if (names.length > 1)
      group("The whole item", region("item", "the whole item"));
    const sides = /** @type {[string, string][]} */ ([
      ["face|outer", "outer face"],
    ]);
    if (model.hasInnerFace()) sides.push(["face|inner", "inner face"]);
    group("Faces", sides);
    const probes = /** @type {any[]} */ (model.get("/probes") ?? []).map(
      (one) =>
        /** @type {[string, string]} */ ([
          `probe|${one.name ?? ""}`,
          `at ${one.name ?? ""}`,
        ]),
    );
    if (probes.length > 0) group("Places", probes);
    const of = condition.of ?? (names.length > 1 ? "item" : names[0]);
    const value = `${condition.what}|${of}`;
    select.value = value;
    if (select.value !== value) {
      select.append(
        new Option(`${condition.what} of ${of} (not there)`, value),
      );
      select.value = value;
    }
  },

  /** @param {string} path @param {string} subject @param {string} id */
  changeSubject(path, subject, id) {
    const [what, of] = /** @type {[string, string]} */ ([
      subject.slice(0, subject.indexOf("|")),
      subject.slice(subject.indexOf("|") + 1),
    ]);
    const before = model.get(path);
    const [key, kind] = watch.limit(before);
    model.change(
      () => {
        const next = /** @type {any} */ ({ what, of });
        const [nextKey, nextKind] = watch.limit({
          ...next,
          above_c: before.above_c,
        });
        if (nextKind === kind) next[nextKey] = before[key];
        else
          next[nextKey] =
            nextKind === "temperature" ? 60 : nextKind === "rate" ? 1 : 5;
        if (next[nextKey] === undefined) delete next[nextKey];
        model.set(path, next);
        model.forget(path);
      },
      { structure: true },
    );
    document.getElementById(id)?.focus();
  },

  /** @param {number} i @returns {HTMLElement} */
  probe(i) {
    const path = `/probes/${i}`;
    const probe = model.get(path);
    const element = fields.clone("probe-template");
    element.dataset["path"] = path;
    const key =
      probe.from_inside_m === undefined ? "from_outside_m" : "from_inside_m";
    const side = fields.in(element, ".side");
    side.value = key;
    side.addEventListener("change", () => {
      model.change(
        () => {
          model.set(`${path}/${side.value}`, probe[key]);
          model.set(`${path}/${key}`, undefined);
          model.forget(path);
        },
        { structure: true },
      );
      document.getElementById(side.id)?.focus();
    });
    fields.in(element, '[data-kind="length"]').dataset["field"] = key;
    fields.in(element, ".remove").addEventListener("click", () => {
      model.change(
        () => {
          model.set(path, undefined);
          if (model.get("/probes").length === 0)
            model.set("/probes", undefined);
          model.forget("/probes");
        },
        { structure: true },
      );
      document.getElementById("add-probe")?.focus();
    });
    fields.label(element, path);
    fields.mount(element, path);
    return element;
  },

  /** @param {string} path @param {any} item */
  append(path, item) {
    model.change(
      () => {
        if (!Array.isArray(model.get(path))) model.set(path, []);
        model.get(path).push(item);
      },
      { structure: true },
    );
  },

  listen() {
    document.getElementById("add-ready")?.addEventListener("click", () => {
      watch.append("/ready_when", {
        what: "hottest",
        of: model.layerNames()[0] ?? "item",
        below_c: 60,
      });
      fields.in(document, "#ready-when > li:last-child .subject").focus();
    });
    document.getElementById("add-limit")?.addEventListener("click", () => {
      watch.append("/must_not", {
        what: "coldest",
        of: model.layerNames()[0] ?? "item",
        below_c: 5,
      });
      fields.in(document, "#must-not > li:last-child .subject").focus();
    });
    document.getElementById("add-probe")?.addEventListener("click", () => {
      const names = new Set(
        /** @type {any[]} */ (model.get("/probes") ?? []).map(
          (one) => one.name,
        ),
      );
      let number = names.size + 1;
      while (names.has(`place ${number}`)) number += 1;
      watch.append("/probes", {
        name: `place ${number}`,
        from_outside_m: 0.01,
      });
      fields.in(document, "#probes > li:last-child input").focus();
    });
    const notes = /** @type {HTMLTextAreaElement} */ (
      document.getElementById("notes")
    );
    notes.addEventListener("input", () => {
      model.change(
        () => model.set("/notes", notes.value === "" ? undefined : notes.value),
        { typing: "/notes" },
      );
    });
  },
};
