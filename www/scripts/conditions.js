"use strict";

/** Conditions to reach, and limits not to cross. */
const conditions = {
  lists: ["ready_when", "must_not"],
  limits: ["below_c", "above_c", "below_k", "below_k_per_h"],

  render() {
    for (const list of conditions.lists) {
      const rows = scenario.list(`/${list}`);
      dom
        .byId(list, HTMLElement)
        .replaceChildren(...rows.map((_, i) => conditions.block(list, i)));
    }
    dom.byId("ready-note", HTMLElement).hidden =
      scenario.list("/ready_when").length < 2;
    dom.byId("must-note", HTMLElement).hidden =
      scenario.list("/must_not").length === 0;
  },

  /**
   * @param {string} list
   * @param {number} i
   * @returns {DocumentFragment}
   */
  block(list, i) {
    const base = `/${list}/${i}`;
    const made = dom.copy("condition-template");
    const name = `${list === "must_not" ? "Limit" : "Condition"} ${i + 1}`;
    dom.find(made, "legend", HTMLElement).textContent = name;
    const what = String(scenario.get(`${base}/what`) ?? "");
    conditions.bindWhat(made, base, what);
    conditions.bindOf(made, base, what);
    conditions.bindLimit(made, base, what);
    const remove = () => conditions.remove(list, i);
    dom
      .find(made, ".condition", HTMLElement)
      .append(dom.cross(`Remove: ${name}`, remove));
    fields.bind(made, base);
    return made;
  },

  /**
   * @param {DocumentFragment} made
   * @param {string} base
   * @param {string} what
   */
  bindWhat(made, base, what) {
    const { control } = fields.add(
      dom.find(made, '[data-kind="what"]', HTMLElement),
      `${base}/what`,
    );
    control.value = what;
    control.addEventListener("change", () =>
      scenario.reshape(
        "What is watched",
        base,
        () => conditions.watch(base, control.value),
        control.id,
      ),
    );
  },

  /**
   * Inside a change: the condition watches something else; what still fits stays.
   * @param {string} base
   * @param {string} what
   */
  watch(base, what) {
    const old = /** @type {JsonObject} */ (scenario.get(base));
    const [first] = conditions.subjects(what);
    const kept = conditions
      .subjects(what)
      .some(([name]) => name === (old["of"] ?? "item"));
    let of = kept ? old["of"] : first?.[0];
    if (what === "probe" && first === undefined) of = probes.append();
    const limit = conditions.limitKey(what, old);
    scenario.set(base, {
      what,
      ...(of === undefined || of === "item" ? {} : { of }),
      [limit]: old[limit] ?? "",
    });
  },

  /**
   * @param {string} what
   * @param {JsonObject} old
   * @returns {string}
   */
  limitKey(what, old) {
    if (what === "difference") return "below_k";
    if (what === "rate") return "below_k_per_h";
    return "above_c" in old ? "above_c" : "below_c";
  },

  /**
   * What can be watched, as the file calls it and in words.
   * @param {string} what
   * @returns {[string, string][]}
   */
  subjects(what) {
    if (what === "probe") return probes.names().map((name) => [name, name]);
    if (what === "face") {
      const outer = /** @type {[string, string]} */ (["outer", "outside"]);
      return layers.isHollow() ? [outer, ["inner", "inside"]] : [outer];
    }
    return [
      ["item", "the whole item"],
      ...layers
        .names()
        .map((name) => /** @type {[string, string]} */ ([name, name])),
    ];
  },

  /**
   * @param {DocumentFragment} made
   * @param {string} base
   * @param {string} what
   */
  bindOf(made, base, what) {
    const path = `${base}/of`;
    const { box } = fields.add(
      dom.find(made, '[data-kind="of"]', HTMLElement),
      path,
    );
    const select = dom.find(box, "select", HTMLSelectElement);
    const written = scenario.get(path);
    const subjects = conditions.subjects(what);
    for (const [value, words] of subjects)
      select.append(new Option(words, value));
    const of = String(
      written ?? (what === "probe" || what === "face" ? "" : "item"),
    );
    // A name that is not there any more stands as it was written, with its message.
    if (!subjects.some(([value]) => value === of))
      select.append(new Option(of, of));
    select.value = of;
    select.addEventListener("change", () =>
      scenario.reshape(
        "Of which",
        path,
        () => scenario.set(path, select.value),
        select.id,
      ),
    );
  },

  /**
   * @param {DocumentFragment} made
   * @param {string} base
   * @param {string} what
   */
  bindLimit(made, base, what) {
    const written = scenario.get(base);
    const fallback = conditions.limitKey(
      what,
      pointer.isObject(written) ? written : {},
    );
    const key =
      conditions.limits.find(
        (limit) => pointer.isObject(written) && limit in written,
      ) ?? fallback;
    const kinds = /** @type {Record<string, string>} */ ({
      below_k: "temperature_difference",
      below_k_per_h: "rate",
    });
    const limit = dom.find(made, '[data-kind="limit"]', HTMLElement);
    limit.dataset["kind"] = kinds[key] ?? "temperature";
    limit.dataset["at"] = key;
    conditions.bindSense(
      dom.find(made, '[data-kind="sense"]', HTMLElement),
      base,
      key,
    );
  },

  /**
   * @param {HTMLElement} box
   * @param {string} base
   * @param {string} key
   */
  bindSense(box, base, key) {
    const select = dom.find(box, "select", HTMLSelectElement);
    select.id = `sense${base}`;
    dom.find(box, "label", HTMLLabelElement).htmlFor = select.id;
    if (key !== "below_c" && key !== "above_c") {
      select.replaceChildren(new Option("below", key));
      return;
    }
    select.value = key;
    const change = () => {
      const { [key]: limit, ...rest } = /** @type {JsonObject} */ (
        scenario.get(base)
      );
      scenario.set(base, { ...rest, [select.value]: limit ?? "" });
    };
    select.addEventListener("change", () =>
      scenario.reshape("Below or above", base, change, select.id),
    );
  },

  /**
   * Inside a change: what was called one thing is called another now.
   * @param {Map<Json | undefined, string>} names
   * @param {"probe" | "layer"} whose
   */
  rename(names, whose = "layer") {
    for (const list of conditions.lists) {
      for (const [i, one] of scenario.list(`/${list}`).entries()) {
        if (
          !pointer.isObject(one) ||
          one["what"] === "face" ||
          (one["what"] === "probe") !== (whose === "probe")
        )
          continue;
        const name = names.get(one["of"]);
        if (name !== undefined && name !== one["of"])
          scenario.set(`/${list}/${i}/of`, name);
      }
    }
  },

  /** @param {string} list */
  add(list) {
    const at = scenario.list(`/${list}`).length;
    const first =
      list === "must_not"
        ? { what: "coldest", below_c: "" }
        : { what: "hottest", below_c: "" };
    const change = () =>
      scenario.set(`/${list}`, [...scenario.list(`/${list}`), first]);
    scenario.reshape(
      "Condition added",
      `/${list}`,
      change,
      fields.id(`/${list}/${at}/what`),
    );
  },

  /**
   * @param {string} list
   * @param {number} i
   */
  remove(list, i) {
    const change = () => {
      const rest = scenario.list(`/${list}`).filter((_, at) => at !== i);
      scenario.set(`/${list}`, rest.length === 0 ? undefined : rest);
    };
    scenario.reshape("Condition removed", `/${list}`, change, `add/${list}`);
  },

  listen() {
    for (const button of dom.all(document, "[data-add-condition]")) {
      const list = button.dataset["addCondition"] ?? "";
      button.id = `add/${list}`;
      button.addEventListener("click", () => conditions.add(list));
    }
  },
};
