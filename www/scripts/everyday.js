"use strict";

/** Everyday choices in words beside a quantity that nobody measures. */
const everyday = {
  /**
   * Puts the choices of `data-words` under a field.
   * @param {Field} field
   */
  offer(field) {
    const made = dom.copy("words-template");
    const select = dom.find(made, "select", HTMLSelectElement);
    const label = dom.find(made, "label", HTMLLabelElement);
    select.id = `${field.control.id}-words`;
    label.htmlFor = select.id;
    label.textContent = `${field.label}, in words`;
    for (const [i, choice] of everyday.of(field).entries()) {
      const kind = field.box.dataset["kind"] ?? "";
      const range = core.write(choice.written, kind);
      select.append(new Option(`${choice.words}: ${range}`, String(i)));
    }
    select.addEventListener("change", () =>
      everyday.choose(field, select.value),
    );
    field.message.before(made);
    everyday.match(field, scenario.get(field.path));
  },

  /**
   * @param {Field} field
   * @returns {Choice[]}
   */
  of(field) {
    return core.choices(field.box.dataset["words"] ?? "");
  },

  /**
   * @param {Field} field
   * @param {string} number
   */
  choose(field, number) {
    const choice = everyday.of(field)[Number(number)];
    if (number === "" || choice === undefined) return;
    scenario.type(field.path, choice.written, field.label);
    fields.show(field);
    everyday.match(field, choice.written);
  },

  /**
   * Shows which of the choices a value is, if one, and where that comes from.
   * @param {Field} field
   * @param {Json | undefined} value
   */
  match(field, value) {
    if (field.box.dataset["words"] === undefined) return;
    const choices = everyday.of(field);
    const at = choices.findIndex(({ written }) => pointer.same(written, value));
    const select = dom.find(field.box, "select.words", HTMLSelectElement);
    const source = dom.find(field.box, ".source", HTMLElement);
    select.value = at < 0 ? "" : String(at);
    source.textContent = choices[at]?.source ?? "";
  },
};
