"use strict";

/** The answer: solved in the frame of the keystroke, said once typing pauses. */
const answer = {
  /** @type {Report | null} */
  report: null,
  waiting: false,
  /** @type {number | undefined} */
  saying: undefined,

  /** Solve before the next picture is painted. */
  soon() {
    if (answer.waiting) return;
    answer.waiting = true;
    requestAnimationFrame(() => {
      answer.waiting = false;
      answer.now();
    });
  },

  now() {
    const text = JSON.stringify(model.scenario);
    const solution = core.page.solve(text);
    const drafts = model.drafts.size;
    const errors = solution.problems.filter((one) => one.severity === "error");
    const homeless = fields.place(
      solution.problems.concat(solution.report?.warnings ?? []),
    );
    answer.showProblems(
      errors,
      homeless.filter((one) => one.severity === "error"),
      drafts,
    );
    if (solution.report && drafts === 0) answer.show(solution.report);
    answer.mark(errors.length + drafts > 0);
  },

  /** @param {boolean} stale */
  mark(stale) {
    document
      .getElementById("answer")
      ?.classList.toggle("stale", stale && answer.report !== null);
    if (stale && answer.report === null) {
      answer.text("answer-headline", "No answer yet");
      answer.text(
        "answer-detail",
        "Describe the item, how it starts and what is around it.",
      );
    }
    const foot =
      answer.report && !stale
        ? answer.report.headline
        : stale
          ? "An entry needs a look"
          : "";
    answer.text("foot-line", foot);
    answer.say(
      stale
        ? "An entry needs a look."
        : `${answer.report?.headline ?? ""}. ${answer.report?.detail ?? ""}`,
    );
    performance.mark("stillheat-answer");
  },

  /** @param {string} id @param {string} text */
  text(id, text) {
    const element = document.getElementById(id);
    if (element && element.textContent !== text) element.textContent = text;
  },

  /** @param {Report} report */
  show(report) {
    answer.report = report;
    const line = /** @type {HTMLElement} */ (
      document.getElementById("answer-headline")
    );
    const clock =
      report.ready?.clock ??
      (report.ready ? undefined : report.standing?.clock);
    if (clock) {
      const time = document.createElement("time");
      time.dateTime = clock;
      time.textContent = report.headline;
      line.replaceChildren(time);
    } else line.textContent = report.headline;
    answer.text("answer-detail", report.detail);
    document.title = `${report.headline} – Stillheat`;
    const list = /** @type {HTMLElement} */ (
      document.getElementById("answer-conditions")
    );
    const all = report.ready_when.concat(report.must_not);
    list.replaceChildren(...all.map((one) => answer.outcome(one)));
    answer.checks(report);
    answer.byHand(report);
    answer.warnings(report);
    const cautions = /** @type {HTMLElement} */ (
      document.getElementById("cautions")
    );
    cautions.replaceChildren(
      ...report.cautions.map((words) => answer.paragraph(words)),
    );
    pictures.show(report);
  },

  /** @param {string} words */
  paragraph(words) {
    const element = document.createElement("p");
    element.textContent = words;
    return element;
  },

  /** @param {ConditionReport} one */
  outcome(one) {
    const item = document.createElement("li");
    const what = document.createElement("span");
    what.textContent = `${one.path.startsWith("/must_not") ? "must not: " : ""}${one.words}`;
    const then = document.createElement("b");
    if (one.outcome.clock) {
      const time = document.createElement("time");
      time.dateTime = one.outcome.clock;
      time.textContent = one.outcome_words;
      then.append(time);
    } else then.textContent = one.outcome_words;
    item.append(what, then);
    return item;
  },

  /** @param {Report} report */
  checks(report) {
    const body = fields.in(document, "#sure tbody");
    body.replaceChildren(
      ...report.checks.map(([name, value]) => {
        const row = document.createElement("tr");
        const head = document.createElement("th");
        head.scope = "row";
        head.textContent = name;
        row.append(head);
        row.insertCell().textContent = value;
        return row;
      }),
    );
  },

  /** @param {Report} report */
  byHand(report) {
    const place = /** @type {HTMLElement} */ (
      document.getElementById("by-hand")
    );
    place.replaceChildren();
    if (report.by_hand.length === 0) return;
    const heading = document.createElement("h3");
    heading.textContent = "By hand";
    const table = pictures.table({
      caption:
        "What a pocket calculator gives, and whether its formula holds here",
      columns: ["Formula", "gives", "does it hold?"],
      rows: report.by_hand.map((one) => [
        `${one.name}: ${one.formula}`,
        one.gives,
        `${one.holds ? "holds" : "does not hold"}: ${one.validity}`,
      ]),
    });
    place.append(heading, table);
  },

  /** @param {Report} report */
  warnings(report) {
    const card = /** @type {HTMLElement} */ (
      document.getElementById("warnings")
    );
    card.hidden = report.warnings.length === 0;
    fields.in(card, "ul").replaceChildren(
      ...report.warnings.map((one) => {
        const item = document.createElement("li");
        item.textContent = `${one.message.charAt(0).toUpperCase()}${one.message.slice(1)}. ${one.hint}`;
        return item;
      }),
    );
  },

  /** @param {Problem[]} errors @param {Problem[]} homeless @param {number} drafts */
  showProblems(errors, homeless, drafts) {
    const place = /** @type {HTMLElement} */ (
      document.getElementById("answer-problems")
    );
    const count = errors.length + drafts;
    place.hidden = count === 0;
    place.replaceChildren();
    if (count === 0) return;
    const last = answer.report ? "The last answer; " : "";
    place.append(
      answer.paragraph(
        `${last}${count === 1 ? "one entry needs" : `${count} entries need`} a look:`,
      ),
    );
    const list = document.createElement("ul");
    const paths = [...model.drafts.keys(), ...errors.map((one) => one.path)];
    for (const path of [...new Set(paths)].slice(0, 12)) {
      const found = fields.nearest(path);
      const own = errors.find((one) => one.path === path);
      const item = document.createElement("li");
      const words = model.drafts.has(path)
        ? `${answer.nameOf(found)}: not understood`
        : `${answer.nameOf(found)}: ${own?.message ?? ""}`;
      if (found) {
        const link = document.createElement("button");
        link.type = "button";
        link.textContent = words;
        link.addEventListener("click", () => found.focus());
        item.append(link);
      } else
        item.textContent = `${path === "" ? "The file" : path}: ${own?.message ?? ""}`;
      if (own && homeless.includes(own) && own.hint !== "")
        item.append(` ${own.hint}`);
      list.append(item);
    }
    place.append(list);
  },

  /** @param {HTMLElement | null} control */
  nameOf(control) {
    const label =
      control && document.querySelector(`label[for="${control.id}"]`);
    return label?.textContent ?? control?.getAttribute("aria-label") ?? "Here";
  },

  /** Says the answer once typing has paused. @param {string} words */
  say(words) {
    window.clearTimeout(answer.saying);
    answer.saying = window.setTimeout(
      () => answer.text("announce", words),
      700,
    );
  },
};
