"use strict";

/** Places inside that are watched. */
const probes = {
  path: "/probes",

  render() {
    const list = scenario.list(probes.path);
    dom
      .byId("probes", HTMLElement)
      .replaceChildren(...list.map((_, i) => probes.block(i)));
  },

  /** @returns {string[]} */
  names() {
    return scenario
      .list(probes.path)
      .map((probe) =>
        pointer.isObject(probe) ? String(probe["name"] ?? "") : "",
      );
  },

  /**
   * @param {number} i
   * @returns {DocumentFragment}
   */
  block(i) {
    const base = pointer.join(probes.path, i);
    const made = dom.copy("probe-template");
    const side =
      scenario.get(pointer.join(base, "from_outside_m")) === undefined
        ? "from_inside_m"
        : "from_outside_m";
    dom.find(made, '[data-kind="length"]', HTMLElement).dataset["at"] = side;
    probes.bindSide(
      dom.find(made, '[data-kind="side"]', HTMLElement),
      base,
      side,
    );
    fields.bind(made, base);
    probes.bindName(made, i);
    dom
      .find(made, "[data-remove]", HTMLButtonElement)
      .addEventListener("click", () => probes.remove(i));
    return made;
  },

  /**
   * @param {HTMLElement} box
   * @param {string} base
   * @param {string} side
   */
  bindSide(box, base, side) {
    const select = dom.find(box, "select", HTMLSelectElement);
    select.id = `side${base}`;
    dom.find(box, "label", HTMLLabelElement).htmlFor = select.id;
    select.value = side;
    const change = () => {
      const { [side]: distance, ...rest } = /** @type {JsonObject} */ (
        scenario.get(base)
      );
      scenario.set(base, { ...rest, [select.value]: distance ?? "" });
    };
    select.addEventListener("change", () =>
      scenario.reshape("Measured from", base, change, select.id),
    );
  },

  /**
   * A place is called by its name at once, and conditions go on speaking of it.
   * @param {DocumentFragment} made
   * @param {number} i
   */
  bindName(made, i) {
    const path = pointer.join(probes.path, i, "name");
    const legend = dom.find(made, "legend", HTMLElement);
    const show = () => {
      legend.textContent = probes.names()[i] || `Watched place ${i + 1}`;
    };
    let name = scenario.get(path);
    show();
    fields.known.get(path)?.control.addEventListener("input", () => {
      const now = probes.names()[i] ?? "";
      conditions.rename(new Map([[name, now]]), "probe");
      name = now;
      show();
      conditions.render();
    });
  },

  /** @returns {string} a name that is still free */
  freeName() {
    const taken = probes.names();
    for (let n = 1; ; n += 1) {
      const name = n === 1 ? "thermometer" : `thermometer ${n}`;
      if (!taken.includes(name)) return name;
    }
  },

  /** Inside a change: one more, and its name. */
  append() {
    const name = probes.freeName();
    scenario.set(probes.path, [
      ...scenario.list(probes.path),
      { name, from_inside_m: "" },
    ]);
    return name;
  },

  /** @param {number} i */
  remove(i) {
    const change = () => {
      const rest = scenario.list(probes.path).filter((_, at) => at !== i);
      scenario.set(probes.path, rest.length === 0 ? undefined : rest);
    };
    scenario.reshape("Watched place removed", probes.path, change, "add-probe");
  },

  listen() {
    dom.byId("add-probe", HTMLButtonElement).addEventListener("click", () => {
      const at = scenario.list(probes.path).length;
      const focus = fields.id(pointer.join(probes.path, at, "from_inside_m"));
      scenario.reshape(
        "Watched place added",
        probes.path,
        probes.append,
        focus,
      );
    });
  },
};
