//! What is checked, the quick ones first.

use super::set_up;
use super::walls;
use super::{Check, Failure, Project};
use std::process::Command;

const WASM: &str = "wasm32-unknown-unknown";

/// All checks in their order.
pub const ALL: &[Check] = &[
    Check { name: "format", run: format },
    Check { name: "walls", run: walls::check },
    Check { name: "clippy", run: clippy },
    Check { name: "docs", run: docs },
    Check { name: "tests", run: tests },
    Check { name: "page", run: page },
    Check { name: "scripts", run: scripts },
    Check { name: "wasm", run: wasm },
    Check { name: "browsers", run: browsers },
];

fn format(project: &Project) -> Result<(), Failure> {
    project.run(&mut project.cargo(&["fmt", "--all", "--", "--check"]))
}

/// Natively with tests and benches, and the library once more as it goes into the page.
fn clippy(project: &Project) -> Result<(), Failure> {
    set_up::wasm_target()?;
    project.run(&mut project.cargo(&["clippy", "--quiet", "--all-targets", "--", "-D", "warnings"]))?;
    let wasm = ["clippy", "--quiet", "--lib", "--target", WASM, "--target-dir", "target/wasm-tests", "--"];
    project.run(project.cargo(&wasm).args(["-D", "warnings"]))
}

fn docs(project: &Project) -> Result<(), Failure> {
    project.run(project.cargo(&["doc", "--quiet", "--no-deps", "--lib"]).env("RUSTDOCFLAGS", "-D warnings"))
}

fn tests(project: &Project) -> Result<(), Failure> {
    project.run(&mut project.cargo(&["test", "--quiet"]))
}

fn page(project: &Project) -> Result<(), Failure> {
    project.run(&mut project.cargo(&["run", "--quiet", "--bin", "page", "--", "--no-open"]))
}

/// Types, rules and layout of the page's scripts.
fn scripts(project: &Project) -> Result<(), Failure> {
    set_up::node_modules(project)?;
    for script in ["types", "lint", "format"] {
        project.run(Command::new("npm").args(["run", "--silent", "--prefix", "tests/browser", script]))?;
    }
    Ok(())
}

/// The core as WebAssembly under Node: the same bits as natively.
/// (Without --quiet, which the runner does not know.)
fn wasm(project: &Project) -> Result<(), Failure> {
    set_up::wasm_target()?;
    set_up::node()?;
    let runner = set_up::wasm_test_runner(project)?;
    let arguments = [
        "test",
        "--target",
        WASM,
        "--target-dir",
        "target/wasm-tests",
        "--test",
        "wasm",
        "--no-default-features",
    ];
    project.run(project.cargo(&arguments).env("CARGO_TARGET_WASM32_UNKNOWN_UNKNOWN_RUNNER", runner))
}

/// The built file in Chromium, opened off the disk.
fn browsers(project: &Project) -> Result<(), Failure> {
    set_up::node_modules(project)?;
    set_up::browser()?;
    if !project.path("dist/stillheat.html").exists() {
        page(project)?;
    }
    let folder = std::fs::read_dir(project.path("tests/browser")).map_err(|error| error.to_string())?;
    let mut files: Vec<_> = folder.flatten().map(|entry| entry.path()).collect();
    files.retain(|file| file.to_string_lossy().ends_with(".test.mjs"));
    files.sort();
    project.run(Command::new("node").args(["--test", "--test-concurrency=1"]).args(files))
}
