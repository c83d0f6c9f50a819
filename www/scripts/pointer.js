"use strict";

/** JSON Pointers (RFC 6901) into the scenario. */
const pointer = {
  /** @param {string} path */
  parts(path) {
    return path
      .split("/")
      .slice(1)
      .map((part) => part.replaceAll("~1", "/").replaceAll("~0", "~"));
  },

  /**
   * @param {Json} root
   * @param {string} path
   * @returns {any}
   */
  get(root, path) {
    let at = /** @type {any} */ (root);
    for (const part of pointer.parts(path)) {
      if (at === null || typeof at !== "object") return undefined;
      at = at[part];
    }
    return at;
  },

  /**
   * Sets a value, making the objects on the way; undefined removes it.
   * @param {Json} root
   * @param {string} path
   * @param {Json | undefined} value
   */
  set(root, path, value) {
    const parts = pointer.parts(path);
    const last = /** @type {string} */ (parts.pop());
    let at = /** @type {any} */ (root);
    for (const part of parts) {
      if (
        at[part] === undefined ||
        at[part] === null ||
        typeof at[part] !== "object"
      ) {
        if (value === undefined) return;
        at[part] = {};
      }
      at = at[part];
    }
    if (value !== undefined) at[last] = value;
    else if (Array.isArray(at)) at.splice(Number(last), 1);
    else delete at[last];
  },
};
