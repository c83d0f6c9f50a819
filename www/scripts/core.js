"use strict";

/** The core: decoded and started once, then called. */
const core = {
  /** @type {CorePage} */
  page: /** @type {any} */ (null),
  /** US customary units? */
  us: false,
  /** @type {Material[]} */
  materials: [],

  start() {
    const element = /** @type {HTMLElement} */ (
      document.getElementById("core")
    );
    const text = atob(element.textContent || "");
    const bytes = new Uint8Array(text.length);
    for (let i = 0; i < text.length; i += 1) bytes[i] = text.charCodeAt(i);
    element.remove();
    wasm_bindgen.initSync({ module: new WebAssembly.Module(bytes) });
    core.page = new wasm_bindgen.Page();
    core.materials = wasm_bindgen.materials();
  },

  /**
   * @param {string} text
   * @param {string} kind
   */
  read(text, kind) {
    return wasm_bindgen.read_quantity(text, kind, core.us);
  },

  /**
   * A number or a number with its spread, as text.
   * @param {Json} value
   * @param {string} kind
   */
  write(value, kind) {
    if (typeof value === "number") {
      return wasm_bindgen.write_quantity(
        value,
        undefined,
        undefined,
        kind,
        core.us,
      );
    }
    const spread = /** @type {any} */ (value);
    if (
      spread === null ||
      typeof spread !== "object" ||
      typeof spread.value !== "number"
    )
      return "";
    return wasm_bindgen.write_quantity(
      spread.value,
      spread.low,
      spread.high,
      kind,
      core.us,
    );
  },
};
