//! The walls: which room may know which, and what no room may hold.

use super::{Failure, Project};
use std::path::{Path, PathBuf};

/// The line; a room imports only from rooms to its left.
const LINE: &[&str] = &[
    "problem", "units", "scenario", "matter", "film", "item", "scale", "mesh", "conduct", "answer",
    "picture", "page",
];
/// Rooms that share nothing although the line would let them.
const APART: &[(&str, &str)] = &[
    ("mesh", "scale"),
    ("conduct", "scale"),
    ("mesh", "units"),
    ("mesh", "scenario"),
    ("mesh", "matter"),
    ("mesh", "problem"),
    ("conduct", "units"),
    ("conduct", "scenario"),
    ("conduct", "problem"),
];
/// What may stand in these rooms only.
const ONLY: &[(&str, &[&str])] =
    &[("273.15", &["units"]), ("wasm_bindgen", &["page"]), ("web_sys", &["page"]), ("js_sys", &["page"])];
/// What no room of the core may hold: it has no clock, no files, no globals, and prints nothing.
const NOWHERE: &[&str] =
    &["std::time", "std::fs", "std::env", "std::net", "std::thread", "println!", "eprintln!", "static mut"];
/// Entries that the top of the project may have, besides names that begin with a dot.
const TOP: &[&str] = &[
    "Cargo.toml",
    "Cargo.lock",
    "README.md",
    "DEVELOPERS.md",
    "LICENSE",
    "src",
    "www",
    "tests",
    "wasm-tests",
    "target",
    "dist",
];

/// Reads all rooms and says everything that is through a wall.
pub fn check(project: &Project) -> Result<(), Failure> {
    let mut broken = Vec::new();
    for room in LINE {
        for file in files_of(&project.path("src").join(room)) {
            let text = std::fs::read_to_string(&file).map_err(|error| error.to_string())?;
            let name = file.strip_prefix(&project.root).unwrap_or(&file).display().to_string();
            broken.extend(through_walls(room, &text).into_iter().map(|what| format!("{name}: {what}")));
        }
    }
    let top = std::fs::read_dir(&project.root).map_err(|error| error.to_string())?;
    for entry in top.flatten() {
        let name = entry.file_name().to_string_lossy().into_owned();
        if !name.starts_with('.') && !TOP.contains(&name.as_str()) {
            broken.push(format!("{name}: does not belong at the top of the project"));
        }
    }
    if broken.is_empty() { Ok(()) } else { Err(broken.join("\n")) }
}

fn files_of(folder: &Path) -> Vec<PathBuf> {
    let Ok(entries) = std::fs::read_dir(folder) else { return [folder.with_extension("rs")].into() };
    let mut all = Vec::new();
    for entry in entries.flatten() {
        let path = entry.path();
        if path.is_dir() {
            all.extend(files_of(&path));
        } else if path.extension().is_some_and(|ending| ending == "rs") && !path.ends_with("tests.rs") {
            all.push(path);
        }
    }
    all.sort();
    all
}

/// What in a file of a room is through a wall. Tests and comments may speak of anything.
fn through_walls(room: &str, text: &str) -> Vec<String> {
    let code = text.split("#[cfg(test)]").next().unwrap_or(text);
    let lines: Vec<&str> = code.lines().filter(|line| !line.trim_start().starts_with("//")).collect();
    let code = lines.join("\n");
    let place = |name: &str| LINE.iter().position(|one| *one == name);
    let mut broken = Vec::new();
    for other in LINE.iter().filter(|other| **other != room && names_room(&code, other)) {
        let later = place(other) > place(room);
        let apart = APART.iter().any(|(a, b)| *a == room && b == other);
        if later || apart {
            broken.push(format!("{room} knows {other}"));
        }
    }
    for (what, rooms) in ONLY {
        if code.contains(what) && !rooms.contains(&room) {
            broken.push(format!("holds {what}, which belongs in {}", rooms.join(", ")));
        }
    }
    broken.extend(NOWHERE.iter().filter(|what| code.contains(*what)).map(|what| format!("holds {what}")));
    broken
}

/// Does code refer to a room, alone or in a list of imports?
fn names_room(code: &str, room: &str) -> bool {
    let direct = [format!("crate::{room}::"), format!("crate::{room};"), format!("crate::{room} ")];
    let listed = code.split("use crate::{").skip(1).any(|list| {
        let list = list.split("};").next().unwrap_or(list);
        list.split([',', '{', '}']).any(|one| one.trim().split("::").next() == Some(room))
    });
    listed || direct.iter().any(|one| code.contains(one))
}

#[cfg(test)]
mod tests {
    use super::through_walls;

    #[test]
    fn an_import_to_the_left_is_let_through() {
        assert!(
            through_walls("conduct", "use crate::mesh::Mesh;\nuse crate::item::{Face, Item};").is_empty()
        );
    }

    #[test]
    fn an_import_to_the_right_is_found_in_every_way_of_writing_it() {
        for code in [
            "use crate::answer::Report;",
            "use crate::{answer, item};",
            "let x = crate::answer::resolve(item);",
        ] {
            assert_eq!(through_walls("conduct", code), ["conduct knows answer"], "{code}");
        }
    }

    #[test]
    fn what_belongs_elsewhere_is_found_but_not_in_comments_and_tests() {
        assert_eq!(through_walls("mesh", "let kelvin = x + 273.15;").len(), 1);
        assert_eq!(through_walls("conduct", "use crate::units::kelvin;").len(), 1);
        assert!(
            through_walls("mesh", "// 273.15\n#[cfg(test)]\nmod tests { use crate::answer; }").is_empty()
        );
    }
}
