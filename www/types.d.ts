// The shapes that cross the door to the core. The core is the authority; this says the same for the checker.

/** A problem with its place. */
interface Problem {
  severity: "error" | "warning";
  path: string;
  message: string;
  hint: string;
}

/** Temperatures at one moment, °C. */
interface State {
  hottest_c: number;
  coldest_c: number;
  layer_means_c: number[];
  inside_c: number;
  outside_c: number;
}

/** What became of a condition. */
interface Outcome {
  kind: "already" | "at" | "never" | "not_within";
  time_s?: number;
  low_s?: number;
  high_s?: number;
  clock?: string;
  lost_again_s?: number | null;
  for_good_from_s?: number | null;
  state?: State;
}

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

interface Report {
  headline: string;
  detail: string;
  ready: Outcome | null;
  ready_when: ConditionReport[];
  standing: Outcome | null;
  must_not: ConditionReport[];
  heat_balance: {
    per: string;
    until_s: number;
    stored_j: number;
    in_inner_j: number;
    in_outer_j: number;
    relative_error: number;
  };
  by_hand: HandFormula[];
  course: { start: State; end: State; end_s: number; settles: boolean };
  checks: [string, string][];
  effort: {
    nodes: number[];
    tolerance_k: number[];
    steps: number;
    rejected: number;
  };
  warnings: Problem[];
  cautions: string[];
}

interface Solution {
  problems: Problem[];
  report: Report | null;
}

/** What a text was understood as; in the unit of the file. */
interface Understood {
  value?: number;
  low?: number | null;
  high?: number | null;
  problem?: string;
}

interface Pairs {
  at?: number[];
  values?: number[];
  problem?: string;
}

interface Material {
  id: string;
  name: string;
  group: string;
  liquid: boolean;
  source: string;
  notes: string;
}

interface Choice {
  words: string;
  low: number;
  likely: number;
  high: number;
  source: string;
}

interface Example {
  id: string;
  title: string;
  text: string;
}

interface PictureTable {
  caption: string;
  columns: string[];
  rows: string[][];
}

/** The class that wasm-bindgen makes of the core's page. */
interface CorePage {
  solve(text: string): Solution;
  draw(
    picture: string,
    context: CanvasRenderingContext2D,
    width: number,
    height: number,
    ratio: number,
    time: number,
    dark: boolean,
    us: boolean,
  ): void;
  table(picture: string, time: number, us: boolean): PictureTable;
  moment_words(time: number): string;
}

interface CoreFunctions {
  initSync(options: { module: WebAssembly.Module }): void;
  Page: { new (): CorePage };
  read_quantity(text: string, kind: string, us: boolean): Understood;
  write_quantity(
    value: number,
    low: number | undefined,
    high: number | undefined,
    kind: string,
    us: boolean,
  ): string;
  step_quantity(
    text: string,
    kind: string,
    us: boolean,
    up: boolean,
    large: boolean,
  ): string | undefined;
  read_pairs(text: string, at: string, value: string, us: boolean): Pairs;
  write_pairs(
    at: Float64Array,
    values: Float64Array,
    at_kind: string,
    value_kind: string,
    us: boolean,
  ): string;
  materials(): Material[];
  choices(of: string): Choice[];
  examples(): Example[];
}

declare const wasm_bindgen: CoreFunctions;

/** Any JSON value. */
type Json = null | boolean | number | string | Json[] | { [key: string]: Json };

/** A scenario while it is being written: anything may still be missing. */
interface Scenario {
  [key: string]: Json;
}

/** What the page remembers between visits. */
interface Kept {
  scenario: Scenario;
  drafts: { [path: string]: string };
  us: boolean;
}
