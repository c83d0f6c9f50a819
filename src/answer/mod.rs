//! From a checked item to its answers: ready time, standing time, numerical band, heat balance.

mod by_hand;
mod cells;
mod gauge;
mod history;
mod march;
mod report;
mod resolve;
mod still_liquid;
mod surroundings;
mod verdict;
mod words;
mod write;

pub use cells::mesh;
pub use gauge::Gauge;
pub use history::History;
pub use march::{Crossing, Ending, March, Orders, march};

pub use by_hand::by_hand;
pub use report::*;
pub use resolve::{Resolved, resolve};
pub use still_liquid::warnings as still_liquid_warnings;
pub use verdict::{Followed, Timed, Verdict, all_of, any_of};
pub use write::{Circumstances, report};
