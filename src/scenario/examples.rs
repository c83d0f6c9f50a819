//! Scenarios to start from. Each is a situation of our own and part of the tests.

/// A scenario to start from.
#[derive(Clone, Copy, Debug)]
pub struct Example {
    /// Its name in files and addresses.
    pub id: &'static str,
    /// What it is called.
    pub title: &'static str,
    /// The file.
    pub text: &'static str,
}

/// All of them; the first is shown at the first opening.
pub fn examples() -> &'static [Example] {
    &[
        Example {
            id: "wash-vessel",
            title: "Wash vessel, weekend stop",
            text: include_str!("examples/wash-vessel.json"),
        },
        Example {
            id: "furnace-wall",
            title: "Lined furnace, burner off, fan later",
            text: include_str!("examples/furnace-wall.json"),
        },
        Example {
            id: "bitumen-drum",
            title: "Drum of bitumen in the yard",
            text: include_str!("examples/bitumen-drum.json"),
        },
        Example {
            id: "quenched-block",
            title: "Moulded block: water bath, then air",
            text: include_str!("examples/quenched-block.json"),
        },
    ]
}
