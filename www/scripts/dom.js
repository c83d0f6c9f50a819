"use strict";

/** Finding and making elements. User text goes in as text only, never as markup. */
const dom = {
  /**
   * The element with this id, of the expected type.
   * @template {Element} T
   * @param {string} id
   * @param {new () => T} type
   * @returns {T}
   */
  byId(id, type) {
    const found = document.getElementById(id);
    if (!(found instanceof type))
      throw new Error(`the page has no ${type.name} "${id}"`);
    return found;
  },

  /**
   * The first element inside `root` that matches, of the expected type.
   * @template {Element} T
   * @param {ParentNode} root
   * @param {string} selector
   * @param {new () => T} type
   * @returns {T}
   */
  find(root, selector, type) {
    const found = root.querySelector(selector);
    if (!(found instanceof type))
      throw new Error(`no ${type.name} "${selector}" here`);
    return found;
  },

  /**
   * All HTML elements inside `root` that match, in order.
   * @param {ParentNode} root
   * @param {string} selector
   * @returns {HTMLElement[]}
   */
  all(root, selector) {
    return [...root.querySelectorAll(selector)].filter(
      (found) => found instanceof HTMLElement,
    );
  },

  /**
   * A copy of what a template holds.
   * @param {string} id
   * @returns {DocumentFragment}
   */
  copy(id) {
    const fragment = dom.byId(id, HTMLTemplateElement).content.cloneNode(true);
    if (!(fragment instanceof DocumentFragment))
      throw new Error(`"${id}" is no template`);
    return fragment;
  },

  /**
   * A new element with text inside.
   * @template {keyof HTMLElementTagNameMap} K
   * @param {K} tag
   * @param {string} [text]
   * @param {string} [className]
   * @returns {HTMLElementTagNameMap[K]}
   */
  make(tag, text = "", className = "") {
    const made = document.createElement(tag);
    made.textContent = text;
    if (className) made.className = className;
    return made;
  },

  /**
   * A button that does something.
   * @param {string} text
   * @param {() => void} act
   * @param {string} [className]
   * @returns {HTMLButtonElement}
   */
  button(text, act, className = "") {
    const made = dom.make("button", text, className);
    made.type = "button";
    made.addEventListener("click", act);
    return made;
  },

  /**
   * A cross that takes something away; its words are there for those who cannot see what it stands beside.
   * @param {string} text
   * @param {() => void} act
   * @returns {HTMLButtonElement}
   */
  cross(text, act) {
    const made = dom.button("", act, "quiet out");
    const sign = dom.make("span", "×");
    sign.setAttribute("aria-hidden", "true");
    made.append(sign, dom.make("span", text, "unseen"));
    return made;
  },

  /**
   * The text as an element shows it, without the white space of the source.
   * @param {Element | null} element
   * @returns {string}
   */
  words(element) {
    return (element?.textContent ?? "").replace(/\s+/g, " ").trim();
  },
};
