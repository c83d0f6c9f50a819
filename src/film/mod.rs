//! Film coefficients, emissivities and contacts.

pub mod choices;
