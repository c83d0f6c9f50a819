"use strict";

/** The core behind its door, and what happens when it makes a mistake of its own. */
const core = {
  /** @type {Page | null} */
  page: null,

  /** What the core said when it failed; empty while all is well. */
  bug: "",

  /** Takes the program out of the page, unpacks it and starts it. */
  async start() {
    const text = atob(dom.byId("core", HTMLScriptElement).textContent.trim());
    const packed = new Uint8Array(text.length);
    for (let i = 0; i < text.length; i += 1) packed[i] = text.charCodeAt(i);
    const unpacked = new Blob([packed])
      .stream()
      .pipeThrough(new DecompressionStream("deflate-raw"));
    const bytes = await new Response(unpacked).arrayBuffer();
    wasm_bindgen.initSync({ module: new WebAssembly.Module(bytes) });
    core.page = new wasm_bindgen.Page();
  },

  /**
   * Asks the core; gives the stand-in when the core fails, which is then told in one plain sentence.
   * @template T
   * @param {(page: Page, door: Door) => T} question
   * @param {T} standIn
   * @returns {T}
   */
  ask(question, standIn) {
    try {
      core.page ??= new wasm_bindgen.Page();
      return question(core.page, wasm_bindgen);
    } catch (error) {
      core.page = null;
      core.bug = core.cause(error);
      return standIn;
    }
  },

  /**
   * @param {unknown} error
   * @returns {string}
   */
  cause(error) {
    try {
      const said = wasm_bindgen.last_bug();
      if (said) return said;
    } catch {
      // The core cannot even say what happened; what the browser says must do.
    }
    return error instanceof Error ? error.message : String(error);
  },

  /**
   * @param {string} text
   * @returns {Solution | null} null when the core failed
   */
  solve(text) {
    core.bug = "";
    return core.ask(
      (page) => page.solve(text),
      /** @type {Solution | null} */ (null),
    );
  },

  /**
   * @param {string} text
   * @param {string} kind
   * @returns {Reading}
   */
  read(text, kind) {
    return core.ask((_, door) => door.read(text, kind, store.system), {
      message: "This cannot be read",
    });
  },

  /**
   * @param {Json} written
   * @param {string} kind
   * @returns {string}
   */
  write(written, kind) {
    return core.ask(
      (_, door) => door.write(JSON.stringify(written), kind, store.system),
      "",
    );
  },

  /**
   * @param {string} text
   * @param {string} kind
   * @param {boolean} up
   * @param {boolean} large
   * @returns {string | undefined}
   */
  step(text, kind, up, large) {
    return core.ask(
      (_, door) => door.step(text, kind, store.system, up, large),
      undefined,
    );
  },

  /** @type {Material[] | null} */
  keptMaterials: null,

  /** @returns {Material[]} */
  materials() {
    core.keptMaterials ??= core.ask((_, door) => door.materials(), []);
    return core.keptMaterials;
  },

  /**
   * @param {string} kind
   * @returns {Choice[]}
   */
  choices(kind) {
    return core.ask((_, door) => door.choices(kind), []);
  },
};
