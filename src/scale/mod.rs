//! scale
