"use strict";

/** What the faces see, row by row over time. */
const faces = {
  /** Keys of a quantity over time, by the unit of its values. */
  keys: {
    temperature: {
      from: "from_c",
      to: "to_c",
      mean: "mean_c",
      amplitude: "amplitude_k",
      values: "values_c",
      swing: "temperature_difference",
    },
    heat_flux: {
      from: "from_w_per_m2",
      to: "to_w_per_m2",
      mean: "mean_w_per_m2",
      amplitude: "amplitude_w_per_m2",
      values: "values_w_per_m2",
      swing: "heat_flux",
    },
  },

  render() {
    const place = /** @type {HTMLElement} */ (document.getElementById("faces"));
    const sides = /** @type {[string, string][]} */ ([["outer", "Outside"]]);
    if (model.hasInnerFace() || model.get("/surroundings/inner") !== undefined)
      sides.push(["inner", "Inside"]);
    place.replaceChildren(
      ...sides.map(([side, words]) => faces.one(side, words, sides.length > 1)),
    );
  },

  /** @param {string} side @param {string} words @param {boolean} titled */
  one(side, words, titled) {
    const path = `/surroundings/${side}`;
    const element = fields.clone("face-template");
    element.dataset["path"] = path;
    const heading = fields.in(element, "h3");
    heading.textContent = words;
    heading.hidden = !titled;
    element.setAttribute("aria-label", words);
    const rows = model.get(path) ?? [];
    const list = fields.in(element, ".rows");
    if (rows.length === 0) list.append(faces.emptyRow(path));
    for (let i = 0; i < rows.length; i += 1)
      list.append(
        faces.row(`${path}/${i}`, { first: i === 0, alone: rows.length === 1 }),
      );
    const then = fields.in(element, ".then");
    then.id = fields.id(`${path}/then`);
    then.hidden = rows.length === 0;
    then.addEventListener("click", () => {
      model.change(
        () => {
          const all = model.get(path);
          const next = model.copy(all[all.length - 1]);
          next.from_s = (next.from_s ?? 0) + 4 * 3600;
          all.push(next);
        },
        { structure: true },
      );
      const last = model.get(path).length - 1;
      document.getElementById(fields.id(`${path}/${last}/from_s`))?.focus();
    });
    return element;
  },

  /** A face about which nothing is said. @param {string} path */
  emptyRow(path) {
    const element = faces.row(`${path}/0`, { first: true, alone: true });
    return element;
  },

  /** @param {any} row */
  kind(row) {
    if (row === undefined || row.insulated !== undefined) return "insulated";
    if (row.held_c !== undefined) return "held";
    if (row.heat_flux_into_w_per_m2 !== undefined) return "flux";
    return "exchange";
  },

  /**
   * @param {string} path
   * @param {{ first: boolean, alone: boolean }} about
   * @returns {HTMLElement}
   */
  row(path, about) {
    const row = model.get(path);
    const kind = faces.kind(row);
    const element = fields.clone("row-template");
    element.dataset["path"] = path;
    fields.in(element, ".from").hidden = about.first;
    for (const one of ["exchange", "held", "flux"]) {
      const part = fields.in(element, `.kind-${one}`);
      if (one !== kind) part.remove();
    }
    const select = fields.in(element, ".kind");
    select.value = kind;
    select.addEventListener("change", () =>
      faces.change(path, select.value, select.id),
    );
    fields.in(element, ".row-end").hidden = about.alone;
    fields.in(element, ".remove").addEventListener("click", () => {
      model.change(
        () => {
          model.set(path, undefined);
          const list = path.slice(0, path.lastIndexOf("/"));
          const first = model.get(`${list}/0`);
          if (first) delete first.from_s;
          model.forget(list);
        },
        { structure: true },
      );
      document
        .getElementById(
          fields.id(`${path.slice(0, path.lastIndexOf("/"))}/then`),
        )
        ?.focus();
    });
    const radiation = element.querySelector(".radiation");
    if (
      radiation &&
      row?.radiation_to_c === undefined &&
      row?.emissivity === undefined
    )
      radiation.remove();
    if (
      radiation &&
      typeof row?.radiation_to_c === "object" &&
      row.radiation_to_c.value === undefined
    ) {
      radiation.className = "varying";
    }
    for (const varying of element.querySelectorAll(".varying"))
      faces.varying(/** @type {HTMLElement} */ (varying), path);
    fields.label(element, path);
    fields.mount(element, path);
    return element;
  },

  /** @param {string} path @param {string} kind @param {string} id */
  change(path, kind, id) {
    const before = model.get(path) ?? {};
    const known = before.temperature_c ?? before.held_c ?? 20;
    const rows = /** @type {{ [kind: string]: any }} */ ({
      exchange: {
        temperature_c: known,
        film_w_per_m2_k: { value: 7, low: 5, high: 10 },
      },
      held: { held_c: known },
      flux: { heat_flux_into_w_per_m2: 0 },
      insulated: { insulated: true },
    });
    model.change(
      () => {
        const list = path.slice(0, path.lastIndexOf("/"));
        if (/[0-9]$/.test(path) && !Array.isArray(model.get(list)))
          model.set(list, []);
        const from =
          before.from_s === undefined ? {} : { from_s: before.from_s };
        model.set(path, { ...from, ...rows[kind] });
        model.forget(path);
      },
      { structure: true },
    );
    document.getElementById(id)?.focus();
  },

  /** @param {any} value */
  how(value) {
    if (
      value === undefined ||
      value === null ||
      typeof value !== "object" ||
      "value" in value
    )
      return "number";
    if ("at_s" in value) return "table";
    return "period_s" in value ? "cycle" : "ramp";
  },

  /** A quantity that may change over time. @param {HTMLElement} element @param {string} base */
  varying(element, base) {
    const path = `${base}/${element.dataset["field"]}`;
    const kind = /** @type {"temperature" | "heat_flux"} */ (
      element.dataset["kind"]
    );
    const keys = faces.keys[kind];
    const label =
      /** @type {HTMLElement} */ (element.querySelector("label")).textContent ??
      "";
    const how = faces.how(model.get(path));
    const body = fields.clone("varying-template");
    const select = fields.in(body, ".how");
    fields.in(body, ".varying-label").textContent = label;
    select.setAttribute("aria-label", `${label}: over time`);
    select.id = fields.id(`${path}/how`);
    select.value = how;
    select.addEventListener("change", () =>
      faces.changeHow(path, keys, select.value, select.id),
    );
    for (const one of ["number", "ramp", "cycle", "table"])
      if (one !== how) fields.in(body, `.how-${one}`).remove();
    for (const field of body.querySelectorAll(".field")) {
      const one = /** @type {HTMLElement} */ (field);
      const key = one.dataset["field"] ?? "";
      if (one.dataset["kind"] === "")
        one.dataset["kind"] = key === "amplitude" ? keys.swing : kind;
      if (one.dataset["table"] !== undefined)
        one.dataset["table"] = keys.values;
      const real = /** @type {{ [key: string]: string }} */ (keys)[key];
      if (real !== undefined) one.dataset["field"] = real;
    }
    element.classList.remove("field");
    element.replaceChildren(...body.childNodes);
    fields.mount(element, path);
  },

  /** @param {string} path @param {any} keys @param {string} how @param {string} id */
  changeHow(path, keys, how, id) {
    const before = model.get(path);
    const first = faces.typical(before, keys);
    const ways = /** @type {{ [how: string]: any }} */ ({
      number: first,
      ramp: { [keys.from]: first, [keys.to]: first, over_s: 4 * 3600 },
      cycle: {
        [keys.mean]: first,
        [keys.amplitude]: 5,
        period_s: 86400,
        highest_at_s: 9 * 3600,
      },
      table: { at_s: [0, 4 * 3600], [keys.values]: [first, first] },
    });
    model.change(
      () => {
        model.set(path, ways[how]);
        model.forget(path);
      },
      { structure: true },
    );
    document.getElementById(id)?.focus();
  },

  /** @param {any} value @param {any} keys @returns {number} */
  typical(value, keys) {
    if (typeof value === "number") return value;
    const at =
      value?.value ??
      value?.[keys.from] ??
      value?.[keys.mean] ??
      value?.[keys.values]?.[0];
    return typeof at === "number" ? at : 20;
  },
};
