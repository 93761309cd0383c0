//! What designations are found to mean.

use std::collections::HashMap;

use super::*;

fn found(text: &str) -> &'static str {
    match find(text, &LookupOptions::default()) {
        Lookup::Found(row) => &row.designation,
        other => panic!("{text}: {}", show(&other)),
    }
}

fn show(lookup: &Lookup) -> String {
    let names = |rows: &[&'static CatalogueRow]| {
        let names: Vec<_> = rows
            .iter()
            .map(|row| format!("{} {}", row.table, row.designation))
            .collect();
        names.join(", ")
    };
    match lookup {
        Lookup::Found(row) => row.designation.to_string(),
        Lookup::Ambiguous(rows) => format!("ambiguous: {}", names(rows)),
        Lookup::Unknown { nearest } => format!("unknown: {}", names(nearest)),
    }
}

fn lookup(text: &str) -> String {
    show(&find(text, &LookupOptions::default()))
}

#[test]
fn no_line_of_a_table_is_lost() {
    let kept: Vec<_> = rows().iter().map(|row| row.designation.to_string()).collect();
    let lost: Vec<_> = read::designations()
        .into_iter()
        .filter(|name| !kept.contains(name))
        .collect();
    assert!(lost.is_empty(), "{lost:?}");
    assert_eq!(rows().len(), 4706);
}

#[test]
fn every_row_is_found_by_its_own_designation() {
    for row in rows() {
        let options = LookupOptions {
            tables: Some(vec![row.table]),
            hollow: row.finish,
        };
        match find(&row.designation, &options) {
            Lookup::Found(found) => assert_eq!((found.table, &found.designation), (row.table, &row.designation)),
            other => panic!("{}: {}", row.designation, show(&other)),
        }
    }
}

#[test]
fn every_row_is_sane() {
    for row in rows() {
        let (g, p) = (row.geometry(), row.properties().unwrap());
        let (h, b) = (g.height.unwrap().mm(), g.width.unwrap().mm());
        assert!(g.area.mm2() > 50.0 && g.area.mm2() < h * b, "{}", row.designation);
        assert!(g.perimeter.mm() < 4.0 * (h + b), "{}", row.designation);
        assert!(p.iv_mm4 > 0.0 && p.radius_y().mm() < h, "{}", row.designation);
        let factor = g.perimeter.mm() / g.area.mm2() * 1e3;
        assert!(factor > 5.0 && factor < 1300.0, "{} {factor}", row.designation);
    }
}

/// No two rows of one table and finish answer to the same key, so that a table and a finish always settle it.
#[test]
fn tables_do_not_contradict_themselves() {
    let mut seen: HashMap<(Table, Option<Finish>, String), &str> = HashMap::new();
    for row in rows() {
        let key = key::Key::of(&row.designation).unwrap().index();
        if let Some(other) = seen.insert((row.table, row.finish, key), &row.designation) {
            panic!("{other} and {}", row.designation);
        }
    }
}

#[test]
fn forgiving_ways_of_writing() {
    for (text, designation) in [
        ("HEB240", "HE 240 B"),
        ("he 240 b", "HE 240 B"),
        ("HEB 240", "HE 240 B"),
        ("240 HEB", "HE 240 B"),
        ("IPE300", "IPE 300"),
        ("ipe o 300", "IPE O 300"),
        ("IPEO300", "IPE O 300"),
        ("w14 x 90", "W14X90"),
        ("W14*90", "W14X90"),
        ("305x305x97 UC", "UC 305x305x97"),
        ("UC305×305×97", "UC 305x305x97"),
        ("UKC 305x305x97", "UC 305x305x97"),
        ("UKB 533x210x82", "UB 533x210x82"),
        ("CHS 168.3x10", "CHS 168.3x10"),
        ("CHS 168,3 x 10,0", "CHS 168.3x10"),
        ("L 100x100x10", "L 100x100x10"),
        ("L100x10", "L 100x100x10"),
        ("RSA 100x100x10", "L 100x100x10"),
        ("UNP 200", "UPN 200"),
        ("U 200", "UPN 200"),
        ("INP 300", "IPN 300"),
        ("610 UB 125", "610UB125"),
        ("530UB82", "530UB82.0"),
        ("L6X4X1/2", "L6X4X1/2"),
        ("l 5 x 3-1/2 x 3/8", "L5X3-1/2X3/8"),
        ("HSS8x8x.500", "HSS8X8X1/2"),
        ("HSS 6.625 x 0.28", "HSS6.625X0.280"),
        ("HSS203x102x9.5", "HS203x102x9.5"),
        ("pipe 8 std", "Pipe8STD"),
        ("SHS HF 150x150x8", "SHS HF 150x150x8"),
        ("150x150x8 SHS hot finished", "SHS HF 150x150x8"),
        ("SHS HF 150x8", "SHS HF 150x150x8"),
        ("RHS HF 150x150x8", "SHS HF 150x150x8"),
        ("RHS CF 200x100x6", "RHS CF 200x100x6"),
        ("ISMB 300", "ISMB 300"),
        ("ISMC 250 x 34.2", "ISMC 250 (heavy, 34.2 kg/m)"),
        ("ISA 100x100x10", "ISA 100 x 100 x 10"),
    ] {
        assert_eq!(found(text), designation, "{text}");
    }
}

#[test]
fn several_answers_are_never_picked_from() {
    assert_eq!(
        lookup("SHS 150x150x8"),
        "ambiguous: EU SHS HF 150x150x8, EU SHS CF 150x150x8, AU 150x8SHS"
    );
    assert!(lookup("HP 360x174").starts_with("ambiguous: EU HP 360x174, CA HP360x174"));
    let settled = |tables: Option<Vec<Table>>, hollow| show(&find("SHS 150x150x8", &LookupOptions { tables, hollow }));
    assert_eq!(settled(None, Some(Finish::HotFinished)), "SHS HF 150x150x8");
    // The European and the Australian cold formed one are the same to the last dimension.
    assert_eq!(settled(None, Some(Finish::ColdFormed)), "SHS CF 150x150x8");
    assert_eq!(settled(Some(vec![Table::AU]), None), "150x8SHS");
    assert!(settled(Some(vec![Table::EU, Table::UK]), None).starts_with("ambiguous"));
    // A preference that fits no candidate settles nothing.
    assert!(settled(Some(vec![Table::US]), None).starts_with("ambiguous"));
    // A finish that is named must be met.
    assert!(lookup("SHS HF 20x20x2").starts_with("unknown"));
}

#[test]
fn numbers_alone_are_no_section() {
    for text in [
        "305x305x97",
        "300",
        "",
        "  ",
        "beam",
        "W14X90X1X2",
        "IPE",
        "ipe 3000000000",
        "🔥 12",
        "x",
    ] {
        assert!(lookup(text).starts_with("unknown"), "{text}: {}", lookup(text));
    }
    assert!(lookup("305x305x97").contains("UC 305x305x97"));
}

#[test]
fn the_nearest_are_named() {
    for (text, nearest) in [
        ("IPE 310", "EU IPE 300"),
        ("HEB 250", "EU HE 240 B"),
        ("W14X91", "US W14X90"),
        ("UB 533x210x83", "UK UB 533x210x82"),
        ("IEP 300", "EU IPE 300"),
        ("CHS 168.3x11", "EU CHS 168.3x10"),
        ("SHS HF 150x150x9", "EU SHS HF 150x150x8"),
    ] {
        let Lookup::Unknown { nearest: rows } = find(text, &LookupOptions::default()) else {
            panic!("{text} is found");
        };
        let names: Vec<_> = rows
            .iter()
            .map(|row| format!("{} {}", row.table, row.designation))
            .collect();
        assert!(
            names.len() <= 5 && names.contains(&nearest.to_owned()),
            "{text}: {names:?}"
        );
    }
    assert_eq!(lookup("nothing at all like a section"), "unknown: ");
    assert_eq!(lookup(&"IPE 300 ".repeat(1000)), "unknown: ");
}

#[test]
fn a_family_goes_from_light_to_heavy() {
    let Lookup::Found(row) = find("HE 240 B", &LookupOptions::default()) else {
        panic!("HE 240 B is found");
    };
    let family = family_neighbours(row);
    assert_eq!(family.len(), 24);
    assert_eq!(&*family[0].designation, "HE 100 B");
    assert!(family.windows(2).all(|pair| pair[0].mass <= pair[1].mass));
}
