"use strict";

/** The answer: one plain sentence, and what stands behind it. The words come from the core. */
const answer = {
  /**
   * The last good answer, which stays while an entry is wrong.
   * @type {Report | null}
   */
  report: null,

  /** The scenario that it answers. */
  text: "",

  /**
   * Asks the core, and shows what it says.
   * @param {string} text
   */
  ask(text) {
    const solution = core.solve(text);
    if (solution?.report) answer.text = text;
    answer.show(solution);
  },

  /** @param {Solution | null} solution null when the core failed */
  show(solution) {
    if (solution === null) {
      answer.showBug();
      return;
    }
    const errors = solution.problems.filter(
      ({ severity }) => severity === "error",
    );
    messages.report(solution.problems);
    if (solution.report !== null) {
      answer.report = solution.report;
      answer.showReport(solution.report);
    }
    answer.showTroubles(errors);
    answer.showPresence(answer.report !== null);
    announce.soon(answer.spoken(errors));
  },

  /** A scenario that has nothing to do with the last answer came onto the page. */
  forget() {
    answer.report = null;
    answer.text = "";
    core.ask((page) => page.forget(), undefined);
  },

  /** @param {Report} report */
  showReport(report) {
    const headline = dom.byId("answer-headline", HTMLOutputElement);
    headline.replaceChildren(
      answer.timed(report.headline, report.ready ?? report.standing),
    );
    dom.byId("answer-detail", HTMLElement).textContent = report.detail;
    const rows = [...report.ready_when, ...report.must_not];
    dom
      .byId("conditions", HTMLElement)
      .replaceChildren(...rows.map(answer.outcome));
    answer.showList("cautions", report.cautions);
    answer.showWarnings(report.warnings);
    dom
      .byId("sure-rows", HTMLElement)
      .replaceChildren(...report.checks.map(answer.check));
    answer.showHand(report);
    pictures.show(report);
  },

  /**
   * Words that stand for a date and time, marked as such.
   * @param {string} words
   * @param {Outcome | null} outcome
   * @returns {Node}
   */
  timed(words, outcome) {
    if (outcome?.kind !== "at" || outcome.clock === undefined)
      return document.createTextNode(words);
    const time = dom.make("time", words);
    time.dateTime = outcome.clock;
    return time;
  },

  /**
   * One condition and what became of it.
   * @param {ConditionReport} condition
   * @returns {HTMLElement}
   */
  outcome(condition) {
    const row = dom.make("li");
    const limit = condition.path.startsWith("/must_not");
    row.append(
      dom.make("span", `${limit ? "must not: " : ""}${condition.words}`),
      " ",
    );
    const words = dom.make("strong");
    words.append(answer.timed(condition.outcome_words, condition.outcome));
    row.append(words);
    return row;
  },

  /**
   * How far one side of the calculation can be trusted.
   * @param {[string, string]} check
   * @returns {HTMLElement}
   */
  check([what, words]) {
    const row = dom.make("tr");
    const name = dom.make("th", what);
    name.scope = "row";
    row.append(name, dom.make("td", words));
    return row;
  },

  /**
   * @param {string} id
   * @param {string[]} words
   */
  showList(id, words) {
    dom.byId(id, HTMLElement).hidden = words.length === 0;
    dom
      .byId(`${id}-list`, HTMLElement)
      .replaceChildren(...words.map((one) => dom.make("li", one)));
  },

  /** @param {Problem[]} warnings */
  showWarnings(warnings) {
    const list = dom.byId("warnings", HTMLElement);
    list.hidden = warnings.length === 0;
    list.replaceChildren(...warnings.map(answer.linked));
  },

  /**
   * A problem with a link to the field it is about.
   * @param {Problem} problem
   * @returns {HTMLElement}
   */
  linked(problem) {
    const row = dom.make("li");
    const control = messages.control(problem.path);
    const place = messages.name(problem.path);
    const said = messages.words(problem);
    if (control !== undefined && place !== "") {
      const link = dom.make("a", place);
      link.href = `#${control.id}`;
      link.addEventListener("click", (event) =>
        answer.follow(event, problem.path),
      );
      const stop = place.endsWith("?") ? " " : ". ";
      row.append(link, said === "" ? "" : stop);
    }
    row.append(said);
    if (problem.kind === "unknown")
      row.append(" ", answer.dropKey(problem.path));
    return row;
  },

  /**
   * @param {MouseEvent} event
   * @param {string} path
   */
  follow(event, path) {
    event.preventDefault();
    const control = messages.control(path);
    const more = control?.closest("details");
    if (more) more.open = true;
    control?.focus();
  },

  /**
   * A key that nobody knows has no field; here it can be taken out.
   * @param {string} path
   * @returns {HTMLButtonElement}
   */
  dropKey(path) {
    const name = pointer.last(path);
    const drop = () =>
      scenario.reshape(
        `"${name}" taken out`,
        path,
        () => scenario.set(path, undefined),
        "answer",
      );
    return dom.button(`Take "${name}" out`, drop, "quiet");
  },

  /**
   * What has to be mended before there is a new answer.
   * @param {Problem[]} errors
   */
  showTroubles(errors) {
    const stale = errors.length > 0 && answer.report !== null;
    document.body.classList.toggle("stale", stale);
    dom.byId("troubles", HTMLElement).hidden = errors.length === 0;
    dom.byId("troubles-title", HTMLElement).textContent = answer.count(
      errors,
      stale,
    );
    dom
      .byId("troubles-list", HTMLElement)
      .replaceChildren(...errors.map(answer.linked));
    if (answer.report === null) answer.showNone();
    const headline = answer.report?.headline ?? "No answer yet";
    answer.showLine(stale ? `The last answer: ${headline}` : headline);
  },

  /**
   * The one line that stays in view, and the name of the page.
   * @param {string} line
   */
  showLine(line) {
    dom.byId("foot", HTMLElement).textContent = line;
    const title = `${line} · Stillheat`;
    if (document.title !== title) document.title = title;
  },

  /** There is no answer, and there has been none. */
  showNone() {
    dom
      .byId("answer-headline", HTMLOutputElement)
      .replaceChildren("No answer yet");
    dom.byId("answer-detail", HTMLElement).textContent = "";
    dom.byId("conditions", HTMLElement).replaceChildren();
  },

  /**
   * @param {Problem[]} errors
   * @param {boolean} stale
   * @returns {string}
   */
  count(errors, stale) {
    const needed = errors.every(messages.isNeeded);
    const many = errors.length === 1 ? "one entry" : `${errors.length} entries`;
    const verb = errors.length === 1 ? "needs" : "need";
    const words = needed
      ? `${many} still to be made:`
      : `${many} ${verb} a look:`;
    return stale
      ? `This is the last answer; ${words}`
      : words.charAt(0).toUpperCase() + words.slice(1);
  },

  /** @param {boolean} there */
  showPresence(there) {
    document.body.classList.remove("broken");
    for (const id of ["pictures", "sure"])
      dom.byId(id, HTMLElement).hidden = !there;
    if (!there) dom.byId("cautions", HTMLElement).hidden = true;
  },

  /**
   * @param {Problem[]} errors
   * @returns {string}
   */
  spoken(errors) {
    if (errors.length > 0)
      return answer.count(errors, answer.report !== null).replace(/:$/, ".");
    return answer.report === null
      ? ""
      : `${answer.report.headline}. ${answer.report.detail}`;
  },

  /** @param {Report} report */
  showHand(report) {
    const words = new Map(
      [...report.ready_when, ...report.must_not].map((one) => [
        one.path,
        one.words,
      ]),
    );
    const blocks = report.by_hand.map((formula) =>
      answer.hand(formula, words.get(formula.path) ?? ""),
    );
    dom.byId("hand-list", HTMLElement).replaceChildren(...blocks);
    dom.byId("hand", HTMLElement).hidden = blocks.length === 0;
  },

  /**
   * @param {HandFormula} formula
   * @param {string} condition
   * @returns {HTMLElement}
   */
  hand(formula, condition) {
    const block = dom.make(
      "div",
      "",
      formula.holds ? "by-hand" : "by-hand does-not-hold",
    );
    const head = dom.make("p");
    head.append(
      dom.make("strong", formula.name),
      `, ${formula.holds ? "which holds here" : "which does not hold here"}: `,
    );
    head.append(dom.make("span", formula.gives, "gives"));
    const about = condition === "" ? "" : `For ${condition}: `;
    block.append(
      head,
      dom.make("p", `${about}${formula.validity}.`, "note"),
      dom.make("p", formula.formula, "note formula"),
    );
    return block;
  },

  /** A mistake of our own: no number stays on the screen. */
  showBug() {
    answer.report = null;
    document.body.classList.remove("stale");
    document.body.classList.add("broken");
    const words = "No answer: Stillheat made a mistake of its own";
    dom.byId("answer-headline", HTMLOutputElement).replaceChildren(words);
    dom.byId("answer-detail", HTMLElement).textContent =
      `Your entries are all here. Please save the scenario and hand it on with these words, so that it can be mended: ${core.bug}`;
    answer.showLine(words);
    dom.byId("conditions", HTMLElement).replaceChildren();
    for (const id of ["pictures", "sure", "cautions", "troubles"])
      dom.byId(id, HTMLElement).hidden = true;
    announce.soon(words);
  },
};
