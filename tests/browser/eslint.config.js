import js from "@eslint/js";

const page = [
  "core",
  "pointer",
  "model",
  "fields",
  "layers",
  "faces",
  "start",
  "watch",
  "pictures",
  "answer",
  "files",
  "main",
  "wasm_bindgen",
];
const browser = [
  "document",
  "window",
  "console",
  "matchMedia",
  "localStorage",
  "requestAnimationFrame",
  "performance",
  "atob",
  "URL",
  "Blob",
  "Option",
  "CSS",
  "ResizeObserver",
  "WebAssembly",
  "HTMLInputElement",
  "HTMLTextAreaElement",
  "CanvasRenderingContext2d",
];
const readonly = (names) => Object.fromEntries(names.map((name) => [name, "readonly"]));

export default [
  js.configs.recommended,
  {
    files: ["**/www/scripts/*.js"],
    languageOptions: { sourceType: "script", globals: readonly([...page, ...browser]) },
    rules: {
      // Each file defines one object that the others use.
      "no-redeclare": "off",
      "no-unused-vars": ["error", { vars: "local", args: "after-used", argsIgnorePattern: "^_" }],
      "no-console": "error",
      eqeqeq: "error",
      "prefer-const": "error",
      "no-var": "error",
      "no-eval": "error",
      "no-restricted-properties": ["error", { property: "innerHTML" }, { property: "outerHTML" }, { property: "insertAdjacentHTML" }],
    },
  },
  {
    files: ["**/tests/browser/*.mjs"],
    languageOptions: {
      sourceType: "module",
      globals: readonly([
        "process",
        "console",
        "URL",
        "document",
        "window",
        "performance",
        "setTimeout",
        "getComputedStyle",
        "localStorage",
        "Event",
        "DataTransfer",
        "File",
      ]),
    },
  },
];
