//! Runs every check there is: `cargo verify`, or `cargo verify NAME...` for some of them.
//!
//! Goes on after a failure, so that one run tells all; installs what a check needs where it can.

mod checks;
mod set_up;
mod walls;

use std::path::{Path, PathBuf};
use std::process::{Command, ExitCode};
use std::time::Instant;

/// Why a check failed, in one line; its own output has been printed.
type Failure = String;

/// A check by its name.
struct Check {
    name: &'static str,
    run: fn(&Project) -> Result<(), Failure>,
}

/// Where things are.
pub struct Project {
    /// The folder of Cargo.toml.
    pub root: PathBuf,
}

impl Project {
    /// Runs a command in the project's folder; its output goes where ours goes.
    ///
    /// # Errors
    /// The command and how it ended, where it did not end well.
    pub fn run(&self, command: &mut Command) -> Result<(), Failure> {
        let shown = format!("{command:?}");
        match command.current_dir(&self.root).status() {
            Ok(status) if status.success() => Ok(()),
            Ok(status) => Err(format!("{shown}: {status}")),
            Err(error) => Err(format!("{shown}: {error}")),
        }
    }

    /// A cargo command.
    pub fn cargo(&self, arguments: &[&str]) -> Command {
        let mut command = Command::new(std::env::var("CARGO").unwrap_or_else(|_| "cargo".to_owned()));
        command.args(arguments);
        command
    }

    /// A path inside the project.
    pub fn path(&self, inside: &str) -> PathBuf {
        self.root.join(inside)
    }
}

fn main() -> ExitCode {
    let project = Project { root: Path::new(env!("CARGO_MANIFEST_DIR")).to_path_buf() };
    let names: Vec<String> = std::env::args().skip(1).collect();
    if let Some(unknown) = names.iter().find(|name| checks::ALL.iter().all(|check| check.name != **name)) {
        let known: Vec<&str> = checks::ALL.iter().map(|check| check.name).collect();
        eprintln!("verify: {unknown} is not known; known: {}", known.join(", "));
        return ExitCode::from(2);
    }
    let wanted =
        checks::ALL.iter().filter(|check| names.is_empty() || names.iter().any(|name| name == check.name));
    let mut lines = Vec::new();
    let (mut passed, mut failed) = (0, 0);
    for check in wanted {
        println!("== {}", check.name);
        let begun = Instant::now();
        let result = (check.run)(&project);
        let seconds = begun.elapsed().as_secs();
        match result {
            Ok(()) => {
                passed += 1;
                lines.push(format!("{:10} passed  {seconds:4} s", check.name));
            }
            Err(failure) => {
                failed += 1;
                println!("{failure}");
                lines.push(format!("{:10} FAILED  {seconds:4} s  {failure}", check.name));
            }
        }
    }
    println!("\n{}", lines.join("\n"));
    println!("{passed} passed, {failed} failed");
    if failed == 0 { ExitCode::SUCCESS } else { ExitCode::FAILURE }
}
