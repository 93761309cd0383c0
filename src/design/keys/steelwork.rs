//! Keys of a steelwork file outside its members.

use super::member::MEMBER;
use super::{Dimension, Key, Kind, NameOf, key, number, plain, required, temperature};

/// Methods that are read; each report prints the edition.
pub const METHODS: &[&str] = &["EN 1993-1-2:2005", "ASCE 29-05", "AS 4100:2020"];

/// The top level of a steelwork file.
pub const STEELWORK: &[Key] = &[
    required(
        "steelwork",
        Kind::Whole(1, 1),
        "Version of this format; makes the file a steelwork file.",
    ),
    key(
        "part of",
        Kind::Name(NameOf::File),
        "The head file of which this file is a part; the head lists it in `parts`.",
    ),
    key("project", Kind::Map(PROJECT), "What the papers are headed with."),
    key(
        "basis",
        Kind::Map(BASIS),
        "Method, units, rates and national choices; in the head file only.",
    ),
    key(
        "libraries",
        Kind::List(&Kind::Name(NameOf::File)),
        "Protection files, by relative path; in the head file only.",
    ),
    key(
        "parts",
        Kind::List(&Kind::Name(NameOf::File)),
        "Steelwork files that belong to this design, by relative path.",
    ),
    key(
        "fires",
        Kind::Named(&Kind::Map(FIRE)),
        "Fires beside the built-in standard, external, hydrocarbon and slow heating.",
    ),
    key(
        "defaults",
        Kind::Map(MEMBER),
        "Member keys that hold where neither member nor group says otherwise.",
    ),
    key(
        "groups",
        Kind::Named(&Kind::Map(MEMBER)),
        "Named sets of member keys; a member names one by `group`.",
    ),
    key("members", Kind::List(&Kind::Map(MEMBER)), "The members of the frame."),
];

/// Keys that only a head file may carry.
pub const HEAD_ONLY: &[&str] = &["project", "basis", "libraries", "parts", "fires", "defaults"];

/// `project`.
pub const PROJECT: &[Key] = &[
    key("name", Kind::Text, "Name of the project."),
    key("reference", Kind::Text, "Reference number or letters."),
    key("revision", Kind::Text, "Revision of the design."),
    key("status", Kind::Text, "Status, such as `for review`."),
    key("note", Kind::Text, "Any remark."),
];

/// `basis`.
pub const BASIS: &[Key] = &[
    key(
        "method",
        Kind::Text,
        "EN 1993-1-2:2005, ASCE 29-05 or AS 4100:2020; another edition is refused by name.",
    ),
    key(
        "units",
        Kind::Choice(&["metric", "imperial"]),
        "What reports and the editor show.",
    ),
    key("currency", Kind::Text, "Currency of the prices, a word or code."),
    key(
        "rates",
        Kind::Map(RATES),
        "Without them no cost and no carbon is claimed.",
    ),
    key(
        "default critical temperature",
        temperature("a critical temperature", 300.0, 1000.0),
        "For beams restrained by a slab, and ties, that state neither loading nor a temperature; all others are then not verified.",
    ),
    key("factors", Kind::Map(FACTORS), "Partial factors, national choices."),
    key(
        "yield from",
        Kind::Choice(&["EN 1993-1-1 Table 3.1", "EN 10025"]),
        "Where the yield strength by thickness is read.",
    ),
    key(
        "section tables",
        Kind::List(&Kind::Choice(&["EU", "UK", "US", "CA", "AU", "IN"])),
        "The section tables that designations are looked up in; all of them unless stated.",
    ),
    key(
        "hollow",
        Kind::Choice(&["hot finished", "cold formed"]),
        "The finish of hollow sections whose designation does not say.",
    ),
];

/// `basis: rates`.
pub const RATES: &[Key] = &[
    key(
        "steel",
        plain("a price per kg", 0.0, 1e6),
        "Price of steel, per kg erected.",
    ),
    key(
        "carbon",
        plain("a carbon factor", 0.0, 100.0),
        "Carbon of steel, kg CO2e per kg.",
    ),
];

/// `basis: factors`.
pub const FACTORS: &[Key] = &[
    key(
        "gamma M fi",
        plain("a partial factor", 0.5, 2.0),
        "Partial factor of resistance in fire, 1.0.",
    ),
    key(
        "gamma M0",
        plain("a partial factor", 0.5, 2.0),
        "Partial factor of resistance at normal temperature, 1.0.",
    ),
    key(
        "permanent",
        plain("a partial factor", 0.5, 3.0),
        "Partial factor of permanent actions, 1.35.",
    ),
    key(
        "variable",
        plain("a partial factor", 0.5, 3.0),
        "Partial factor of variable actions, 1.5.",
    ),
    key(
        "xi",
        plain("a reduction factor", 0.5, 1.0),
        "Reduction factor of permanent actions in (6.10b), 1.0.",
    ),
];

/// A fire of the file's own.
pub const FIRE: &[Key] = &[
    required(
        "kind",
        Kind::Choice(&["parametric", "points"]),
        "Parametric (EN 1991-1-2 Annex A) or given points.",
    ),
    key(
        "opening factor",
        number("an opening factor", Dimension::OpeningFactor, "m½", 1e-4, 10.0),
        "O, the opening factor.",
    ),
    key(
        "fire load",
        number("a fire load density", Dimension::FireLoad, "MJ/m2", 1.0, 1e5),
        "qf,d per floor area, factors included.",
    ),
    key(
        "thermal inertia",
        number("a thermal inertia", Dimension::ThermalInertia, "J/m2s1/2K", 1.0, 1e5),
        "b of the enclosure.",
    ),
    key(
        "floor area",
        number("a floor area", Dimension::FloorArea, "m2", 0.1, 1e6),
        "Floor area Af.",
    ),
    key(
        "enclosure area",
        number("an enclosure area", Dimension::FloorArea, "m2", 0.1, 1e7),
        "Total area At of the enclosure, openings included.",
    ),
    key(
        "growth",
        Kind::Choice(&["slow", "medium", "fast"]),
        "Fire growth rate, which sets tlim.",
    ),
    key(
        "height",
        number("a height", Dimension::Length, "m", 0.1, 1000.0),
        "Height of the compartment.",
    ),
    key(
        "roof openings",
        Kind::YesNo,
        "Whether the roof has openings; Annex A does not cover them.",
    ),
    key(
        "points",
        Kind::List(&Kind::Tuple(&plain("a number", -300.0, 1e5), 2)),
        "Gas temperature over time: pairs of minutes and °C.",
    ),
    key(
        "convection",
        number(
            "a coefficient of heat transfer",
            Dimension::HeatTransfer,
            "W/m2K",
            0.1,
            1000.0,
        ),
        "Coefficient of heat transfer by convection, 35 unless given.",
    ),
    key("note", Kind::Text, "Any remark."),
];
