//! The same scenarios as WebAssembly: the answers must be those of the native core to the last bit.
//!
//! `tests/same_bits.rs` makes the fingerprints natively and holds them against the same file.

#![cfg(target_arch = "wasm32")]

#[path = "../tests/bits/mod.rs"]
mod bits;

use wasm_bindgen_test::wasm_bindgen_test;

#[wasm_bindgen_test]
fn answers_have_the_same_bits_as_natively() {
    assert_eq!(bits::fingerprints(), bits::KEPT);
}
