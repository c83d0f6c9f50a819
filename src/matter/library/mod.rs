//! The library: materials with their properties over temperature, how far to trust them, where they come from.
//!
//! A material is one entry in the file of its group and one row in the test of this room. Tables and
//! polynomials are written in °C, as their sources print them, and become laws in K on the way out.

#![allow(clippy::unreadable_literal, reason = "digits stand as the sources print them")]

mod beds;
mod carbon_steel;
mod curve;
mod gases;
mod insulation;
mod liquids;
mod metals;
mod minerals;
mod plastics;
mod refractories;
#[cfg(test)]
mod tests;

use super::Law;
use crate::units::kelvin;
use curve::Curve;

/// How a material is made up.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Phase {
    /// Stays where it is; conduction alone.
    Solid,
    /// May move by itself or be stirred.
    Liquid,
    /// May move by itself.
    Gas,
    /// Grains with gas between them; conduction alone, with the properties of the whole bed.
    Bed,
}

/// How far the material at hand may be from the library, in ± %.
///
/// Judgement for the class of material from the sources seen, not part of the quoted source.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Spread {
    /// ± %
    pub density: f64,
    /// ± %
    pub heat_capacity: f64,
    /// ± %
    pub conductivity: f64,
}

/// A material of the library. All laws are over K and held at their end values outside their tables.
#[derive(Clone, Debug, PartialEq)]
pub struct Material {
    /// The word a scenario names it by.
    pub id: &'static str,
    /// What people call it.
    pub name: &'static str,
    /// What it stands among: "metals", "insulation".
    pub group: &'static str,
    /// How it is made up.
    pub phase: Phase,
    /// kg/m³
    pub density: Law,
    /// J/(kg K)
    pub heat_capacity: Law,
    /// W/(m K)
    pub conductivity: Law,
    /// Dynamic viscosity, Pa s, where it is known.
    pub viscosity: Option<Law>,
    /// Volume expansion, 1/K, where it is known.
    pub expansion: Option<Law>,
    /// Temperatures between which the properties are meant to hold, K.
    pub range: (f64, f64),
    /// How far the material at hand may be from these properties.
    pub spread_percent: Spread,
    /// Where each property comes from and whether that was read or is from memory.
    pub source: &'static str,
    /// What to know before using it; may be empty.
    pub notes: &'static str,
}

/// A material as its group's file writes it: °C and curves.
struct Entry {
    id: &'static str,
    name: &'static str,
    phase: Phase,
    density: Curve,
    heat_capacity: Curve,
    conductivity: Curve,
    viscosity: Option<Curve>,
    expansion: Option<Curve>,
    range_c: (f64, f64),
    spread_percent: Spread,
    source: &'static str,
    notes: &'static str,
}

/// Groups in the order in which one looks for something.
const GROUPS: &[(&str, &[Entry])] = &[
    ("liquids and ice", liquids::ENTRIES),
    ("metals", metals::ENTRIES),
    ("insulation", insulation::ENTRIES),
    ("refractories", refractories::ENTRIES),
    ("minerals and glass", minerals::ENTRIES),
    ("plastics and wood", plastics::ENTRIES),
    ("beds", beds::ENTRIES),
    ("gases", gases::ENTRIES),
];

/// Room-temperature design values of one standard, used by many entries.
const ISO_10456: &str = "ISO 10456 / EN 12524:2000, tabulated design values at room temperature (confirmed)";
/// Handbook values at 24 °C, used by some entries.
const ASHRAE: &str =
    "ASHRAE Handbook Fundamentals, building and insulating materials at 24 °C mean (confirmed)";
/// For what no standard gives as one figure.
const DATA_SHEETS: &str = "typical product data-sheet figures (from memory)";

/// The material with this id.
pub fn material(id: &str) -> Option<Material> {
    entries().find(|(_, entry)| entry.id == id).map(|(group, entry)| entry.material(group))
}

/// All materials, group by group.
pub fn materials() -> impl Iterator<Item = Material> {
    entries().map(|(group, entry)| entry.material(group))
}

/// The ids of all materials, group by group.
pub fn ids() -> impl Iterator<Item = &'static str> {
    entries().map(|(_, entry)| entry.id)
}

fn entries() -> impl Iterator<Item = (&'static str, &'static Entry)> {
    GROUPS.iter().flat_map(|(group, entries)| entries.iter().map(move |entry| (*group, entry)))
}

const fn spread(density: f64, heat_capacity: f64, conductivity: f64) -> Spread {
    Spread { density, heat_capacity, conductivity }
}

impl Entry {
    fn material(&self, group: &'static str) -> Material {
        Material {
            id: self.id,
            name: self.name,
            group,
            phase: self.phase,
            density: self.density.law(),
            heat_capacity: self.heat_capacity.law(),
            conductivity: self.conductivity.law(),
            viscosity: self.viscosity.as_ref().map(Curve::law),
            expansion: self.expansion.as_ref().map(Curve::law),
            range: (kelvin(self.range_c.0), kelvin(self.range_c.1)),
            spread_percent: self.spread_percent,
            source: self.source,
            notes: self.notes,
        }
    }
}
