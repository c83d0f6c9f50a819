/** The shapes that cross the door between the page and the core (src/page). */

type Json = null | boolean | number | string | Json[] | { [key: string]: Json };
type JsonObject = { [key: string]: Json };

type System = "metric" | "us";
type PictureName = "section" | "curve" | "profile";
type Theme = "light" | "dark" | "print";

/** What is wrong with a scenario, or unusual about it. */
interface Problem {
  severity: "error" | "warning";
  /** JSON Pointer; empty for the whole scenario. */
  path: string;
  message: string;
  hint: string;
  /**
   * needed: something is not there yet; unknown: a key nobody knows; text: the text itself cannot be taken;
   * value: all else.
   */
  kind: "needed" | "unknown" | "text" | "value";
}

interface State {
  hottest_c: number;
  coldest_c: number;
  layer_means_c: number[];
  inside_c: number;
  outside_c: number;
}

type Outcome =
  | {
      kind: "already";
      lost_again_s: number | null;
      for_good_from_s: number | null;
    }
  | {
      kind: "at";
      time_s: number;
      low_s: number;
      high_s: number;
      clock?: string;
      lost_again_s: number | null;
      for_good_from_s: number | null;
      state: State;
    }
  | { kind: "never"; settles_at: number | null }
  | { kind: "not_within"; look_ahead_s: number; then: number | null };

interface ConditionReport {
  path: string;
  words: string;
  outcome: Outcome;
  outcome_words: string;
}

interface HandFormula {
  name: string;
  formula: string;
  holds: boolean;
  validity: string;
  gives: string;
  time_s: number | null;
  path: string;
}

/** The answer as the core reports it; the batch command writes the same. */
interface Report {
  title: string;
  headline: string;
  detail: string;
  ready: Outcome | null;
  ready_when: ConditionReport[];
  standing: Outcome | null;
  must_not: ConditionReport[];
  by_hand: HandFormula[];
  course: { start: State; end: State; end_s: number; settles: boolean };
  /** How far to trust the calculation: what, and how much in words. */
  checks: [string, string][];
  warnings: Problem[];
  cautions: string[];
}

interface Solution {
  problems: Problem[];
  report: Report | null;
}

/** A time after the stop. */
interface Moment {
  /** "Monday 09:10, 1 day 3 h 10 min after the stop" */
  words: string;
  /** "2026-03-02T09:10" where the date of the stop is given, else empty. */
  iso: string;
}

interface NumberTable {
  caption: string;
  columns: string[];
  rows: string[][];
}

/** A text as it was understood, or why it was not. */
type Reading = { written: Json; understood: string } | { message: string };

interface Material {
  id: string;
  name: string;
  group: string;
  liquid: boolean;
  source: string;
  notes: string;
}

/** An everyday choice in words. */
interface Choice {
  words: string;
  written: Json;
  source: string;
}

interface Example {
  title: string;
  about: string;
  text: string;
}

/** The last scenario that was answered. */
declare class Page {
  constructor();
  solve(text: string): Solution;
  forget(): void;
  draw(
    picture: PictureName,
    context: CanvasRenderingContext2D,
    width: number,
    height: number,
    ratio: number,
    time_s: number,
    theme: Theme,
    system: System,
  ): void;
  height(name: PictureName, width: number, system: System): number;
  description(name: PictureName, time: number, system: System): string;
  table(
    picture: PictureName,
    time_s: number,
    system: System,
  ): NumberTable | null;
  moment(time_s: number): Moment | null;
}

/** The door. */
interface Door {
  initSync(options: { module: WebAssembly.Module }): void;
  Page: typeof Page;
  read(text: string, kind: string, system: System): Reading;
  write(written: string, kind: string, system: System): string;
  step(
    text: string,
    kind: string,
    system: System,
    up: boolean,
    large: boolean,
  ): string | undefined;
  layer_names(layers: string): string[];
  materials(): Material[];
  choices(of: string): Choice[];
  examples(): Example[];
  most_bytes(): number;
  last_bug(): string;
}

declare const wasm_bindgen: Door;

/** What a canvas shows, and its width in CSS px. */
interface Picture {
  name: PictureName;
  width: number;
}

/** What is kept from one opening of the page to the next. */
interface Kept {
  /** The scenario as it was left. */
  text: string;
  /** The last scenario that had an answer; empty where there was none. */
  answered: string;
}

/** A control of the form and the place in the scenario that it shows. */
interface Field {
  path: string;
  box: HTMLElement;
  control: HTMLInputElement | HTMLSelectElement | HTMLTextAreaElement;
  message: HTMLElement;
  /** Why the text could not be read; empty where it could. */
  trouble: string;
  label: string;
}
