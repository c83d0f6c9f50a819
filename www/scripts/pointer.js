"use strict";

/** JSON Pointers (RFC 6901) on trees that are never changed, only replaced. */
const pointer = {
  /**
   * @param {string} path
   * @returns {string[]}
   */
  keys(path) {
    if (path === "") return [];
    return path
      .slice(1)
      .split("/")
      .map((key) => key.replaceAll("~1", "/").replaceAll("~0", "~"));
  },

  /**
   * @param {string} path
   * @param {...(string | number)} keys
   * @returns {string}
   */
  join(path, ...keys) {
    return keys.reduce(
      (/** @type {string} */ sum, key) =>
        `${sum}/${String(key).replaceAll("~", "~0").replaceAll("/", "~1")}`,
      path,
    );
  },

  /**
   * The place that holds this one.
   * @param {string} path
   * @returns {string}
   */
  parent(path) {
    return path.slice(0, Math.max(0, path.lastIndexOf("/")));
  },

  /**
   * The last key.
   * @param {string} path
   * @returns {string}
   */
  last(path) {
    return pointer.keys(path).at(-1) ?? "";
  },

  /**
   * What stands at a place; undefined where nothing does.
   * @param {Json} tree
   * @param {string} path
   * @returns {Json | undefined}
   */
  get(tree, path) {
    /** @type {Json | undefined} */
    let at = tree;
    for (const key of pointer.keys(path)) {
      if (Array.isArray(at)) at = at[Number(key)];
      else if (pointer.isObject(at) && Object.hasOwn(at, key)) at = at[key];
      else return undefined;
    }
    return at;
  },

  /**
   * The tree with another value at a place; objects on the way are made.
   * @param {Json} tree
   * @param {string} path
   * @param {Json} value
   * @returns {Json}
   */
  put(tree, path, value) {
    return pointer.replace(tree, pointer.keys(path), value);
  },

  /**
   * The tree without what stands at a place; of a list, the rest moves up.
   * @param {Json} tree
   * @param {string} path
   * @returns {Json}
   */
  remove(tree, path) {
    return pointer.replace(tree, pointer.keys(path), undefined);
  },

  /**
   * @param {Json | undefined} tree
   * @param {string[]} keys
   * @param {Json | undefined} value
   * @returns {Json}
   */
  replace(tree, keys, value) {
    const [key, ...rest] = keys;
    if (key === undefined) return value ?? null;
    if (Array.isArray(tree)) {
      const at = Number(key);
      if (rest.length > 0)
        return tree.map((old, i) =>
          i === at ? pointer.replace(old, rest, value) : old,
        );
      if (value === undefined) return tree.filter((_, i) => i !== at);
      return at < tree.length
        ? tree.map((old, i) => (i === at ? value : old))
        : [...tree, value];
    }
    const old = pointer.isObject(tree) ? tree : {};
    if (rest.length > 0) {
      if (value === undefined && !Object.hasOwn(old, key)) return old;
      return { ...old, [key]: pointer.replace(old[key], rest, value) };
    }
    if (value !== undefined) return { ...old, [key]: value };
    return Object.fromEntries(
      Object.entries(old).filter(([name]) => name !== key),
    );
  },

  /**
   * @param {Json | undefined} value
   * @returns {value is JsonObject}
   */
  isObject(value) {
    return typeof value === "object" && value !== null && !Array.isArray(value);
  },

  /**
   * The same JSON?
   * @param {Json | undefined} a
   * @param {Json | undefined} b
   * @returns {boolean}
   */
  same(a, b) {
    return a === b || JSON.stringify(a) === JSON.stringify(b);
  },
};
