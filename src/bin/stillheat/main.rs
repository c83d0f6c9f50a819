//! The batch command: scenario files in, answers out, with the same core as the page.

mod readable;
mod tasks;

use std::path::PathBuf;
use std::process::ExitCode;
use tasks::{Outcome, answer_all};

const HELP: &str = "\
stillheat answer [--text] [--pictures DIR] FILE...   answers to scenario files; - reads standard input
stillheat schema                                     the JSON Schema of the file
stillheat examples DIR                               writes the scenarios to start from

Answers go to standard output as a JSON list, one entry a file, in the order given; with --text as text to read.
Exit code: 0 all answered, 1 a scenario has problems (they are in the output), 2 wrong words or a file that
cannot be read or written.
";

/// What was asked for.
struct Wanted {
    command: String,
    text: bool,
    pictures: Option<PathBuf>,
    operands: Vec<PathBuf>,
}

fn main() -> ExitCode {
    let wanted = match wanted() {
        Ok(wanted) => wanted,
        Err(error) => {
            eprint!("stillheat: {error}\n\n{HELP}");
            return ExitCode::from(2);
        }
    };
    match wanted.command.as_str() {
        "answer" if !wanted.operands.is_empty() => answer(&wanted),
        "schema" => print(&stillheat::scenario::schema()),
        "examples" if wanted.operands.len() == 1 => examples(&wanted.operands[0]),
        "help" => print(HELP),
        _ => {
            eprint!("{HELP}");
            ExitCode::from(2)
        }
    }
}

fn wanted() -> Result<Wanted, lexopt::Error> {
    use lexopt::prelude::*;
    let mut wanted = Wanted { command: String::new(), text: false, pictures: None, operands: Vec::new() };
    let mut arguments = lexopt::Parser::from_env();
    while let Some(argument) = arguments.next()? {
        match argument {
            Long("text") => wanted.text = true,
            Long("pictures") => wanted.pictures = Some(arguments.value()?.into()),
            Long("help") | Short('h') => "help".clone_into(&mut wanted.command),
            Value(word) if wanted.command.is_empty() => wanted.command = word.string()?,
            Value(operand) => wanted.operands.push(operand.into()),
            _ => return Err(argument.unexpected()),
        }
    }
    Ok(wanted)
}

/// To standard output; a reader that has gone is no failure of ours.
fn print(text: &str) -> ExitCode {
    use std::io::Write;
    let _ = std::io::stdout().write_all(text.as_bytes());
    ExitCode::SUCCESS
}

fn answer(wanted: &Wanted) -> ExitCode {
    let outcomes = answer_all(&wanted.operands, wanted.pictures.as_deref());
    let mut code = 0;
    for outcome in &outcomes {
        code = code.max(match outcome {
            Outcome::Answered { .. } => 0,
            Outcome::Problems { .. } => 1,
            Outcome::Unreadable { .. } => 2,
        });
    }
    let text = if wanted.text { readable::all(&outcomes) } else { readable::json(&outcomes) };
    let _ = print(&text);
    ExitCode::from(code)
}

fn examples(folder: &std::path::Path) -> ExitCode {
    let written = std::fs::create_dir_all(folder).and_then(|()| {
        stillheat::scenario::examples()
            .iter()
            .try_for_each(|example| std::fs::write(folder.join(format!("{}.json", example.id)), example.text))
    });
    match written {
        Ok(()) => ExitCode::SUCCESS,
        Err(error) => {
            eprintln!("stillheat: {}: {error}", folder.display());
            ExitCode::from(2)
        }
    }
}
