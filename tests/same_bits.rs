//! The answers of the native core, bit for bit, as the WebAssembly core must give them too.

mod bits;

/// A change of the numbers is meant to be seen: `STILLHEAT_KEEP_BITS=1 cargo test --test same_bits` keeps the new
/// ones, and the difference goes into the commit with its reason.
#[test]
fn answers_have_the_bits_that_were_kept() {
    let found = bits::fingerprints();
    if std::env::var_os("STILLHEAT_KEEP_BITS").is_some() {
        let file = concat!(env!("CARGO_MANIFEST_DIR"), "/tests/bits/kept.txt");
        std::fs::write(file, &found).expect("the file can be written");
        return;
    }
    assert_eq!(found, bits::KEPT);
}
