use super::*;
use crate::units::celsius;
use approx::assert_relative_eq;
use std::collections::BTreeSet;

/// One row per material: id, °C, density, heat capacity, conductivity there. Values of the sources named in the
/// entries, as printed there or worked out by hand from their formulas.
const PRINTED: &[(&str, f64, f64, f64, f64)] = &[
    ("water", 60.0, 983.2, 4184.9, 0.65102),
    ("ice", -10.0, 918.17, 2023.1, 2.3),
    ("thermal-oil-mineral", 200.0, 764.79, 2765.3, 0.095205),
    ("vegetable-oil", 60.0, 900.54, 2055.3, 0.16351),
    ("bitumen-hot", 120.0, 960.6, 1982.0, 0.16),
    ("meg-50", 20.0, 1064.9, 3312.0, 0.38915),
    ("toluene", 20.0, 866.89, 1685.4, 0.13173),
    // 425 + 0.773*400 - 1.69e-3*400² + 2.22e-6*400³ and 54 - 0.0333*400
    ("steel-carbon", 400.0, 7850.0, 605.88, 40.68),
    // 450 + 0.28*500 - 2.91e-4*500² + 1.34e-7*500³ and 14.6 + 0.0127*500
    ("ss-304", 500.0, 7900.0, 534.0, 20.95),
    ("ss-316", 500.0, 8000.0, 534.0, 20.95),
    ("cast-iron", 20.0, 7500.0, 450.0, 50.0),
    ("aluminium-alloy", 20.0, 2800.0, 880.0, 160.0),
    ("copper", 20.0, 8900.0, 380.0, 380.0),
    ("mineral-wool-pipe", 150.0, 100.0, 1030.0, 0.053),
    ("glass-wool-board", 24.0, 160.0, 840.0, 0.036),
    ("calcium-silicate", 204.0, 240.0, 840.0, 0.079),
    ("pir", 24.0, 35.0, 1470.0, 0.0265),
    ("cellular-glass", 24.0, 130.0, 750.0, 0.048),
    ("ceramic-fibre-128", 1000.0, 128.0, 1130.0, 0.33),
    ("elastomeric-foam", 20.0, 70.0, 1500.0, 0.05),
    ("fireclay-brick", 800.0, 2150.0, 1021.0, 1.15),
    ("insul-brick-1260", 800.0, 490.0, 1002.0, 0.18),
    ("castable-dense-60", 800.0, 2450.0, 1060.0, 1.6),
    ("glass-soda", 20.0, 2500.0, 750.0, 1.0),
    ("glass-lining", 20.0, 2500.0, 800.0, 1.1),
    ("brick-common", 24.0, 1920.0, 800.0, 0.895),
    // 1.36 - 0.136*5 + 0.0057*25
    ("concrete-ec2-lower", 500.0, 2300.0, 1100.0, 0.8225),
    ("concrete-reinforced", 20.0, 2300.0, 1000.0, 2.3),
    ("soil-sand-gravel", 10.0, 1950.0, 1045.0, 2.0),
    ("pp", 20.0, 910.0, 1800.0, 0.22),
    ("pe-hd", 20.0, 980.0, 1800.0, 0.5),
    ("ptfe", 20.0, 2200.0, 1000.0, 0.25),
    ("timber-softwood", 20.0, 500.0, 1600.0, 0.13),
    ("sand-dry", 20.0, 1550.0, 800.0, 0.3),
    ("wood-pellets", 20.0, 680.0, 1300.0, 0.17),
    ("polymer-pellets-pe", 20.0, 570.0, 2100.0, 0.16),
    ("air", 300.0, 0.61565, 1045.1, 0.044418),
];

#[test]
fn every_material_has_the_values_of_its_source() {
    for &(id, at, density, heat_capacity, conductivity) in PRINTED {
        let material = material(id).expect(id);
        let t = kelvin(at);
        // Five digits are printed; steel's conductivity is a line drawn through a rounded corner.
        assert_relative_eq!(material.density.value(t), density, max_relative = 1e-5);
        assert_relative_eq!(material.heat_capacity.value(t), heat_capacity, max_relative = 1e-5);
        assert_relative_eq!(material.conductivity.value(t), conductivity, max_relative = 1e-5);
    }
    let printed: BTreeSet<&str> = PRINTED.iter().map(|row| row.0).collect();
    assert_eq!(printed, ids().collect(), "each material has its row above, and each row its material");
}

#[test]
fn ids_are_unique_and_every_material_is_found_by_its_own() {
    let all: Vec<&str> = ids().collect();
    assert!(all.len() >= 24);
    assert_eq!(all.iter().collect::<BTreeSet<_>>().len(), all.len());
    for one in materials() {
        assert_eq!(material(one.id).as_ref(), Some(&one));
    }
    assert!(material("unobtainium").is_none());
}

#[test]
fn every_property_is_positive_over_and_beyond_its_range() {
    for material in materials() {
        let (low, high) = material.range;
        assert!(low < high && celsius(low) >= -273.15, "{}", material.id);
        let laws = [&material.density, &material.heat_capacity, &material.conductivity];
        for law in laws.into_iter().chain(material.viscosity.as_ref()) {
            assert!(law.extent().0 > 0.0, "{}", material.id);
            for i in -20..=120 {
                let value = law.value(low + (high - low) * f64::from(i) / 100.0);
                assert!(value.is_finite() && value > 0.0, "{}", material.id);
            }
        }
    }
}

#[test]
fn every_material_says_where_it_comes_from_and_how_far_to_trust_it() {
    for material in materials() {
        let Spread { density, heat_capacity, conductivity } = material.spread_percent;
        for percent in [density, heat_capacity, conductivity] {
            assert!(percent > 0.0 && percent <= 50.0, "{}", material.id);
        }
        let status = ["(confirmed", "from memory", "computed"];
        assert!(status.iter().any(|word| material.source.contains(word)), "{}", material.id);
        assert!(!material.name.is_empty() && !material.group.is_empty(), "{}", material.id);
    }
}

#[test]
fn the_liquids_that_mix_themselves_know_their_viscosity_and_expansion() {
    let water = material("water").expect("water");
    let at = |law: &Option<Law>, celsius: f64| law.as_ref().expect("known").value(kelvin(celsius));
    assert_relative_eq!(at(&water.viscosity, 60.0), 4.6604e-4, max_relative = 1e-9);
    assert_relative_eq!(at(&water.expansion, 60.0), 5.2326e-4, max_relative = 1e-9);
    let oil = material("thermal-oil-mineral").expect("oil");
    assert_relative_eq!(at(&oil.viscosity, 100.0), 2.9e-3, max_relative = 1e-9);
    // 66.33 kg/m³ over 100 K on one side, 52.99 over 80 K on the other: both 0.663 per K.
    assert_relative_eq!(at(&oil.expansion, 100.0), 0.6627 / 831.12, max_relative = 1e-3);
    for id in ["meg-50", "toluene", "air"] {
        let material = material(id).expect(id);
        assert!(material.viscosity.is_some() && material.expansion.is_some(), "{id}");
    }
}

#[test]
fn expansion_worked_out_from_a_density_table_agrees_with_the_published_one() {
    let water = material("water").expect("water");
    let published = water.expansion.expect("published");
    let derived = Curve::ExpansionOf(&[(40.0, 992.22), (50.0, 988.03), (60.0, 983.2)]).law();
    // Second differences of a table every 10 K, rounded at the fifth digit: 1 %.
    assert_relative_eq!(derived.value(kelvin(50.0)), published.value(kelvin(50.0)), max_relative = 0.01);
}
