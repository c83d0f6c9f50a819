"use strict";

/** The temperatures at time zero. */
const start = {
  path: "/start",
  kinds: ["uniform_c", "per_layer_c", "profile", "steady_before"],

  render() {
    const kind = start.kind();
    dom.byId("start-kind", HTMLSelectElement).value = kind;
    const box = dom.byId("start", HTMLElement);
    box.replaceChildren(...start.parts(kind));
    fields.bind(box, "");
  },

  /** @returns {string} */
  kind() {
    const written = scenario.get(start.path);
    return (
      start.kinds.find(
        (kind) => pointer.isObject(written) && kind in written,
      ) ?? "uniform_c"
    );
  },

  /**
   * @param {string} kind
   * @returns {Node[]}
   */
  parts(kind) {
    switch (kind) {
      case "per_layer_c":
        return start.perLayer();
      case "profile":
        return [dom.copy("start-profile-template")];
      case "steady_before":
        return start.steadyBefore();
      default:
        return [dom.copy("start-uniform-template")];
    }
  },

  /** @returns {Node[]} a field for every layer, and for every temperature that has no layer */
  perLayer() {
    const names = layers.names();
    const given = scenario.list("/start/per_layer_c").length;
    return Array.from({ length: Math.max(names.length, given) }, (_, i) => {
      const made = dom.copy("start-layer-template");
      dom.find(made, ".field", HTMLElement).dataset["at"] =
        `start/per_layer_c/${i}`;
      dom.find(made, "label", HTMLElement).textContent =
        `${i + 1} ${names[i] ?? "no such layer"}`;
      return made;
    });
  },

  /** @returns {Node[]} what it was kept at, and what its faces saw */
  steadyBefore() {
    const base = "/start/steady_before";
    const made = [
      dom.copy("start-steady-template"),
      start.before(`${base}/outer`, "Around it before the stop"),
    ];
    const inner = scenario.get(`${base}/inner`) !== undefined;
    const kept = scenario.get(`${base}/contents_c`) !== undefined;
    if (inner || (layers.isHollow() && !kept))
      made.push(start.before(`${base}/inner`, "Inside it before the stop"));
    return made;
  },

  /**
   * @param {string} base
   * @param {string} words
   * @returns {DocumentFragment}
   */
  before(base, words) {
    const made = dom.copy("face-template");
    dom.find(made, "legend", HTMLElement).textContent = words;
    dom.find(made, "[data-add-row]", HTMLElement).parentElement?.remove();
    dom.find(made, ".rows", HTMLElement).append(faces.row(base, 0, 1));
    fields.bind(made, base);
    return made;
  },

  /** @param {string} kind */
  choose(kind) {
    const select = dom.byId("start-kind", HTMLSelectElement);
    const change = () => scenario.set(start.path, start.changed(kind));
    scenario.reshape(
      `It starts ${dom.words(select.selectedOptions[0] ?? null)}`,
      start.path,
      change,
      select.id,
    );
  },

  /**
   * Another way of saying it, beginning with the temperature that is known.
   * @param {string} kind
   * @returns {Json}
   */
  changed(kind) {
    const known =
      scenario.get("/start/uniform_c") ??
      scenario.get("/start/per_layer_c/0") ??
      scenario.get("/start/steady_before/contents_c") ??
      scenario.get("/start/profile/0/temperature_c") ??
      "";
    switch (kind) {
      case "per_layer_c":
        return { per_layer_c: scenario.list(layers.path).map(() => known) };
      case "profile":
        return { profile: "" };
      case "steady_before": {
        const outer = scenario.get("/surroundings/outer/0") ?? {
          insulated: true,
        };
        return { steady_before: { contents_c: known, outer } };
      }
      default:
        return { uniform_c: known };
    }
  },

  listen() {
    const select = dom.byId("start-kind", HTMLSelectElement);
    select.addEventListener("change", () => start.choose(select.value));
  },
};
