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

  /**
   * The canvases there are, what they show and how wide they are.
   * @type {Map<HTMLCanvasElement, Picture>}
   */
  shown: new Map(),

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
    for (const [canvas, picture] of pictures.shown) {
      pictures.drawOn(canvas, picture);
    }
    for (const name of pictures.names) pictures.showTable(name);
  },

  /**
   * @param {PictureName} name
   * @returns {HTMLElement}
   */
  figure(name) {
    return dom.find(document, `.picture[data-picture="${name}"]`, HTMLElement);
  },

  /**
   * @param {HTMLCanvasElement} canvas
   * @param {Picture} picture
   */
  drawOn(canvas, { name, width: across }) {
    const [paperWidth] = pictures.paper[name];
    const width = pictures.printing ? paperWidth : across;
    if (width === 0) return;
    const height = pictures.height(name, width);
    const ratio = pictures.printing
      ? pictures.paperRatio
      : window.devicePixelRatio;
    const context = canvas.getContext("2d");
    if (height === 0 || context === null) return;
    canvas.style.height = `${height}px`;
    // A canvas that is given a size is cleared and made anew, even if it is the same.
    const pixels = [width, height].map((side) => Math.round(side * ratio));
    if (canvas.width !== pixels[0]) canvas.width = pixels[0] ?? 0;
    if (canvas.height !== pixels[1]) canvas.height = pixels[1] ?? 0;
    core.ask(
      (page) =>
        page.draw(
          name,
          context,
          width,
          height,
          ratio,
          pictures.time,
          pictures.theme(),
          store.system,
        ),
      undefined,
    );
  },

  /**
   * The height that suits a picture of this width.
   * @param {PictureName} name
   * @param {number} width
   * @returns {number}
   */
  height(name, width) {
    if (pictures.printing) return pictures.paper[name][1];
    return core.ask((page) => page.height(name, width, store.system), 0);
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
   * @param {PictureName} name
   */
  showTable(name) {
    const figure = pictures.figure(name);
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
      const [width] = pictures.paper[name];
      style.width = onPaper ? `${width}px` : "";
    }
    pictures.draw();
  },

  /**
   * There is another width to draw on.
   * @param {ResizeObserverEntry[]} entries
   */
  resize(entries) {
    for (const { target, contentRect } of entries) {
      const canvas = target.nextElementSibling;
      if (!(canvas instanceof HTMLCanvasElement)) continue;
      const picture = pictures.shown.get(canvas);
      if (picture === undefined) continue;
      picture.width = contentRect.width;
      if (answer.report !== null) pictures.drawOn(canvas, picture);
    }
  },

  listen() {
    const slider = dom.byId("time", HTMLInputElement);
    slider.addEventListener("input", () => {
      pictures.follows = false;
      pictures.move((Number(slider.value) / pictures.steps) * pictures.end);
    });
    const widths = new ResizeObserver(pictures.resize);
    for (const breadth of dom.all(document, ".breadth")) {
      const canvas = breadth.nextElementSibling;
      if (!(canvas instanceof HTMLCanvasElement)) continue;
      const figure = canvas.closest("figure");
      const name = /** @type {PictureName} */ (figure?.dataset["picture"]);
      pictures.shown.set(canvas, { name, width: 0 });
      widths.observe(breadth);
    }
    for (const name of pictures.names) {
      const figure = pictures.figure(name);
      dom
        .find(figure, "details", HTMLDetailsElement)
        .addEventListener("toggle", () => pictures.showTable(name));
    }
    matchMedia("(prefers-color-scheme: dark)").addEventListener("change", () =>
      pictures.draw(),
    );
    window.addEventListener("beforeprint", () => pictures.print(true));
    window.addEventListener("afterprint", () => pictures.print(false));
    pictures.watchRatio();
  },
};
