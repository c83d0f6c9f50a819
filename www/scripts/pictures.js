"use strict";

/** The pictures: drawn by the core on canvases of the size they have, at one moment. */
const pictures = {
  /** Height over width, and the least and the most height, px. @type {{ [name: string]: [number, number, number] }} */
  shapes: {
    section: [0.85, 240, 380],
    curve: [0.62, 240, 380],
    profile: [0.3, 200, 300],
  },
  /** End of what was computed, s. */
  end: 0,
  dark: matchMedia("(prefers-color-scheme: dark)"),
  printing: false,

  /** The moment of the slider, s. */
  time() {
    const slider = /** @type {HTMLInputElement} */ (
      document.getElementById("moment")
    );
    return (Number(slider.value) / 1000) * pictures.end;
  },

  draw() {
    if (pictures.end <= 0) return;
    const time = pictures.time();
    for (const name of Object.keys(pictures.shapes))
      pictures.drawOne(name, time);
    const words = core.page.moment_words(time);
    const slider = /** @type {HTMLInputElement} */ (
      document.getElementById("moment")
    );
    slider.setAttribute("aria-valuetext", words);
    /** @type {HTMLElement} */ (
      document.getElementById("moment-words")
    ).textContent = words;
  },

  /** @param {string} name @param {number} time */
  drawOne(name, time) {
    const canvas = /** @type {HTMLCanvasElement} */ (
      document.getElementById(name)
    );
    const width = Math.max(
      240,
      Math.floor(/** @type {HTMLElement} */ (canvas.parentElement).clientWidth),
    );
    const [share, least, most] = /** @type {[number, number, number]} */ (
      pictures.shapes[name]
    );
    const height = Math.round(Math.min(most, Math.max(least, share * width)));
    const ratio = window.devicePixelRatio || 1;
    const [pixels, lines] = [
      Math.round(width * ratio),
      Math.round(height * ratio),
    ];
    if (canvas.width !== pixels || canvas.height !== lines) {
      canvas.width = pixels;
      canvas.height = lines;
      canvas.style.height = `${height}px`;
    }
    const context = canvas.getContext("2d");
    if (!context) return;
    core.page.draw(
      name,
      context,
      width,
      height,
      ratio,
      time,
      pictures.dark.matches && !pictures.printing,
      core.us,
    );
    const table = core.page.table(name, time, core.us);
    canvas.setAttribute("aria-label", table.caption);
    const place = /** @type {HTMLElement} */ (
      document.getElementById(`${name}-table`)
    );
    const details = /** @type {HTMLDetailsElement} */ (place.parentElement);
    place.replaceChildren(...(details.open ? [pictures.table(table)] : []));
  },

  /** @param {PictureTable} table @returns {HTMLTableElement} */
  table(table) {
    const element = document.createElement("table");
    element.createCaption().textContent = table.caption;
    const head = element.createTHead().insertRow();
    for (const column of table.columns) {
      const cell = document.createElement("th");
      cell.scope = "col";
      cell.textContent = column;
      head.append(cell);
    }
    const body = element.createTBody();
    for (const row of table.rows) {
      const line = body.insertRow();
      for (const text of row) line.insertCell().textContent = text;
    }
    return element;
  },

  /** A new answer: the slider goes to the moment that was asked for. @param {Report} report */
  show(report) {
    const fresh = pictures.end === 0;
    const slider = /** @type {HTMLInputElement} */ (
      document.getElementById("moment")
    );
    pictures.end = report.course.end_s;
    const asked = report.ready?.time_s ?? report.standing?.time_s;
    if (fresh && asked !== undefined)
      slider.value = String(Math.round((1000 * asked) / pictures.end));
    pictures.draw();
  },

  listen() {
    const again = () => pictures.draw();
    document.getElementById("moment")?.addEventListener("input", again);
    for (const details of document.querySelectorAll("figure details"))
      details.addEventListener("toggle", again);
    pictures.dark.addEventListener("change", again);
    const wait = () => {
      matchMedia(
        `(resolution: ${window.devicePixelRatio}dppx)`,
      ).addEventListener(
        "change",
        () => {
          again();
          wait();
        },
        { once: true },
      );
    };
    wait();
    new ResizeObserver(again).observe(
      /** @type {HTMLElement} */ (document.querySelector(".pictures")),
    );
    window.addEventListener("beforeprint", () => {
      pictures.printing = true;
      again();
    });
    window.addEventListener("afterprint", () => {
      pictures.printing = false;
      again();
    });
  },
};
