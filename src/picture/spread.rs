//! Labels in one row or column: each as near to its place as it goes without touching its neighbours.

/// Middles of labels that want to stand at `places` (ascending) and take up `sizes`, between `low` and `high`.
///
/// The sum of the squares of the shifts is the least possible within the order given (pooling of neighbours that
/// push each other). Where they do not all fit they begin at `low` and run over `high`; see [`fits`].
pub fn spread(places: &[f64], sizes: &[f64], low: f64, high: f64) -> Vec<f64> {
    // Without the sizes of those before it, a label only has to keep its order.
    let mut before = 0.0;
    let offsets: Vec<f64> = sizes
        .iter()
        .map(|size| {
            let middle = before + 0.5 * size;
            before += size;
            middle
        })
        .collect();
    let room = (high - before).max(low);
    ordered(places.iter().zip(&offsets).map(|(place, offset)| place - offset))
        .into_iter()
        .zip(&offsets)
        .map(|(begin, offset)| begin.clamp(low, room) + offset)
        .collect()
}

/// Do labels of these sizes fit side by side between `low` and `high`?
pub fn fits(sizes: &[f64], low: f64, high: f64) -> bool {
    sizes.iter().sum::<f64>() <= high - low
}

/// The nearest sequence that never falls, by least squares.
fn ordered(values: impl Iterator<Item = f64>) -> Vec<f64> {
    // (mean, how many)
    let mut pools: Vec<(f64, usize)> = Vec::new();
    for value in values {
        let mut pool = (value, 1);
        while let Some(&(mean, count)) = pools.last() {
            if mean <= pool.0 {
                break;
            }
            let all = count + pool.1;
            pool = ((mean * count as f64 + pool.0 * pool.1 as f64) / all as f64, all);
            pools.pop();
        }
        pools.push(pool);
    }
    pools.iter().flat_map(|&(mean, count)| std::iter::repeat_n(mean, count)).collect()
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn labels_that_have_room_stay_where_they_want_to_be() {
        assert_eq!(spread(&[10.0, 30.0, 70.0], &[10.0; 3], 0.0, 100.0), [10.0, 30.0, 70.0]);
    }

    #[test]
    fn labels_that_crowd_give_way_evenly_and_stay_inside() {
        assert_eq!(spread(&[50.0, 50.0], &[10.0, 10.0], 0.0, 100.0), [45.0, 55.0]);
        assert_eq!(spread(&[0.0, 1.0, 99.0], &[10.0, 20.0, 10.0], 0.0, 100.0), [5.0, 20.0, 95.0]);
    }

    #[test]
    fn whatever_fits_neither_touches_nor_leaves() {
        // A small generator of numbers, so that every run sees the same.
        let mut state = 1_u64;
        let mut random = move || {
            state = state.wrapping_mul(6_364_136_223_846_793_005).wrapping_add(1_442_695_040_888_963_407);
            (state >> 40) as f64 / f64::from(1 << 24)
        };
        for _ in 0..2_000 {
            #[allow(clippy::cast_possible_truncation, clippy::cast_sign_loss, reason = "0 to 11")]
            let count = 1 + (random() * 12.0).floor() as usize;
            let mut places: Vec<f64> = (0..count).map(|_| random() * 200.0).collect();
            places.sort_by(f64::total_cmp);
            let sizes: Vec<f64> = (0..count).map(|_| 2.0 + random() * 14.0).collect();
            let at = spread(&places, &sizes, 0.0, 200.0);
            assert!(fits(&sizes, 0.0, 200.0));
            for i in 0..count {
                assert!(at[i] - 0.5 * sizes[i] > -1e-9 && at[i] + 0.5 * sizes[i] < 200.0 + 1e-9);
                assert!(i == 0 || at[i] - at[i - 1] > 0.5 * (sizes[i] + sizes[i - 1]) - 1e-9);
            }
        }
    }
}
