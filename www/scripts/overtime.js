"use strict";

/** A temperature or a heat flux over time: steady, a ramp, a table, a cycle. */
const overTime = {
  /** @type {Record<string, { kind: string, swing: string, keys: Record<string, string>, example: string }>} */
  families: {
    temperature: {
      kind: "temperature",
      swing: "temperature_difference",
      keys: {
        from: "from_c",
        to: "to_c",
        values: "values_c",
        mean: "mean_c",
        amplitude: "amplitude_k",
      },
      example: "0 h: 18 °C; 6 h: 12 °C; 12 h: 20 °C",
    },
    flux: {
      kind: "heat_flux",
      swing: "heat_flux",
      keys: {
        from: "from_w_per_m2",
        to: "to_w_per_m2",
        values: "values_w_per_m2",
        mean: "mean_w_per_m2",
        amplitude: "amplitude_w_per_m2",
      },
      example: "0 h: 500 W/m²; 6 h: 0 W/m²",
    },
  },

  /** Length of a day, s. */
  day: 86400,

  /**
   * @param {Json | undefined} value
   * @returns {"steady" | "ramp" | "table" | "cycle"}
   */
  how(value) {
    if (!pointer.isObject(value)) return "steady";
    if ("over_s" in value) return "ramp";
    if ("at_s" in value) return "table";
    if ("period_s" in value) return "cycle";
    return "steady";
  },

  /**
   * Fills a box of the form.
   * @param {HTMLElement} box
   * @param {string} path
   */
  render(box, path) {
    const family = overTime.families[box.dataset["family"] ?? ""];
    const name = box.dataset["name"] ?? "";
    const value = scenario.get(path);
    if (family === undefined) throw new Error(`no family for ${path}`);
    if (value === undefined && box.dataset["optional"]) {
      fields.offer(box, path, box.dataset["optional"], "");
      return;
    }
    const how = overTime.how(value);
    const parts = dom.copy(`${how}-template`);
    for (const part of dom.all(parts, ".field"))
      overTime.fill(part, family, how, name);
    const example = parts.querySelector(".table-example");
    if (example !== null) example.textContent = family.example;
    box.replaceChildren(parts);
    fields.bind(box, path);
    const chooser = overTime.chooser(path, name, how, family);
    if (how === "steady") {
      const tail = dom.make("div", "", "tail");
      tail.append(...chooser.children);
      dom.find(box, ".field", HTMLElement).append(tail);
    } else {
      box.prepend(chooser);
    }
    if (box.dataset["optional"]) {
      const out = fields.leaveOut(name, path);
      dom.find(box, ".tail, .field", HTMLElement).append(out);
    }
  },

  /**
   * Gives a part of a template the kind and the key of its family.
   * @param {HTMLElement} part
   * @param {{ kind: string, swing: string, keys: Record<string, string> }} family
   * @param {string} how
   * @param {string} name
   */
  fill(part, family, how, name) {
    const { key, kind } = part.dataset;
    if (key !== undefined) part.dataset["at"] = family.keys[key];
    if (kind === "value" || kind === "") part.dataset["kind"] = family.kind;
    if (kind === "swing") part.dataset["kind"] = family.swing;
    if (kind === "table") part.dataset["kind"] = `${family.kind}-table`;
    if (how === "steady")
      dom.find(part, "label", HTMLElement).textContent = name;
  },

  /**
   * The choice between steady, ramp, table and cycle.
   * @param {string} path
   * @param {string} name
   * @param {string} how
   * @param {{ keys: Record<string, string> }} family
   * @returns {HTMLElement}
   */
  chooser(path, name, how, family) {
    const made = dom.copy("over-time-template");
    const select = dom.find(made, "select", HTMLSelectElement);
    const label = dom.find(made, "label", HTMLLabelElement);
    select.id = `how${path}`;
    label.htmlFor = select.id;
    label.textContent = how === "steady" ? `${name}, over time` : name;
    label.classList.toggle("unseen", how === "steady");
    select.value = how;
    select.addEventListener("change", () =>
      scenario.reshape(
        `${name}: ${dom.words(select.selectedOptions[0] ?? null)}`,
        path,
        () =>
          scenario.set(
            path,
            overTime.changed(scenario.get(path), select.value, family.keys),
          ),
        select.id,
      ),
    );
    return dom.find(made, ".over", HTMLElement);
  },

  /**
   * The value written another way, keeping the number that is known.
   * @param {Json | undefined} old
   * @param {string} how
   * @param {Record<string, string>} keys
   * @returns {Json}
   */
  changed(old, how, keys) {
    const known = overTime.known(old, keys);
    const name = (/** @type {string} */ key) => keys[key] ?? key;
    switch (how) {
      case "ramp":
        return { [name("from")]: known, [name("to")]: "", over_s: "" };
      case "table":
        return { at_s: "", [name("values")]: [] };
      case "cycle":
        return {
          [name("mean")]: known,
          [name("amplitude")]: "",
          period_s: overTime.day,
          highest_at_s: "",
        };
      default:
        return known;
    }
  },

  /**
   * The one number that stands for a value over time.
   * @param {Json | undefined} old
   * @param {Record<string, string>} keys
   * @returns {Json}
   */
  known(old, keys) {
    if (!pointer.isObject(old)) return old ?? "";
    if ("value" in old) return old["value"] ?? "";
    const values = old[keys["values"] ?? ""];
    return (
      old[keys["from"] ?? ""] ??
      old[keys["mean"] ?? ""] ??
      (Array.isArray(values) ? (values[0] ?? "") : "")
    );
  },
};
