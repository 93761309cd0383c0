//! The cases: members in one line each (which are also proved in block style), members in block style, or whole files.

/// The texts of each finding that has a fix. All fixes of its first occurrence are made, each by itself.
pub const CASES: &[(&str, &[&str])] = &[
    (
        "unreadable-yaml",
        &[
            "- mark: B1\n\tsection: HE 300 B\n  protection: grey board",
            "- mark: B1\n  section:HE 300 B\n  protection: grey board",
            "- mark: B1\n   section: HE 300 B\n  protection: grey board",
            "- mark: B1\n  section: HE 300 B\n  protection grey board",
            "- mark: B1\n  section: HE 300 B\n  protection: [grey board",
            "- { mark: B1, section: HE 300 B, protection: grey board",
            "- { mark: B1, section: HE 300 B, protection: grey board ]",
            "- { mark: B1, section: HE 300 B protection: grey board }",
            "-{ mark: B1, section: HE 300 B, protection: grey board }",
            "- mark: B1\n  section: \"HE 300 B\n  protection: grey board",
            "- mark: B1\n  section: HE 300 B\n  note: see: below\n  protection: grey board",
            "- mark: B1\n  section: HE 300 B\n  note: @once\n  protection: grey board",
            "- mark: B1\n  section: HE 300 B\n  note: \"a \\w\"\n  protection: grey board",
        ],
    ),
    (
        "unknown-key",
        &[
            "- { mark: B1, secton: HE 300 B, protection: grey board }",
            "- { mark: B1, section: HE 300 B, length 7.5, protection: grey board }   # a key only in flow style",
            "- { mark: B1, section: HE 300 B, protection: { product: grey board, thicknes: 15 } }",
            "- { mark: B1, section: HE 300 B, protection: grey board, location: { levle: 2 } }",
            "- { mark: B1, \"secton\": HE 300 B, protection: grey board }",
        ],
    ),
    (
        "wrong-kind",
        &[
            "- { mark: B1, section: HE 300 B, protection: grey board, length: 7,5 }",
            "- { mark: B1, section: HE 300 B, protection: grey board, role: beem }",
            "- { mark: B1, section: HE 300 B, protection: { product: grey board, form: bx } }",
            "- { mark: B1, section: HE 300 B, protection: grey board, exposure: tree sides, shielded by: slab }",
            "- { mark: B1, section: HE 300 B, protection: grey board, exposure: three sides, shielded by: slap }",
            "- { mark: B1, section: HE 300 B, protection: grey board, environment: internl dry }",
        ],
    ),
    (
        "wrong-unit",
        &[
            "- { mark: B1, section: HE 300 B, protection: grey board, length: 20 min }",
            "- { mark: B1, section: HE 300 B, protection: { product: grey board, thickness: 15 m2 } }",
            "- { mark: B1, section: HE 300 B, protection: grey board, period: 30 mm }",
            "- { mark: B1, section: HE 300 B, protection: grey board, period: \"30 mm\" }",
        ],
    ),
    (
        "unknown-section",
        &[
            "- { mark: B1, section: HE 301 B, protection: grey board }",
            "- { mark: B1, section: 'HE 301 B', protection: grey board }",
            "- { mark: B1, section: UC 305x305x98, protection: grey board }",
        ],
    ),
    (
        "ambiguous-section",
        &["- { mark: B1, section: SHS 150x150x8, protection: grey board }"],
    ),
    (
        "unknown-product",
        &[
            "- { mark: B1, section: HE 300 B, protection: gray board }",
            "- { mark: B1, section: HE 300 B, protection: { product: gray board } }",
        ],
    ),
    (
        "unknown-group",
        &[
            "- { mark: B1, group: flors, section: HE 300 B, protection: { product: grey board, thickness: 25 } }",
            "- { mark: B1, group: odd nam, section: HE 300 B }",
            "- { mark: B1, group: 'odd; name', section: HE 300 B }",
        ],
    ),
    (
        "unknown-steel",
        &["- { mark: B1, section: HE 300 B, steel: S350, protection: grey board }"],
    ),
    (
        "unknown-fire",
        &[
            "- { mark: B1, section: HE 300 B, fire: standart, protection: grey board }",
            "steelwork: 1
libraries: [demo.protection.yaml]
fires:
  'plant: room, 1': { kind: points, points: [[0, 20], [30, 300], [90, 200]] }
defaults: { role: beam, steel: S355, period: 30, critical temperature: 550 }
members:
  - { mark: B1, section: HE 300 B, fire: plant room 1 }
",
        ],
    ),
    (
        "unknown-mark",
        &[
            "- { mark: B1, section: HE 300 B, protection: grey board, supported by: [Z11] }",
            "- { mark: B1, section: HE 300 B, protection: grey board, supported by: Z11 }",
            "- { mark: B1, section: HE 300 B, protection: grey board, steadies: ['Z11'] }",
        ],
    ),
    (
        "method-not-supported",
        &["steelwork: 1
basis: { method: \"EN 1993-1-2:1995\" }
libraries: [demo.protection.yaml]
defaults: { role: beam, steel: S355, period: 30, critical temperature: 550 }
members:
  - { mark: B1, section: HE 300 B, protection: grey board }
"],
    ),
    (
        "too-slender-to-protect",
        &[
            "- { mark: B1, section: IPE 80, period: 120, protection: white spray }",
            "- { mark: B1, section: 'IPE 80', period: 120, protection: white spray }",
            "- { mark: B1, group: slender }",
            "- { mark: B1, section: IPE 140, period: 60, protection: red film }",
            "- { mark: B1, section: IPE 80, period: 90, exposure: three sides, shielded by: slab, protection: white spray }",
        ],
    ),
    (
        "protection-too-thin",
        &[
            "- { mark: B1, section: IPE 200, period: 90, protection: { product: grey board, thickness: 15 } }",
            "- { mark: B1, section: IPE 200, period: 90, protection: { product: grey board, thickness: 15 mm } }",
            "- { mark: B1, section: IPE 200, period: 120, protection: { product: grey board, thickness: 15, layers: 2 } }",
            "- { mark: B1, section: IPE 200, period: 120, protection: { product: grey board, thickness: [15, 15] } }",
            "- { mark: B1, section: IPE 200, period: 90, protection: { product: white spray, thickness: 10 } }",
            "- { mark: B1, section: HE 300 B, period: 60, protection: { product: red film, dft: 200 } }",
            "- { mark: B1, group: floors }",
            "- { group: floors, mark: B1 }",
            "- { mark: B1, group: layered }",
        ],
    ),
    (
        "protection-over-thick",
        &[
            "- { mark: B1, section: HE 300 B, protection: { product: grey board, thickness: 30 } }",
            "- { mark: B1, section: HE 300 B, protection: { product: grey board, thickness: 15, layers: 2 } }",
            "- { mark: B1, group: floors, section: HE 300 B, period: 30, protection: { product: grey board, thickness: [20, 15] } }",
        ],
    ),
    (
        "profile-board",
        &[
            "- { mark: B1, section: HE 300 B, protection: { product: grey board, form: profile } }",
            "- { mark: B1, group: followed }",
        ],
    ),
    (
        "critical-temperature-too-high",
        &[
            "- { mark: B1, section: HE 300 B, critical temperature: 650, loading: { utilisation: 0.6 }, protection: grey board }",
            "- { mark: B1, section: HE 300 B, critical temperature: { value: 650, by: checker, status: approved }, loading: { utilisation: 0.6 }, protection: grey board }",
            "- { mark: B1, section: HE 300 B, loading: { utilisation: 0.75 }, protection: grey board }",
        ],
    ),
];
