"use strict";

/** What the faces see, row by row of their programmes. */
const faces = {
  path: "/surroundings",

  /** What a row can say, by what the face sees; `from_s` goes with each. */
  kinds: ["exchange", "held_c", "heat_flux_into_w_per_m2", "insulated"],

  render() {
    const sides =
      layers.isHollow() || scenario.get("/surroundings/inner") !== undefined
        ? ["outer", "inner"]
        : ["outer"];
    dom
      .byId("faces", HTMLElement)
      .replaceChildren(
        ...sides.map((side) => faces.face(side, sides.length > 1)),
      );
  },

  /**
   * One face with the rows of its programme.
   * @param {string} side
   * @param {boolean} named
   * @returns {DocumentFragment}
   */
  face(side, named) {
    const base = pointer.join(faces.path, side);
    const made = dom.copy("face-template");
    const legend = dom.find(made, "legend", HTMLElement);
    legend.textContent = side === "inner" ? "Inner face" : "Outer face";
    legend.classList.toggle("unseen", !named);
    const rows = scenario.list(base);
    const count = Math.max(1, rows.length);
    const box = dom.find(made, ".rows", HTMLElement);
    for (let i = 0; i < count; i += 1)
      box.append(faces.row(pointer.join(base, i), i, count));
    const add = dom.find(made, "[data-add-row]", HTMLButtonElement);
    add.id = `then${base}`;
    add.addEventListener("click", () => faces.addRow(base));
    fields.bind(made, base);
    return made;
  },

  /**
   * One row: what the face sees from a time on.
   * @param {string} base
   * @param {number} i
   * @param {number} count rows in all
   * @returns {DocumentFragment}
   */
  row(base, i, count) {
    const made = dom.copy("row-template");
    const group = dom.find(made, ".row", HTMLElement);
    group.setAttribute(
      "aria-label",
      i === 0 ? "From the stop on" : `Row ${i + 1}`,
    );
    if (i === 0 && scenario.get(pointer.join(base, "from_s")) === undefined)
      dom.find(made, ".from", HTMLElement).remove();
    const kind = faces.kind(base);
    faces.bindKind(made, base, kind);
    for (const box of dom.all(made, ".over-time"))
      faces.fillOverTime(box, base, kind);
    if (kind !== "exchange") {
      for (const key of ["film_w_per_m2_k", "emissivity"]) {
        if (scenario.get(pointer.join(base, key)) === undefined)
          dom.find(made, `[data-at="${key}"]`, HTMLElement).remove();
      }
    }
    const remove = dom.find(made, "[data-remove]", HTMLButtonElement);
    if (count < 2) remove.parentElement?.remove();
    else remove.addEventListener("click", () => faces.removeRow(base, i));
    fields.bind(made, base);
    return made;
  },

  /**
   * @param {HTMLElement} box
   * @param {string} base
   * @param {string} kind
   */
  fillOverTime(box, base, kind) {
    const key = box.dataset["over"] ?? "";
    const path = pointer.join(base, key);
    const there = scenario.get(path) !== undefined;
    const exchanges = kind === "exchange";
    const wanted = key === kind || (exchanges && key === "temperature_c");
    const offered =
      exchanges &&
      key === "radiation_to_c" &&
      scenario.get(pointer.join(base, "emissivity")) !== undefined;
    if (there || wanted || offered) overTime.render(box, path);
    else box.remove();
  },

  /**
   * @param {string} base
   * @returns {string}
   */
  kind(base) {
    const row = scenario.get(base);
    if (row === undefined) return "insulated";
    return (
      faces.kinds.find((kind) => pointer.isObject(row) && kind in row) ??
      "exchange"
    );
  },

  /**
   * @param {DocumentFragment} made
   * @param {string} base
   * @param {string} kind
   */
  bindKind(made, base, kind) {
    const box = dom.find(made, '[data-kind="sees"]', HTMLElement);
    const select = dom.find(box, "select", HTMLSelectElement);
    const label = dom.find(box, "label", HTMLLabelElement);
    select.id = `sees${base}`;
    label.htmlFor = select.id;
    select.value = kind;
    select.addEventListener("change", () =>
      scenario.reshape(
        `It sees ${dom.words(select.selectedOptions[0] ?? null)}`,
        base,
        () => faces.put(base, faces.changed(scenario.get(base), select.value)),
        select.id,
      ),
    );
  },

  /**
   * A row may be the first of a list that is not there yet.
   * @param {string} base
   * @param {Json} row
   */
  put(base, row) {
    const list = pointer.parent(base);
    const inList = /\/\d+$/.test(base);
    if (inList && !Array.isArray(scenario.get(list))) scenario.set(list, [row]);
    else scenario.set(base, row);
  },

  /**
   * A row that says something else; its time and its temperature stay.
   * @param {Json | undefined} old
   * @param {string} kind
   * @returns {Json}
   */
  changed(old, kind) {
    const row = pointer.isObject(old) ? old : {};
    /** @type {JsonObject} */
    const from = row["from_s"] === undefined ? {} : { from_s: row["from_s"] };
    const temperature = row["temperature_c"] ?? row["held_c"] ?? "";
    switch (kind) {
      case "exchange":
        return { ...from, temperature_c: temperature, film_w_per_m2_k: "" };
      case "held_c":
        return { ...from, held_c: temperature };
      case "heat_flux_into_w_per_m2":
        return { ...from, heat_flux_into_w_per_m2: "" };
      default:
        return { ...from, insulated: true };
    }
  },

  /** @param {string} base */
  addRow(base) {
    const rows = scenario.list(base);
    const last = rows.at(-1) ?? { insulated: true };
    const row = { ...(pointer.isObject(last) ? last : {}), from_s: "" };
    const at = Math.max(1, rows.length);
    const change = () =>
      scenario.set(base, rows.length === 0 ? [last, row] : [...rows, row]);
    scenario.reshape(
      "Row added",
      base,
      change,
      fields.id(pointer.join(base, at, "from_s")),
    );
  },

  /**
   * @param {string} base
   * @param {number} i
   */
  removeRow(base, i) {
    const list = pointer.parent(base);
    const change = () => {
      scenario.set(base, undefined);
      // The first row begins at the stop.
      if (i === 0) scenario.set(pointer.join(list, 0, "from_s"), undefined);
    };
    scenario.reshape("Row removed", list, change, `then${list}`);
  },
};
