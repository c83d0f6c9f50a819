//! What the checks need beside Rust: brought in where it can be, else said exactly.

use super::{Failure, Project};
use std::path::PathBuf;
use std::process::{Command, Stdio};

const WASM: &str = "wasm32-unknown-unknown";

/// The WebAssembly target of the toolchain.
pub fn wasm_target() -> Result<(), Failure> {
    let sysroot =
        Command::new("rustc").args(["--print", "sysroot"]).output().map_err(|error| error.to_string())?;
    let sysroot = PathBuf::from(String::from_utf8_lossy(&sysroot.stdout).trim());
    if sysroot.join("lib/rustlib").join(WASM).exists() || succeeds("rustup", &["target", "add", WASM]) {
        return Ok(());
    }
    Err(format!("the target {WASM} is missing; try: rustup target add {WASM}"))
}

/// Node, which runs the tests of the page.
pub fn node() -> Result<(), Failure> {
    package("node", "Node.js 20 or later with npm", &["nodejs", "npm"])
}

/// The packages that the checks of the page use.
pub fn node_modules(project: &Project) -> Result<(), Failure> {
    node()?;
    if project.path("tests/browser/node_modules/.package-lock.json").exists() {
        return Ok(());
    }
    project.run(Command::new("npm").args(["ci", "--silent", "--prefix", "tests/browser"]))
}

/// The browser that the page's tests drive.
pub fn browser() -> Result<(), Failure> {
    package("chromium", "Chromium", &["chromium"])
}

/// The runner of tests as WebAssembly, of the version that the library has.
pub fn wasm_test_runner(project: &Project) -> Result<PathBuf, Failure> {
    let lock = std::fs::read_to_string(project.path("Cargo.lock")).map_err(|error| error.to_string())?;
    let version = lock
        .split("[[package]]")
        .find(|package| package.contains("name = \"wasm-bindgen\"\n"))
        .and_then(|package| package.split("version = \"").nth(1))
        .and_then(|rest| rest.split('"').next())
        .ok_or("Cargo.lock names no wasm-bindgen")?;
    tool(project, "wasm-bindgen-cli", "wasm-bindgen-test-runner", version)
}

/// A tool of the Rust world in target/tools, where it does not touch the user's own.
fn tool(project: &Project, name: &str, program: &str, version: &str) -> Result<PathBuf, Failure> {
    let root = project.path("target/tools");
    let path = root.join("bin").join(program);
    let stamp = root.join(format!("{name}-{version}"));
    if path.exists() && stamp.exists() {
        return Ok(path);
    }
    println!("installing {name} {version} into target/tools");
    let mut install = project.cargo(&["install", "--quiet", "--force", name, "--version", version, "--root"]);
    project.run(install.arg(&root))?;
    std::fs::write(&stamp, "").map_err(|error| error.to_string())?;
    Ok(path)
}

/// A program; where apt and the right to use it are at hand it is installed, else its absence is said.
fn package(program: &str, what: &str, packages: &[&str]) -> Result<(), Failure> {
    if succeeds(program, &["--version"]) {
        return Ok(());
    }
    println!("installing {what}");
    let install = [&["install", "-y", "--no-install-recommends"], packages].concat();
    if succeeds("apt-get", &["update"]) && succeeds("apt-get", &install) && succeeds(program, &["--version"])
    {
        return Ok(());
    }
    Err(format!(
        "{what} is missing (the program {program}); on Debian as root: apt-get install {}",
        packages.join(" ")
    ))
}

fn succeeds(program: &str, arguments: &[&str]) -> bool {
    let quiet = Command::new(program).args(arguments).stdout(Stdio::null()).stderr(Stdio::null()).status();
    quiet.is_ok_and(|status| status.success())
}
