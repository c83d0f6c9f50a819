//! The numbers behind a picture, for those who cannot see it or want to copy them.

/// A table; every row has as many entries as there are columns.
#[derive(Clone, Debug, Default, PartialEq, Eq, serde::Serialize)]
pub struct Table {
    /// What it shows.
    pub caption: String,
    /// Headings, with units.
    pub columns: Vec<String>,
    /// Entries as they are shown.
    pub rows: Vec<Vec<String>>,
}
