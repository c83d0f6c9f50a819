"use strict";

/** What the item is made of, from the inside out. */
const layers = {
  colours: ["#8fb4c6", "#8b9299", "#d3bf8b", "#b58b72", "#a5b693", "#b9a0bd"],

  render() {
    const shape = /** @type {HTMLSelectElement} */ (
      document.getElementById("shape")
    );
    shape.value = model.get("/item/shape") ?? "slab";
    layers.renderHollow();
    const hints = {
      slab: "From the inside out. A side without surroundings counts as insulated.",
      cylinder: "From the axis out; the first layer's thickness is its radius.",
      sphere: "From the centre out; the first layer's thickness is its radius.",
    };
    const hint = /** @type {HTMLElement} */ (
      document.getElementById("layers-hint")
    );
    hint.textContent =
      model.hasInnerFace() && shape.value !== "slab"
        ? "From the hollow out."
        : hints[/** @type {"slab"} */ (shape.value)];
    const list = /** @type {HTMLElement} */ (document.getElementById("layers"));
    const all = model.get("/item/layers") ?? [];
    list.replaceChildren(
      .../** @type {any[]} */ (all).map((_, i) => layers.one(i, all.length)),
    );
  },

  renderHollow() {
    const place = /** @type {HTMLElement} */ (
      document.getElementById("hollow")
    );
    place.replaceChildren();
    if (model.get("/item/shape") === "slab") return;
    const button = document.createElement("button");
    button.type = "button";
    const radius = model.get("/item/inner_radius_m");
    if (radius === undefined) {
      button.id = "make-hollow";
      button.textContent = "It is hollow…";
      button.addEventListener("click", () => {
        model.change(() => model.set("/item/inner_radius_m", 0.1), {
          structure: true,
        });
        document.getElementById(fields.id("/item/inner_radius_m"))?.focus();
      });
      place.append(button);
      return;
    }
    const field = document.createElement("div");
    field.className = "field";
    field.dataset["field"] = "/item/inner_radius_m";
    field.dataset["kind"] = "length";
    const label = document.createElement("label");
    label.textContent = "Inner radius";
    field.append(label);
    place.append(field);
    fields.mount(place, "/item");
    button.id = "make-solid";
    button.textContent = "It is solid";
    button.addEventListener("click", () => {
      model.change(
        () => {
          model.set("/item/inner_radius_m", undefined);
          model.set("/surroundings/inner", undefined);
          model.forget("/item/inner_radius_m");
        },
        { structure: true },
      );
    });
    place.append(button);
  },

  /** @param {number} i @param {number} count @returns {HTMLElement} */
  one(i, count) {
    const path = `/item/layers/${i}`;
    const layer = model.get(path);
    const element = fields.clone("layer-template");
    element.dataset["path"] = path;
    element.setAttribute("aria-label", `Layer ${i + 1}: ${model.layerName(i)}`);
    fields.in(element, ".swatch").style.background =
      layers.colours[i % layers.colours.length];
    layers.materialSelect(fields.in(element, ".material"), path);
    layers.moves(element, i, count);
    layers.motion(element, path, layer);
    const material = core.materials.find((one) => one.id === layer.material);
    const own = [
      "density_kg_per_m3",
      "heat_capacity_j_per_kg_k",
      "conductivity_w_per_m_k",
    ];
    const some = own.some(
      (key) => layer[key] !== undefined || model.drafts.has(`${path}/${key}`),
    );
    fields.in(element, ".own").hidden = material !== undefined && !some;
    fields.in(element, ".own-again").hidden = material === undefined || some;
    if (material)
      for (const field of element.querySelectorAll(".own .field"))
        /** @type {HTMLElement} */ (field).dataset["optional"] =
          "from the library";
    fields.in(element, ".make-own").addEventListener("click", () => {
      fields.in(element, ".own").hidden = false;
      fields.in(element, ".own-again").hidden = true;
      fields.in(element, ".own input").focus();
    });
    fields.in(element, ".contact-field").hidden =
      i === 0 && layer.contact_m2_k_per_w === undefined;
    fields.in(element, ".layer-more").open =
      layer.name !== undefined || layer.contact_m2_k_per_w !== undefined;
    fields.in(element, '[data-field="name"]').dataset["optional"] =
      model.layerName(i);
    fields.label(element, path);
    fields.mount(element, path);
    return element;
  },

  /** @param {HTMLSelectElement} select @param {string} path */
  materialSelect(select, path) {
    select.append(new Option("Own properties", ""));
    /** @type {Map<string, HTMLOptGroupElement>} */
    const groups = new Map();
    for (const material of core.materials) {
      let group = groups.get(material.group);
      if (!group) {
        group = document.createElement("optgroup");
        group.label = material.group;
        groups.set(material.group, group);
        select.append(group);
      }
      group.append(new Option(material.name, material.id));
    }
    const id = model.get(`${path}/material`) ?? "";
    if (id !== "" && !core.materials.some((one) => one.id === id))
      select.append(new Option(`${id} (not known)`, id));
    select.value = id;
    select.dataset["path"] = `${path}/material`;
    select.addEventListener("change", () => {
      model.change(
        () =>
          model.renaming(() => {
            model.set(
              `${path}/material`,
              select.value === "" ? undefined : select.value,
            );
            const liquid =
              core.materials.find((one) => one.id === select.value)?.liquid ??
              false;
            if (select.value !== "" && !liquid) {
              model.set(`${path}/motion`, undefined);
              model.set(`${path}/inside_film_w_per_m2_k`, undefined);
            }
            if (select.value !== "") {
              for (const key of [
                "density_kg_per_m3",
                "heat_capacity_j_per_kg_k",
                "conductivity_w_per_m_k",
              ]) {
                model.set(`${path}/${key}`, undefined);
                model.forget(`${path}/${key}`);
              }
            }
          }),
        { structure: true },
      );
    });
  },

  /** @param {HTMLElement} element @param {string} path @param {any} layer */
  motion(element, path, layer) {
    const select = fields.in(element, ".motion");
    const moves = layer.motion !== undefined && layer.motion !== "still";
    const material = core.materials.find((one) => one.id === layer.material);
    fields.in(element, ".motion-row").hidden = !(
      moves ||
      material === undefined ||
      material.liquid
    );
    fields.in(element, ".film-field").hidden =
      !moves && layer.inside_film_w_per_m2_k === undefined;
    select.value = layer.motion ?? "still";
    select.dataset["path"] = `${path}/motion`;
    select.addEventListener("change", () => {
      model.change(
        () => {
          const still = select.value === "still";
          model.set(`${path}/motion`, still ? undefined : select.value);
          if (still) {
            model.set(`${path}/inside_film_w_per_m2_k`, undefined);
            model.forget(`${path}/inside_film_w_per_m2_k`);
          } else if (
            model.get(`${path}/inside_film_w_per_m2_k`) === undefined
          ) {
            const choice = wasm_bindgen.choices("inside_film")[0];
            if (choice)
              model.set(`${path}/inside_film_w_per_m2_k`, {
                value: choice.likely,
                low: choice.low,
                high: choice.high,
              });
          }
        },
        { structure: true },
      );
    });
  },

  /** @param {HTMLElement} element @param {number} i @param {number} count */
  moves(element, i, count) {
    const name = model.layerName(i);
    const buttons = /** @type {[string, string, boolean, () => void][]} */ ([
      [
        ".inwards",
        `Move ${name} inwards`,
        i === 0,
        () => layers.swap(i, i - 1, "inwards"),
      ],
      [
        ".outwards",
        `Move ${name} outwards`,
        i === count - 1,
        () => layers.swap(i, i + 1, "outwards"),
      ],
      [".remove", `Remove ${name}`, count === 1, () => layers.remove(i)],
    ]);
    for (const [selector, words, off, act] of buttons) {
      const button = fields.in(element, selector);
      button.setAttribute("aria-label", words);
      button.disabled = off;
      button.addEventListener("click", act);
    }
  },

  /** @param {number} from @param {number} to @param {string} button */
  swap(from, to, button) {
    model.change(
      () => {
        const all = model.get("/item/layers");
        [all[from], all[to]] = [all[to], all[from]];
        delete all[0].contact_m2_k_per_w;
        const starts = model.get("/start/per_layer_c");
        if (Array.isArray(starts) && starts.length === all.length)
          [starts[from], starts[to]] = [starts[to], starts[from]];
        model.forget("/item/layers");
      },
      { structure: true },
    );
    const moved = document.querySelectorAll("#layers > .layer")[to];
    const same = moved && fields.in(moved, `.${button}`);
    if (same)
      (same.disabled
        ? fields.in(moved, ".moves button:not(:disabled)")
        : same
      ).focus();
  },

  /** @param {number} i */
  remove(i) {
    model.change(
      () => {
        const all = model.get("/item/layers");
        all.splice(i, 1);
        delete all[0].contact_m2_k_per_w;
        const starts = model.get("/start/per_layer_c");
        if (Array.isArray(starts) && starts.length > all.length)
          starts.splice(i, 1);
        model.forget("/item/layers");
      },
      { structure: true },
    );
    const left = document.querySelectorAll("#layers > .layer");
    fields
      .in(
        left[Math.min(i, left.length - 1)] ?? document,
        ".material, #add-layer",
      )
      .focus();
  },

  add() {
    model.change(
      () => {
        if (!Array.isArray(model.get("/item/layers")))
          model.set("/item/layers", []);
        const all = model.get("/item/layers");
        all.push({
          material: all.length === 0 ? "water" : "mineral-wool-pipe",
        });
        const starts = model.get("/start/per_layer_c");
        if (Array.isArray(starts) && starts.length > 0)
          starts.push(model.copy(starts[starts.length - 1]));
      },
      { structure: true },
    );
    fields.in(document, "#layers > .layer:last-child .material").focus();
  },

  listen() {
    document
      .getElementById("add-layer")
      ?.addEventListener("click", () => layers.add());
    const shape = /** @type {HTMLSelectElement} */ (
      document.getElementById("shape")
    );
    shape.dataset["path"] = "/item/shape";
    shape.addEventListener("change", () => {
      model.change(
        () => {
          model.set("/item/shape", shape.value);
          if (shape.value === "slab")
            model.set("/item/inner_radius_m", undefined);
          if (!model.hasInnerFace())
            model.set("/surroundings/inner", undefined);
        },
        { structure: true },
      );
    });
  },
};
