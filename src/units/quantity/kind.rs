//! The kinds of quantity, the two systems of units, and what each shows.

use super::unit::{Dimension, Unit};

/// What a field holds.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Kind {
    /// In the file m.
    Length,
    /// In the file °C.
    Temperature,
    /// In the file K.
    TemperatureDifference,
    /// In the file s.
    Duration,
    /// In the file kg/m³.
    Density,
    /// In the file J/(kg K).
    HeatCapacity,
    /// In the file W/(m K).
    Conductivity,
    /// Film coefficient, in the file W/(m² K).
    Film,
    /// Contact resistance, in the file m² K/W.
    Contact,
    /// 0 to 1.
    Emissivity,
    /// In the file W/m².
    HeatFlux,
    /// Rate of change of a temperature, in the file K/h.
    Rate,
}

/// Which units are shown.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum System {
    /// mm, °C, W/m²K.
    Metric,
    /// in, °F, Btu/h ft² °F.
    Us,
}

impl Kind {
    /// The kind that a form names so: `length`, `heat_capacity`.
    pub fn named(word: &str) -> Option<Self> {
        Some(match word {
            "length" => Self::Length,
            "temperature" => Self::Temperature,
            "temperature_difference" => Self::TemperatureDifference,
            "duration" => Self::Duration,
            "density" => Self::Density,
            "heat_capacity" => Self::HeatCapacity,
            "conductivity" => Self::Conductivity,
            "film" => Self::Film,
            "contact" => Self::Contact,
            "emissivity" => Self::Emissivity,
            "heat_flux" => Self::HeatFlux,
            "rate" => Self::Rate,
            _ => return None,
        })
    }

    /// All of them.
    pub const ALL: [Self; 12] = [
        Self::Length,
        Self::Temperature,
        Self::TemperatureDifference,
        Self::Duration,
        Self::Density,
        Self::HeatCapacity,
        Self::Conductivity,
        Self::Film,
        Self::Contact,
        Self::Emissivity,
        Self::HeatFlux,
        Self::Rate,
    ];

    /// With its article, for messages.
    pub(super) fn name(self) -> &'static str {
        match self {
            Self::Length => "a length",
            Self::Temperature => "a temperature",
            Self::TemperatureDifference => "a temperature difference",
            Self::Duration => "a length of time",
            Self::Density => "a density",
            Self::HeatCapacity => "a heat capacity",
            Self::Conductivity => "a conductivity",
            Self::Film => "a film coefficient",
            Self::Contact => "a contact resistance",
            Self::Emissivity => "an emissivity",
            Self::HeatFlux => "a heat flux",
            Self::Rate => "a rate of change",
        }
    }

    /// Powers of length, mass, time and temperature.
    pub(super) fn dimension(self) -> Dimension {
        match self {
            Self::Length => [1, 0, 0, 0],
            Self::Temperature | Self::TemperatureDifference => [0, 0, 0, 1],
            Self::Duration => [0, 0, 1, 0],
            Self::Density => [-3, 1, 0, 0],
            Self::HeatCapacity => [2, 0, -2, -1],
            Self::Conductivity => [1, 1, -3, -1],
            Self::Film => [0, 1, -3, -1],
            Self::Contact => [0, -1, 3, 1],
            Self::Emissivity => [0, 0, 0, 0],
            Self::HeatFlux => [0, 1, -3, 0],
            Self::Rate => [0, 0, -1, 1],
        }
    }

    /// The unit of the file, as people write it.
    pub(super) fn file_unit(self) -> &'static str {
        match self {
            Self::Length => "m",
            Self::Duration => "s",
            _ => unit(self, System::Metric),
        }
    }

    /// What may be written, for messages.
    pub(super) fn examples(self, system: System) -> &'static str {
        match (self, system) {
            (Self::Length, System::Metric) => "400 mm, 0.4 m or 380 to 420 mm",
            (Self::Length, System::Us) => "16 in, 1.5 ft or 15 to 17 in",
            (Self::Temperature, System::Metric) => "18 °C, −5 °C or 15 to 25 °C",
            (Self::Temperature, System::Us) => "64 °F, −5 °F or 60 to 75 °F",
            (Self::TemperatureDifference, System::Metric) => "5 K or 4 to 6 K",
            (Self::TemperatureDifference, System::Us) => "9 °F or 8 to 10 °F",
            (Self::Duration, _) => "2 h 30 min, 90 min or 2 to 3 h",
            (Self::Density, System::Metric) => "1000 kg/m³ or 950 to 1050 kg/m³",
            (Self::Density, System::Us) => "62 lb/ft³ or 60 to 64 lb/ft³",
            (Self::HeatCapacity, System::Metric) => "4200 J/kgK or 4 to 4.4 kJ/kgK",
            (Self::HeatCapacity, System::Us) => "1 Btu/lb °F or 0.9 to 1.1 Btu/lb °F",
            (Self::Conductivity, System::Metric) => "0.04 W/mK or 0.035 to 0.045 W/mK",
            (Self::Conductivity, System::Us) => "0.02 Btu/h ft °F or 0.25 Btu in/h ft² °F",
            (Self::Film, System::Metric) => "8 W/m²K, 6 to 12 W/m²K or 8 ± 2",
            (Self::Film, System::Us) => "1.4 Btu/h ft² °F, 1 to 2 Btu/h ft² °F or 1.4 ± 0.4",
            (Self::Contact, System::Metric) => "0.0002 m²K/W or 0.0001 to 0.0003 m²K/W",
            (Self::Contact, System::Us) => "0.001 h ft² °F/Btu or 0.001 to 0.002 h ft² °F/Btu",
            (Self::Emissivity, _) => "0.9 or 0.85 to 0.95",
            (Self::HeatFlux, System::Metric) => "500 W/m², 2 kW/m² or 400 to 600 W/m²",
            (Self::HeatFlux, System::Us) => "150 Btu/h ft² or 120 to 180 Btu/h ft²",
            (Self::Rate, System::Metric) => "2 K/h or 0.1 K/min",
            (Self::Rate, System::Us) => "4 °F/h or 0.2 °F/min",
        }
    }

    /// Is nothing below zero ever meant?
    pub(super) fn starts_at_zero(self) -> bool {
        !matches!(self, Self::Temperature | Self::HeatFlux)
    }

    /// Is not even zero meant?
    pub(super) fn excludes_zero(self) -> bool {
        matches!(self, Self::Length | Self::Density | Self::HeatCapacity | Self::Conductivity)
    }

    /// A number in some unit as one in the unit of the file.
    ///
    /// A number that had to be converted is rounded to 14 digits, so that 3 in is 0.0762 m.
    pub(super) fn to_file(self, number: f64, unit: &Unit) -> f64 {
        match self {
            Self::Temperature => unit.to_celsius(number),
            // The file's rate is per hour, the units' per second.
            Self::Rate => unit.scaled(3_600.0, number),
            _ => unit.scaled(1.0, number),
        }
    }

    /// A number in the unit of the file as one in some unit, to rounding.
    pub(super) fn in_unit(self, number: f64, unit: &Unit) -> f64 {
        match self {
            Self::Temperature => unit.reading(number),
            Self::Rate => unit.unscaled(3_600.0, number),
            _ => unit.unscaled(1.0, number),
        }
    }
}

/// The unit that is shown for a kind, and that counts where none is written; empty where there is none.
pub fn unit(kind: Kind, system: System) -> &'static str {
    match (kind, system) {
        (Kind::Length, System::Metric) => "mm",
        (Kind::Length, System::Us) => "in",
        (Kind::Temperature, System::Metric) => "°C",
        (Kind::Temperature | Kind::TemperatureDifference, System::Us) => "°F",
        (Kind::TemperatureDifference, System::Metric) => "K",
        (Kind::Duration, _) => "h",
        (Kind::Density, System::Metric) => "kg/m³",
        (Kind::Density, System::Us) => "lb/ft³",
        (Kind::HeatCapacity, System::Metric) => "J/kgK",
        (Kind::HeatCapacity, System::Us) => "Btu/lb °F",
        (Kind::Conductivity, System::Metric) => "W/mK",
        (Kind::Conductivity, System::Us) => "Btu/h ft °F",
        (Kind::Film, System::Metric) => "W/m²K",
        (Kind::Film, System::Us) => "Btu/h ft² °F",
        (Kind::Contact, System::Metric) => "m²K/W",
        (Kind::Contact, System::Us) => "h ft² °F/Btu",
        (Kind::Emissivity, _) => "",
        (Kind::HeatFlux, System::Metric) => "W/m²",
        (Kind::HeatFlux, System::Us) => "Btu/h ft²",
        (Kind::Rate, System::Metric) => "K/h",
        (Kind::Rate, System::Us) => "°F/h",
    }
}
