//! The core as WebAssembly and the JavaScript that talks to it.

use std::error::Error;
use std::path::Path;
use std::process::Command;
use wasm_bindgen_cli_support::Bindgen;

const TARGET: &str = "wasm32-unknown-unknown";

/// A built core.
pub struct Core {
    /// The module.
    pub wasm: Vec<u8>,
    /// Its glue: one classic script that defines `wasm_bindgen`.
    pub glue: String,
}

/// Builds the library in a target folder of its own, so that two cargos do not wait for each other's lock.
pub fn build(root: &Path) -> Result<Core, Box<dyn Error>> {
    add_target()?;
    let target = root.join("target").join("page");
    let cargo = std::env::var("CARGO").unwrap_or_else(|_| "cargo".to_owned());
    let status = Command::new(cargo)
        .current_dir(root)
        .args(["build", "--quiet", "--release", "--lib", "--target", TARGET, "--target-dir"])
        .arg(&target)
        .status()?;
    if !status.success() {
        return Err("the core did not build".into());
    }
    let glue_folder = target.join("glue");
    Bindgen::new()
        .input_path(target.join(TARGET).join("release").join("stillheat.wasm"))
        .no_modules(true)?
        .omit_default_module_path(true)
        .typescript(false)
        .remove_name_section(true)
        .remove_producers_section(true)
        .generate(&glue_folder)?;
    Ok(Core {
        wasm: std::fs::read(glue_folder.join("stillheat_bg.wasm"))?,
        glue: std::fs::read_to_string(glue_folder.join("stillheat.js"))?,
    })
}

/// Adds the WebAssembly target to the toolchain where it is not there yet.
pub fn add_target() -> Result<(), Box<dyn Error>> {
    let sysroot = Command::new("rustc").args(["--print", "sysroot"]).output()?;
    let sysroot = String::from_utf8(sysroot.stdout)?;
    if Path::new(sysroot.trim()).join("lib/rustlib").join(TARGET).exists() {
        return Ok(());
    }
    let added = Command::new("rustup").args(["target", "add", TARGET]).status();
    if added.is_ok_and(|status| status.success()) {
        return Ok(());
    }
    Err(format!("the target {TARGET} is missing and could not be added; try: rustup target add {TARGET}")
        .into())
}
