"use strict";

/** The layers of the item, from the inside out. */
const layers = {
  path: "/item/layers",

  /** The choice of no material of the library. */
  own: "own",

  properties: [
    "density_kg_per_m3",
    "heat_capacity_j_per_kg_k",
    "conductivity_w_per_m_k",
  ],

  render() {
    const list = scenario.list(layers.path);
    dom
      .byId("layers", HTMLElement)
      .replaceChildren(...list.map((_, i) => layers.block(i, list.length)));
    const solid = !layers.isHollow();
    const shape = scenario.get("/item/shape");
    dom.byId("hollow", HTMLElement).hidden =
      shape === "slab" && scenario.get("/item/inner_radius_m") === undefined;
    dom.byId("order", HTMLElement).textContent =
      solid && list.length > 0
        ? "From the inside out; the thickness of the first is its radius."
        : "From the inside out.";
  },

  /** @returns {boolean} does it begin at a face, and not at an axis or a centre? */
  isHollow() {
    if (scenario.get("/item/shape") === "slab") return true;
    const radius = scenario.get("/item/inner_radius_m");
    return radius !== undefined && radius !== 0;
  },

  /** @returns {string[]} what the layers are called, from the inside out */
  names() {
    return core.ask(
      (_, door) => door.layer_names(JSON.stringify(scenario.list(layers.path))),
      [],
    );
  },

  /**
   * @param {number} i
   * @param {number} count
   * @returns {DocumentFragment}
   */
  block(i, count) {
    const base = pointer.join(layers.path, i);
    const block = dom.copy("layer-template");
    const material = layers.bindMaterial(block, base);
    layers.keepWanted(block, base, i, material);
    fields.bind(block, base);
    layers.collectOffers(block);
    layers.bindMoves(block, i, count);
    dom.find(block, ".more .source", HTMLElement).textContent =
      layers.about(material);
    dom.find(block, ".more", HTMLElement).id = `more${base}`;
    layers.bindName(block, i);
    return block;
  },

  /**
   * A layer is called by its name at once, and conditions go on speaking of it.
   * @param {DocumentFragment} block
   * @param {number} i
   */
  bindName(block, i) {
    const legend = dom.find(block, "legend", HTMLElement);
    const summary = dom.find(block, "summary", HTMLElement);
    const names = dom.all(block, "button .name");
    const path = pointer.join(layers.path, i, "name");
    const show = () => {
      const own = String(scenario.get(path) ?? "");
      const before = dom.make("span", "Layer ", "unseen");
      const after = dom.make("span", own === "" ? "" : `, ${own}`, "unseen");
      legend.replaceChildren(before, String(i + 1), after);
      summary.textContent = own === "" ? "More" : own;
      for (const name of names)
        name.textContent = ` ${layers.names()[i] ?? ""}`;
    };
    let name = layers.names()[i];
    show();
    fields.known.get(path)?.control.addEventListener("input", () => {
      const now = layers.names()[i] ?? "";
      conditions.rename(new Map([[name, now]]));
      name = now;
      show();
      start.render();
      conditions.render();
    });
  },

  /**
   * @param {Material | undefined} material
   * @returns {string} where its properties come from
   */
  about(material) {
    return material === undefined
      ? ""
      : `Properties: ${material.source}. ${material.notes}`.trim();
  },

  /**
   * @param {DocumentFragment} block
   * @param {string} base
   * @returns {Material | undefined}
   */
  bindMaterial(block, base) {
    const path = pointer.join(base, "material");
    const field = fields.add(
      dom.find(block, '[data-kind="material"]', HTMLElement),
      path,
    );
    const select = dom.find(field.box, "select", HTMLSelectElement);
    /** @type {Map<string, HTMLOptGroupElement>} */
    const groups = new Map();
    for (const { id, name, group } of core.materials()) {
      const kept = groups.get(group) ?? document.createElement("optgroup");
      kept.label = group;
      kept.append(new Option(name, id));
      groups.set(group, kept);
    }
    select.append(...groups.values());
    const written = scenario.get(path);
    select.value = String(written ?? layers.own);
    select.addEventListener("change", () => layers.choose(base, select.value));
    return core.materials().find(({ id }) => id === written);
  },

  /**
   * Another material; its own properties make room, and a liquid mixes itself until told otherwise.
   * @param {string} base
   * @param {string} id
   */
  choose(base, id) {
    const path = pointer.join(base, "material");
    const change = () => {
      const liquid =
        core.materials().find((material) => material.id === id)?.liquid ??
        false;
      scenario.set(path, id === layers.own ? undefined : id);
      for (const key of layers.properties) {
        const at = pointer.join(base, key);
        if (id !== layers.own) scenario.set(at, undefined);
        else if (scenario.get(at) === undefined) scenario.set(at, "");
      }
      if (id !== layers.own && !liquid) {
        scenario.set(pointer.join(base, "motion"), undefined);
        scenario.set(pointer.join(base, "inside_film_w_per_m2_k"), undefined);
      }
    };
    layers.reshape("Material", path, change, fields.id(path));
  },

  /**
   * A change that may rename layers: conditions go on speaking of the same ones.
   * @param {string} label
   * @param {string} path
   * @param {() => void} change
   * @param {string} [focus]
   * @param {(i: number) => number} [moved] where layer i is afterwards
   */
  reshape(label, path, change, focus, moved = (i) => i) {
    const before = layers.names();
    const follow = () => {
      change();
      const after = layers.names();
      /** @type {Map<Json | undefined, string>} */
      const renamed = new Map();
      for (const [i, name] of before.entries())
        renamed.set(name, after[moved(i)] ?? name);
      conditions.rename(renamed);
    };
    scenario.reshape(label, path, follow, focus);
  },

  /**
   * Takes away the fields that say nothing about this layer.
   * @param {DocumentFragment} block
   * @param {string} base
   * @param {number} i
   * @param {Material | undefined} material
   */
  keepWanted(block, base, i, material) {
    const has = (/** @type {string} */ key) =>
      scenario.get(pointer.join(base, key)) !== undefined;
    const drop = (/** @type {string} */ selector) =>
      dom.find(block, selector, HTMLElement).remove();
    const own = layers.properties.some(has);
    if (!own) drop(".properties-note");
    if (!has("material")) {
      for (const key of layers.properties)
        delete dom.find(block, `[data-at="${key}"]`, HTMLElement).dataset[
          "optional"
        ];
    }
    const moves =
      has("motion") && scenario.get(pointer.join(base, "motion")) !== "still";
    if (!has("motion") && material !== undefined && !material.liquid)
      drop('[data-at="motion"]');
    if (!moves && !has("inside_film_w_per_m2_k"))
      drop('[data-at="inside_film_w_per_m2_k"]');
    if (i === 0 && !has("contact_m2_k_per_w"))
      drop('[data-at="contact_m2_k_per_w"]');
  },

  /**
   * What can be asked for stands together under "More".
   * @param {DocumentFragment} block
   */
  collectOffers(block) {
    const asks = dom.find(block, "div.asks", HTMLElement);
    asks.append(...dom.all(block, ".field.offer"));
  },

  /**
   * @param {DocumentFragment} block
   * @param {number} i
   * @param {number} count
   */
  bindMoves(block, i, count) {
    const move = (/** @type {string} */ way, /** @type {number} */ to) => {
      const button = dom.find(block, `[data-move="${way}"]`, HTMLButtonElement);
      button.id = `${way}${pointer.join(layers.path, i)}`;
      button.disabled = to < 0 || to >= count;
      button.addEventListener("click", () => layers.move(i, to));
    };
    move("in", i - 1);
    move("out", i + 1);
    const remove = dom.find(block, "[data-remove]", HTMLButtonElement);
    remove.disabled = count < 2;
    remove.addEventListener("click", () => layers.remove(i));
    const insert = dom.find(block, "[data-insert]", HTMLButtonElement);
    insert.addEventListener("click", () => layers.insert(i));
  },

  /**
   * @param {number} from
   * @param {number} to
   */
  move(from, to) {
    const change = () => {
      const list = [...scenario.list(layers.path)];
      list.splice(to, 0, ...list.splice(from, 1));
      scenario.set(layers.path, list);
    };
    const end = to === 0 || to === scenario.list(layers.path).length - 1;
    const way = to < from !== end ? "in" : "out";
    const swapped = (/** @type {number} */ i) =>
      i === from ? to : i === to ? from : i;
    form.swapOpen(
      pointer.join(layers.path, from),
      pointer.join(layers.path, to),
    );
    layers.reshape(
      "Layer moved",
      layers.path,
      change,
      `${way}${pointer.join(layers.path, to)}`,
      swapped,
    );
  },

  /** @param {number} i */
  remove(i) {
    const left = scenario.list(layers.path).length - 1;
    const focus = fields.id(
      pointer.join(layers.path, Math.min(i, left - 1), "material"),
    );
    const moved = (/** @type {number} */ was) =>
      was === i ? -1 : was > i ? was - 1 : was;
    const change = () => scenario.set(pointer.join(layers.path, i), undefined);
    layers.reshape("Layer removed", layers.path, change, focus, moved);
  },

  /** @param {number} i number of the new layer */
  insert(i) {
    const change = () => {
      const list = [...scenario.list(layers.path)];
      list.splice(i, 0, {
        material: core.materials()[0]?.id ?? "",
        thickness_m: "",
      });
      scenario.set(layers.path, list);
    };
    const moved = (/** @type {number} */ was) => (was >= i ? was + 1 : was);
    layers.reshape(
      "Layer added",
      layers.path,
      change,
      fields.id(pointer.join(layers.path, i, "material")),
      moved,
    );
  },

  listen() {
    dom
      .byId("add-layer", HTMLButtonElement)
      .addEventListener("click", () =>
        layers.insert(scenario.list(layers.path).length),
      );
  },
};
