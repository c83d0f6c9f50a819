//! A liquid at rest: does it mix itself?

use super::numbers::diffusivity;

/// Standard acceleration of free fall, m/s². Source: 3rd General Conference on Weights and Measures, 1901.
pub const FREE_FALL: f64 = 9.806_65;

/// Below this Rayleigh number a still liquid layer conducts only. From memory of heat-transfer texts.
pub const CONDUCTS_BELOW: f64 = 1e3;

/// Above this Rayleigh number a liquid in a vessel has one temperature. Common practice, no source.
pub const MIXES_ABOVE: f64 = 1e5;

/// The numbers of a liquid that its motion depends on.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct Liquid {
    /// kg/m³
    pub density: f64,
    /// J/(kg K)
    pub heat_capacity: f64,
    /// W/(m K)
    pub conductivity: f64,
    /// Dynamic viscosity, Pa s.
    pub viscosity: f64,
    /// Expansion of the volume, 1/K; may be negative (water below 4 °C).
    pub expansion: f64,
}

impl Liquid {
    /// Prandtl number: viscosity over conduction.
    pub fn prandtl(&self) -> f64 {
        self.viscosity * self.heat_capacity / self.conductivity
    }

    /// Rayleigh number `g beta dT L³ / (nu alpha)`: buoyancy over viscosity and conduction.
    ///
    /// `length` m: the half width of a vessel cooled from its side, the height of a layer heated from below;
    /// `difference` K, of either sign.
    pub fn rayleigh(&self, length: f64, difference: f64) -> f64 {
        let viscosity = self.viscosity / self.density;
        let diffusivity = diffusivity(self.conductivity, self.density * self.heat_capacity);
        let buoyancy = FREE_FALL * (self.expansion * difference).abs();
        buoyancy * length * length * length / (viscosity * diffusivity)
    }
}

/// What becomes of a liquid left at rest.
#[derive(Clone, Copy, Debug, PartialEq, Eq)]
pub enum Mixing {
    /// Conduction holds.
    Conducts,
    /// Between the two.
    Between,
    /// Its own buoyancy keeps it at one temperature.
    Mixes,
}

impl Mixing {
    /// By the Rayleigh number.
    pub fn at(rayleigh: f64) -> Self {
        if rayleigh < CONDUCTS_BELOW {
            Self::Conducts
        } else if rayleigh <= MIXES_ABOVE {
            Self::Between
        } else {
            Self::Mixes
        }
    }

    /// What that means, as a sentence without full stop.
    pub fn words(self) -> &'static str {
        match self {
            Self::Conducts => "it lies still, and conduction alone holds",
            Self::Between => {
                "it moves a little: the truth lies between conduction alone and one temperature throughout"
            }
            Self::Mixes => "it mixes itself: one temperature throughout, with a film at the wall",
        }
    }
}

/// Nusselt number of a vertical plate, on its height. Holds for Rayleigh numbers from 0.1 to 1e12, within
/// about 20 % of measurements.
///
/// Source: Churchill and Chu 1975, Int. J. Heat Mass Transfer 18, 1323, equation 9.
pub fn churchill_chu(rayleigh: f64, prandtl: f64) -> f64 {
    let by_prandtl = libm::pow(1.0 + libm::pow(0.492 / prandtl, 9.0 / 16.0), 8.0 / 27.0);
    let root = 0.825 + 0.387 * libm::pow(rayleigh, 1.0 / 6.0) / by_prandtl;
    root * root
}

/// Film coefficient between a liquid at rest and an upright wall, W/(m² K): `height` of the wall m,
/// `difference` between liquid and wall K, the liquid's numbers at the mean of the two.
///
/// Source: [`churchill_chu`]; for vessels common practice.
pub fn natural_film(liquid: &Liquid, height: f64, difference: f64) -> f64 {
    let nusselt = churchill_chu(liquid.rayleigh(height, difference), liquid.prandtl());
    nusselt * liquid.conductivity / height
}

#[cfg(test)]
mod tests {
    use super::*;
    use approx::assert_relative_eq;

    /// Water at 60 °C. Source: IAPWS SR6-08 and formulation of 2011; expansion from its densities at 55 and 65.
    const WATER: Liquid = Liquid {
        density: 983.195,
        heat_capacity: 4184.9,
        conductivity: 0.651,
        viscosity: 4.6604e-4,
        expansion: 5.23e-4,
    };

    #[test]
    fn the_plate_formula_gives_the_values_of_an_independent_library() {
        // (Ra, Pr, Nu), computed with the open library ht 1.2.0; printed to six digits.
        let table = [
            (1e4, 0.71, 5.43275),
            (1e6, 0.71, 16.5584),
            (1e9, 0.71, 122.857),
            (1e11, 0.71, 525.67),
            (1e10, 7.0, 314.757),
            (1.8147e9, 0.69, 147.162),
        ];
        for (rayleigh, prandtl, nusselt) in table {
            assert_relative_eq!(churchill_chu(rayleigh, prandtl), nusselt, max_relative = 5e-6);
        }
    }

    #[test]
    fn air_beside_a_warm_plate_of_one_metre() {
        // Surface 60, air 20 °C: Ra 3.0583e9, film 4.7512 W/(m² K), from CoolProp 8 and ht; the property table
        // here is rounded to four digits, the Rayleigh number to about 1e-3.
        let air = Liquid {
            density: 1.1273,
            heat_capacity: 1007.0,
            conductivity: 0.027_354,
            viscosity: 1.9165e-5,
            expansion: 1.0 / 313.15,
        };
        assert_relative_eq!(air.rayleigh(1.0, 40.0), 3.0583e9, max_relative = 5e-3);
        assert_relative_eq!(natural_film(&air, 1.0, 40.0), 4.7512, max_relative = 3e-3);
    }

    #[test]
    fn water_in_a_vessel_mixes_itself_and_bitumen_in_a_pail_near_setting_does_not() {
        let rayleigh = WATER.rayleigh(0.4, 10.0);
        assert!(rayleigh > 1e9, "{rayleigh}");
        assert_eq!(Mixing::at(rayleigh), Mixing::Mixes);
        let bitumen = Liquid {
            density: 1000.0,
            heat_capacity: 2000.0,
            conductivity: 0.17,
            viscosity: 1000.0,
            expansion: 6e-4,
        };
        assert_eq!(Mixing::at(bitumen.rayleigh(0.05, 10.0)), Mixing::Conducts);
        assert_eq!(Mixing::at(3e4), Mixing::Between);
    }

    #[test]
    fn the_sign_of_the_difference_does_not_matter_for_an_upright_wall() {
        assert_relative_eq!(WATER.rayleigh(0.4, -10.0), WATER.rayleigh(0.4, 10.0));
    }
}
