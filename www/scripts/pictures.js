"use strict";

/** The pictures, drawn by the core for the space they have, and the time slider that moves them all. */
const pictures = {
  /** @type {PictureName[]} */
  names: ["section", "curve", "profile"],

  /** Steps of the slider. */
  steps: 1000,

  /** Pixels for each of the page's on paper. */
  paperRatio: 3,

  /** Width and height on paper, in pixels of the page. @type {Record<PictureName, [number, number]>} */
  paper: { section: [270, 190], curve: [390, 230], profile: [675, 200] },

  /** The time that is shown, s after the stop. */
  time: 0,

  /** End of what is drawn, s after the stop. */
  end: 0,

  /** Does the time go with the answer, until somebody moves it? */
  follows: true,

  printing: false,

  followAnswer() {
    pictures.follows = true;
  },

  /** @param {Report} report */
  show(report) {
    pictures.end = report.course.end_s;
    pictures.time = pictures.follows
      ? pictures.telling(report)
      : Math.min(pictures.time, pictures.end);
    pictures.showJumps(report);
    pictures.move(pictures.time);
  },

  /**
   * The moment that tells most: when it is ready, else the first thing that happens, else the end.
   * @param {Report} report
   * @returns {number}
   */
  telling(report) {
    const all = [
      report.ready,
      report.standing,
      ...[...report.ready_when, ...report.must_not].map((one) => one.outcome),
    ];
    for (const outcome of all)
      if (outcome?.kind === "at")
        return Math.min(outcome.time_s, report.course.end_s);
    return report.course.end_s;
  },

  /** @param {Report} report */
  showJumps(report) {
    /** @type {[string, number][]} */
    const places = [["The stop", 0]];
    if (report.ready?.kind === "at")
      places.push(["Ready", report.ready.time_s]);
    if (report.standing?.kind === "at")
      places.push(["Limit reached", report.standing.time_s]);
    places.push(["The end", pictures.end]);
    const jump = (/** @type {[string, number]} */ [words, time]) =>
      dom.button(
        words,
        () => {
          pictures.follows = false;
          pictures.move(time);
        },
        "quiet",
      );
    dom.byId("jumps", HTMLElement).replaceChildren(...places.map(jump));
  },

  /**
   * Everything to this time.
   * @param {number} time
   */
  move(time) {
    pictures.time = Math.min(Math.max(time, 0), pictures.end);
    const moment = core.ask((page) => page.moment(pictures.time), null) ?? {
      words: "",
      iso: "",
    };
    const slider = dom.byId("time", HTMLInputElement);
    slider.value = String(
      pictures.end > 0 ? (pictures.time / pictures.end) * pictures.steps : 0,
    );
    slider.setAttribute("aria-valuetext", moment.words);
    const words = dom.make("time", moment.words);
    if (moment.iso) words.dateTime = moment.iso;
    dom.byId("time-words", HTMLOutputElement).replaceChildren(words);
    pictures.draw();
  },

  /** All pictures anew. */
  draw() {
    if (answer.report === null) return;
    for (const name of pictures.names) {
      const figure = pictures.figure(name);
      pictures.drawOn(dom.find(figure, "canvas", HTMLCanvasElement), name);
      pictures.showTable(figure, name);
    }
    const sketch = dom.byId("sketch", HTMLCanvasElement);
    if (sketch.clientWidth > 0 && !pictures.printing)
      pictures.drawOn(sketch, "section");
  },

  /**
   * @param {PictureName} name
   * @returns {HTMLElement}
   */
  figure(name) {
    return dom.find(document, `[data-picture="${name}"]`, HTMLElement);
  },

  /**
   * @param {HTMLCanvasElement} canvas
   * @param {PictureName} name
   */
  drawOn(canvas, name) {
    const [paperWidth, paperHeight] = pictures.paper[name];
    const width = pictures.printing ? paperWidth : canvas.clientWidth;
    const height = pictures.printing
      ? paperHeight
      : core.ask((page) => page.height(name, width, store.system), 0);
    if (!pictures.printing) canvas.style.height = `${height}px`;
    const ratio = pictures.printing
      ? pictures.paperRatio
      : window.devicePixelRatio;
    const context = canvas.getContext("2d");
    if (width === 0 || height === 0 || context === null) return;
    canvas.width = Math.round(width * ratio);
    canvas.height = Math.round(height * ratio);
    const draw = (/** @type {Page} */ page) =>
      page.draw(
        name,
        context,
        width,
        height,
        ratio,
        pictures.time,
        pictures.theme(),
        store.system,
      );
    core.ask(draw, undefined);
  },

  /** @returns {Theme} */
  theme() {
    if (pictures.printing) return "print";
    return matchMedia("(prefers-color-scheme: dark)").matches
      ? "dark"
      : "light";
  },

  /**
   * The same numbers for those who cannot see the picture; only made when they are looked at.
   * @param {HTMLElement} figure
   * @param {PictureName} name
   */
  showTable(figure, name) {
    /** @type {NumberTable} */
    const empty = { caption: "", columns: [], rows: [] };
    const seen = core.ask(
      (page) => page.description(name, pictures.time, store.system),
      "",
    );
    dom
      .find(figure, "canvas", HTMLCanvasElement)
      .setAttribute("aria-label", seen);
    if (!dom.find(figure, "details", HTMLDetailsElement).open) return;
    const { caption, columns, rows } =
      core.ask((page) => page.table(name, pictures.time, store.system), null) ??
      empty;
    const head = dom.make("tr");
    head.append(
      ...columns.map((words) =>
        Object.assign(dom.make("th", words), { scope: "col" }),
      ),
    );
    const body = rows.map(([first = "", ...cells]) => {
      const row = dom.make("tr");
      const name = Object.assign(dom.make("th", first), { scope: "row" });
      row.append(name, ...cells.map((cell) => dom.make("td", cell)));
      return row;
    });
    const table = dom.find(figure, "table", HTMLTableElement);
    const thead = dom.make("thead");
    thead.append(head);
    const tbody = dom.make("tbody");
    tbody.append(...body);
    table.replaceChildren(dom.make("caption", caption), thead, tbody);
  },

  /** The pixels of the screen changed: another screen, or another zoom. */
  watchRatio() {
    const query = matchMedia(`(resolution: ${window.devicePixelRatio}dppx)`);
    const changed = () => {
      pictures.draw();
      pictures.watchRatio();
    };
    query.addEventListener("change", changed, { once: true });
  },

  /** @param {boolean} onPaper */
  print(onPaper) {
    pictures.printing = onPaper;
    for (const name of pictures.names) {
      const { style } = dom.find(
        pictures.figure(name),
        "canvas",
        HTMLCanvasElement,
      );
      const [width, height] = pictures.paper[name];
      style.width = onPaper ? `${width}px` : "";
      style.height = onPaper ? `${height}px` : "";
    }
    pictures.draw();
  },

  listen() {
    const slider = dom.byId("time", HTMLInputElement);
    slider.addEventListener("input", () => {
      pictures.follows = false;
      pictures.move((Number(slider.value) / pictures.steps) * pictures.end);
    });
    const sizes = new ResizeObserver(() => pictures.draw());
    sizes.observe(dom.byId("sketch", HTMLElement));
    for (const name of pictures.names) {
      const figure = pictures.figure(name);
      sizes.observe(dom.find(figure, "canvas", HTMLCanvasElement));
      dom
        .find(figure, "details", HTMLDetailsElement)
        .addEventListener("toggle", () => pictures.showTable(figure, name));
    }
    matchMedia("(prefers-color-scheme: dark)").addEventListener("change", () =>
      pictures.draw(),
    );
    window.addEventListener("beforeprint", () => pictures.print(true));
    window.addEventListener("afterprint", () => pictures.print(false));
    pictures.watchRatio();
  },
};
