//! The built-in scenario: an invented building with invented products.

/// The files of the scenario by name, the head first.
pub const FILES: &[(&str, &str)] = &[
    ("mill.steelwork.yaml", include_str!("mill.steelwork.yaml")),
    ("roof.steelwork.yaml", include_str!("roof.steelwork.yaml")),
    ("plant.steelwork.yaml", include_str!("plant.steelwork.yaml")),
    ("demo.protection.yaml", include_str!("demo.protection.yaml")),
];
