//! The page's side of the core: text in, plain objects out. No rule and no formula; it calls what the other
//! rooms have. Natively only what a field holds is built, for its tests.

#[cfg(target_arch = "wasm32")]
mod canvas;
#[cfg(target_arch = "wasm32")]
mod door;
mod entry;
