//! The columns that section and profile have in common.

/// One layer with the temperatures in it.
#[derive(Clone, Copy, Debug, PartialEq)]
pub struct LayerColumns<'a> {
    /// What people call it.
    pub name: &'a str,
    /// Its thickness, in the unit of `places`.
    pub thickness: f64,
    /// Its thickness in words, "400 mm".
    pub thickness_words: &'a str,
    /// Distances from the inside of the item, ascending, from its inner to its outer side; of a mixed layer any
    /// one place will do.
    pub places: &'a [f64],
    /// As many temperatures.
    pub temperatures: &'a [f64],
}

impl LayerColumns<'_> {
    /// Temperature at its inner side; NaN where there is none.
    pub fn inside(&self) -> f64 {
        self.temperatures.first().copied().unwrap_or(f64::NAN)
    }

    /// Temperature at its outer side; NaN where there is none.
    pub fn outside(&self) -> f64 {
        self.temperatures.last().copied().unwrap_or(f64::NAN)
    }

    /// Places and temperatures, without what is no number; held to the sides of the layer.
    pub fn points(&self, begin: f64) -> impl Iterator<Item = (f64, f64)> {
        let end = begin + self.thickness;
        self.places
            .iter()
            .zip(self.temperatures)
            .map(move |(place, temperature)| (place.min(end).max(begin), *temperature))
            .filter(|(place, temperature)| place.is_finite() && temperature.is_finite())
    }
}

/// Where each layer begins, and where the last one ends.
pub fn sides(layers: &[LayerColumns]) -> Vec<f64> {
    let mut sides = vec![0.0];
    let mut reached = 0.0;
    for layer in layers {
        reached += layer.thickness;
        sides.push(reached);
    }
    sides
}
