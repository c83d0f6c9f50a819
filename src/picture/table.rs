//! The numbers of a picture, for those who cannot see it.

/// A table of text.
#[derive(Clone, Debug, PartialEq, Eq, serde::Serialize)]
pub struct Table {
    /// What it shows.
    pub caption: String,
    /// Heads of the columns.
    pub columns: Vec<String>,
    /// One entry per column each.
    pub rows: Vec<Vec<String>>,
}
