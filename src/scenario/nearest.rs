//! The known word nearest to one that is not known.

/// The nearest of the known words, if one is near: at most a third of its letters differ, or it begins so.
pub fn nearest<'a>(found: &str, known: impl IntoIterator<Item = &'a str>) -> Option<&'a str> {
    let found = found.to_lowercase();
    let known: Vec<&str> = known.into_iter().collect();
    let distances = known.iter().map(|word| (distance(&found, &word.to_lowercase()), *word));
    let (distance, word) = distances.min_by_key(|pair| pair.0)?;
    if distance <= word.chars().count() / 3 + 1 {
        return Some(word);
    }
    // A beginning says enough: "film" for "film_w_per_m2_k".
    known.into_iter().find(|word| found.chars().count() >= 3 && word.starts_with(&found))
}

/// Letters to insert, remove or replace (Levenshtein 1966); long words are compared by their beginning.
fn distance(a: &str, b: &str) -> usize {
    let (a, b): (Vec<char>, Vec<char>) = (a.chars().take(64).collect(), b.chars().take(64).collect());
    let mut row: Vec<usize> = (0..=b.len()).collect();
    for (i, from) in a.iter().enumerate() {
        let mut diagonal = row[0];
        row[0] = i + 1;
        for (j, to) in b.iter().enumerate() {
            let replaced = diagonal + usize::from(from != to);
            diagonal = row[j + 1];
            row[j + 1] = replaced.min(row[j] + 1).min(diagonal + 1);
        }
    }
    row[b.len()]
}

#[cfg(test)]
mod tests {
    use super::nearest;

    #[test]
    fn a_slip_finds_its_word_and_nonsense_finds_none() {
        let known = ["thickness_m", "material", "motion"];
        assert_eq!(nearest("thicknes_m", known), Some("thickness_m"));
        assert_eq!(nearest("thickness", known), Some("thickness_m"));
        assert_eq!(nearest("Material", known), Some("material"));
        assert_eq!(nearest("mat", known), Some("material"));
        assert_eq!(nearest("colour", known), None);
    }
}
