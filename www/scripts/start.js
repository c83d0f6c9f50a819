"use strict";

/** The temperatures at time zero. */
const start = {
  /** @returns {string} */
  kind() {
    const written = model.get("/start") ?? {};
    return (
      ["uniform_c", "per_layer_c", "steady_before", "profile"].find(
        (key) => key in written,
      ) ?? "uniform_c"
    );
  },

  render() {
    const select = /** @type {HTMLSelectElement} */ (
      document.getElementById("start-kind")
    );
    const kind = start.kind();
    select.value = kind;
    const place = /** @type {HTMLElement} */ (document.getElementById("start"));
    place.replaceChildren();
    if (kind === "uniform_c")
      place.append(start.field("/start/uniform_c", "Throughout"));
    if (kind === "per_layer_c") {
      model
        .layerNames()
        .forEach((name, i) =>
          place.append(start.field(`/start/per_layer_c/${i}`, name)),
        );
    }
    if (kind === "profile") start.profile(place);
    if (kind === "steady_before") start.steady(place);
    fields.mount(place, "/start");
    const stopped = /** @type {HTMLInputElement} */ (
      document.getElementById("stopped-at")
    );
    if (document.activeElement !== stopped)
      stopped.value = model.get("/stopped_at") ?? "";
  },

  /** @param {string} path @param {string} words */
  field(path, words) {
    const field = document.createElement("div");
    field.className = "field";
    field.dataset["field"] = path;
    field.dataset["kind"] = "temperature";
    const label = document.createElement("label");
    label.textContent = words;
    field.append(label);
    return field;
  },

  /** @param {HTMLElement} place */
  profile(place) {
    const points = model.get("/start/profile") ?? [];
    const list = document.createElement("ol");
    list.setAttribute("aria-label", "Measured points");
    for (let i = 0; i < points.length; i += 1) {
      const point = fields.clone("point-template");
      fields.in(point, ".row-end").hidden = points.length === 1;
      fields.in(point, ".remove").addEventListener("click", () => {
        model.change(
          () => {
            model.set(`/start/profile/${i}`, undefined);
            model.forget("/start/profile");
          },
          { structure: true },
        );
        document.getElementById("add-point")?.focus();
      });
      fields.mount(point, `/start/profile/${i}`);
      list.append(point);
    }
    const add = document.createElement("button");
    add.type = "button";
    add.id = "add-point";
    add.textContent = "Add a point";
    add.addEventListener("click", () => {
      model.change(() => model.get("/start/profile").push({}), {
        structure: true,
      });
      document
        .getElementById(
          fields.id(`/start/profile/${points.length}/from_inside_m`),
        )
        ?.focus();
    });
    place.append(list, add);
  },

  /** @param {HTMLElement} place */
  steady(place) {
    const body = fields.clone("steady-template");
    const keeper = fields.in(body, ".keeper");
    const written = model.get("/start/steady_before");
    const inner = model.hasInnerFace();
    keeper.value = written.inner === undefined ? "contents" : "inner";
    keeper.closest(".row").hidden = !inner && keeper.value === "contents";
    keeper.addEventListener("change", () => {
      model.change(
        () => {
          if (keeper.value === "inner") {
            model.set("/start/steady_before/inner", {
              temperature_c: written.contents_c ?? 200,
              film_w_per_m2_k: 50,
            });
            model.set("/start/steady_before/contents_c", undefined);
          } else {
            model.set("/start/steady_before/contents_c", 90);
            model.set("/start/steady_before/inner", undefined);
          }
          model.forget("/start/steady_before");
        },
        { structure: true },
      );
      document.getElementById(keeper.id)?.focus();
    });
    fields.in(body, ".contents").hidden = keeper.value !== "contents";
    const before = fields.in(body, ".before");
    const sides = /** @type {[string, string][]} */ ([
      ["outer", "Outside, before the stop"],
    ]);
    if (keeper.value === "inner")
      sides.unshift(["inner", "Inside, before the stop"]);
    for (const [side, words] of sides) {
      const heading = document.createElement("h3");
      heading.textContent = words;
      before.append(
        heading,
        faces.row(`/start/steady_before/${side}`, { first: true, alone: true }),
      );
    }
    fields.label(body, "/start/steady_before");
    fields.mount(body, "/start/steady_before");
    place.append(body);
  },

  /** @param {string} kind */
  change(kind) {
    const written = model.get("/start") ?? {};
    const known =
      written.uniform_c ??
      written.per_layer_c?.[0] ??
      written.steady_before?.contents_c ??
      written.profile?.[0]?.temperature_c ??
      80;
    const plain = typeof known === "number" ? known : known.value;
    const outer = model.copy(
      model.get("/surroundings/outer/0") ?? {
        temperature_c: 20,
        film_w_per_m2_k: 8,
      },
    );
    delete outer.from_s;
    const ways = /** @type {{ [kind: string]: any }} */ ({
      uniform_c: { uniform_c: known },
      per_layer_c: { per_layer_c: model.layerNames().map(() => known) },
      steady_before: { steady_before: { contents_c: known, outer } },
      profile: { profile: [{ from_inside_m: 0, temperature_c: plain }] },
    });
    model.change(
      () => {
        model.set("/start", ways[kind]);
        model.forget("/start");
      },
      { structure: true },
    );
    document.getElementById("start-kind")?.focus();
  },

  listen() {
    const select = /** @type {HTMLSelectElement} */ (
      document.getElementById("start-kind")
    );
    select.addEventListener("change", () => start.change(select.value));
    const stopped = /** @type {HTMLInputElement} */ (
      document.getElementById("stopped-at")
    );
    stopped.addEventListener("input", () => {
      model.change(
        () =>
          model.set(
            "/stopped_at",
            stopped.value === "" ? undefined : stopped.value,
          ),
        { typing: "/stopped_at" },
      );
    });
  },
};
