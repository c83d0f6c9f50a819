//! Builds the one HTML file and opens it: `cargo page`, or `cargo page --no-open`.
//!
//! The core as WebAssembly, the glue that wasm-bindgen makes for it, and everything that www/index.html lists
//! go into dist/stillheat.html, under a policy that lets nothing in and nothing out.

mod assemble;
mod core_wasm;

use std::error::Error;
use std::path::{Path, PathBuf};
use std::process::{Command, ExitCode};

/// The file must stay easy to carry, bytes.
const MOST_BYTES: usize = 1_500_000;

fn main() -> ExitCode {
    let arguments: Vec<String> = std::env::args().skip(1).collect();
    if let Some(unknown) = arguments.iter().find(|argument| *argument != "--no-open") {
        eprintln!("page: {unknown} is not known; only --no-open is");
        return ExitCode::from(2);
    }
    match build(Path::new(env!("CARGO_MANIFEST_DIR"))) {
        Ok(file) => {
            if arguments.is_empty() {
                open(&file);
            }
            ExitCode::SUCCESS
        }
        Err(error) => {
            eprintln!("page: {error}");
            ExitCode::FAILURE
        }
    }
}

fn build(root: &Path) -> Result<PathBuf, Box<dyn Error>> {
    let core = core_wasm::build(root)?;
    let page = assemble::page(&root.join("www"), &core)?;
    if page.len() > MOST_BYTES {
        return Err(format!("the page has {} bytes, more than {MOST_BYTES}", page.len()).into());
    }
    let file = root.join("dist").join("stillheat.html");
    std::fs::create_dir_all(root.join("dist"))?;
    std::fs::write(&file, &page)?;
    println!("{}", file.display());
    println!("{} bytes, SHA-256 {}", page.len(), assemble::sha256_hex(page.as_bytes()));
    Ok(file)
}

/// Hands the file to whatever opens files here; where nothing does, its path has been printed.
fn open(file: &Path) {
    let opener = if cfg!(target_os = "macos") {
        "open"
    } else if cfg!(target_os = "windows") {
        "explorer"
    } else {
        "xdg-open"
    };
    if Command::new(opener).arg(file).spawn().is_err() {
        println!("Open it in a browser.");
    }
}
