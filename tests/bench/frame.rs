//! A frame of many members for benchmarks: distinct loads, eight products, sections and periods as they come in
//! buildings. Everything in it is invented.

use std::fmt::Write;

/// Numbers that look random and are the same in every run.
pub struct Random(pub u64);

impl Random {
    pub fn below(&mut self, most: u64) -> u64 {
        self.0 ^= self.0 << 13;
        self.0 ^= self.0 >> 7;
        self.0 ^= self.0 << 17;
        self.0 % most
    }
}

const BEAMS: [&str; 12] = [
    "IPE 240",
    "IPE 270",
    "IPE 300",
    "IPE 330",
    "IPE 360",
    "IPE 400",
    "IPE 450",
    "HE 200 A",
    "HE 240 B",
    "HE 300 B",
    "UB 406x178x60",
    "UB 457x191x67",
];
const COLUMNS: [&str; 6] = [
    "HE 200 B",
    "HE 240 B",
    "HE 260 B",
    "HE 300 B",
    "UC 203x203x46",
    "UC 254x254x89",
];

/// A steelwork file of so many members, and its library.
pub fn frame(members: usize) -> (String, String) {
    let mut random = Random(0x5eed);
    let mut text = String::with_capacity(members * 250 + 1000);
    text.push_str("steelwork: 1\nproject: { name: Invented frame }\nlibraries: [frame.protection.yaml]\n");
    text.push_str("defaults: { steel: S355 }\ngroups:\n");
    for level in 0..8 {
        let period = [30, 60, 90, 120][level % 4];
        let _ = writeln!(text, "  level {level}: {{ period: {period} }}");
    }
    text.push_str("members:\n");
    for n in 0..members {
        let column = n % 5 == 4;
        let (role, section, exposure) = if column {
            ("column", COLUMNS[random.below(6) as usize], "all round")
        } else {
            ("beam", BEAMS[random.below(12) as usize], "three sides")
        };
        let _ = write!(
            text,
            "  - mark: M{n}\n    group: level {}\n    role: {role}\n    section: {section}\n    exposure: {exposure}\n",
            n % 8
        );
        if !column {
            text.push_str("    shielded by: slab\n");
        }
        let _ = writeln!(text, "    length: {}.{} m", 3 + random.below(6), random.below(10));
        // Columns by their force with buckling in fire, beams by their utilisation.
        let _ = if column {
            let force = 250_000 + random.below(450_000);
            writeln!(
                text,
                "    loading: {{ axial: {}.{:03} kN, buckling length: 2.1 m }}",
                force / 1000,
                force % 1000
            )
        } else {
            writeln!(
                text,
                "    loading: {{ utilisation: 0.{:06} }}",
                300_000 + random.below(350_000)
            )
        };
        let _ = write!(
            text,
            "    protection: {{ product: product {}{} }}\n    location: {{ level: {}, grid: {}/{} }}\n",
            n % 8,
            // As in every frame, some are not right yet.
            if n % 20 == 7 { ", thickness: 15" } else { "" },
            n % 8,
            char::from(b'A' + (n % 26) as u8),
            n % 40
        );
    }
    let mut library = "protection: 1\nproducts:\n".to_owned();
    for product in 0..8 {
        let kind = if product % 2 == 0 { "board" } else { "spray" };
        let _ = write!(
            library,
            "  product {product}:\n    kind: {kind}\n    method: constant properties\n    conductivity: 0.{}\n    specific heat: 1000\n    density: 700\n    thicknesses: [15, 20, 25, 30, 35, 40, 50]\n    assessed: {{ section factor: [40, 330], thickness: [15, 50], steel temperature: [350, 750], period: [30, 180], shapes: [open, hollow], orientation: [beam, column], fires: [standard] }}\n",
            13 + product
        );
    }
    (text, library)
}
