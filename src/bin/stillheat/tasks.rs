//! Several files in parallel, each by itself.

use serde::Serialize;
use std::io::Read;
use std::path::{Path, PathBuf};
use std::sync::Mutex;
use std::sync::atomic::{AtomicUsize, Ordering};
use stillheat::answer::Report;
use stillheat::problem::Problem;

/// What became of a file.
#[derive(Serialize)]
#[serde(untagged)]
pub enum Outcome {
    /// It was answered.
    Answered {
        /// The file as it was named.
        file: String,
        /// The answer.
        report: Box<Report>,
    },
    /// It holds no scenario that can be solved.
    Problems {
        /// The file as it was named.
        file: String,
        /// Everything that is wrong with it.
        problems: Vec<Problem>,
    },
    /// It, or its pictures, could not be read or written.
    Unreadable {
        /// The file as it was named.
        file: String,
        /// Why not.
        unreadable: String,
    },
}

/// Answers to all files, in their order.
pub fn answer_all(files: &[PathBuf], pictures: Option<&Path>) -> Vec<Outcome> {
    let workers = std::thread::available_parallelism().map_or(1, usize::from).min(files.len());
    let next = AtomicUsize::new(0);
    let done: Mutex<Vec<(usize, Outcome)>> = Mutex::new(Vec::new());
    std::thread::scope(|scope| {
        for _ in 0..workers {
            scope.spawn(|| {
                loop {
                    let number = next.fetch_add(1, Ordering::Relaxed);
                    let Some(file) = files.get(number) else { return };
                    let outcome = answer(file, pictures);
                    done.lock().expect("no worker panics").push((number, outcome));
                }
            });
        }
    });
    let mut done = done.into_inner().expect("no worker panics");
    done.sort_by_key(|entry| entry.0);
    done.into_iter().map(|entry| entry.1).collect()
}

fn answer(path: &Path, pictures: Option<&Path>) -> Outcome {
    let file = path.display().to_string();
    let text = match read(path) {
        Ok(text) => text,
        Err(error) => return Outcome::Unreadable { file, unreadable: error.to_string() },
    };
    let solved = match stillheat::solve(&text) {
        Ok(solved) => solved,
        Err(problems) => return Outcome::Problems { file, problems },
    };
    if let Some(folder) = pictures
        && let Err(error) = draw(&solved, path, folder)
    {
        return Outcome::Unreadable { file, unreadable: format!("{}: {error}", folder.display()) };
    }
    Outcome::Answered { file, report: Box::new(solved.report) }
}

/// The text of a file; `-` is standard input. Bytes that are no UTF-8 are replaced and found by the reader.
fn read(path: &Path) -> std::io::Result<String> {
    let bytes = if path == Path::new("-") {
        let mut bytes = Vec::new();
        std::io::stdin().lock().read_to_end(&mut bytes)?;
        bytes
    } else {
        std::fs::read(path)?
    };
    Ok(String::from_utf8_lossy(&bytes).into_owned())
}

/// Writes each picture at the moment that was asked for.
fn draw(solved: &stillheat::Solved, path: &Path, folder: &Path) -> std::io::Result<()> {
    std::fs::create_dir_all(folder)?;
    let stem = path.file_stem().map_or_else(|| "scenario".into(), |stem| stem.to_string_lossy().into_owned());
    for (name, svg) in stillheat::picture::sheets(solved) {
        std::fs::write(folder.join(format!("{stem}-{name}.svg")), svg)?;
    }
    Ok(())
}
