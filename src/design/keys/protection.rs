//! Keys of a protection file.

use super::{Dimension, Key, Kind, Measure, NameOf, key, measure, number, plain, required, temperature};

/// The kinds of product.
pub const KINDS: &[&str] = &["board", "spray", "coating", "concrete"];
/// How a product was assessed.
pub const METHODS: &[&str] = &["constant properties", "assessed table", "regression"];
/// The shapes that an assessed table may be for.
pub const TABLE_SHAPES: &[&str] = &["open", "rectangular hollow", "circular hollow", "cellular", "solid"];

const CONDUCTIVITY: Kind = number("a thermal conductivity", Dimension::Conductivity, "W/mK", 0.001, 100.0);
const THICKNESS: Kind = number("a thickness", Dimension::Length, "mm", 0.01, 1000.0);
const FILM: Kind = number("a dry film thickness", Dimension::Length, "µm", 1.0, 50_000.0);
const FACTOR: Measure = measure("a section factor", Dimension::SectionFactor, "1/m", 0.1, 5000.0);
const STEEL_TEMPERATURE: Kind = temperature("a steel temperature", 100.0, 1200.0);
const GAS: Measure = measure("a temperature", Dimension::Temperature, "°C", 0.0, 1500.0);

/// The top level of a protection file.
pub const PROTECTION_FILE: &[Key] = &[
    required(
        "protection",
        Kind::Whole(1, 1),
        "Version of this format; makes the file a protection file.",
    ),
    key("products", Kind::Named(&Kind::Map(PRODUCT)), "Products by name."),
    key("note", Kind::Text, "Any remark."),
];

/// A product.
pub const PRODUCT: &[Key] = &[
    required("kind", Kind::Choice(KINDS), "board, spray, coating or concrete."),
    required("method", Kind::Choice(METHODS), "How the thickness is found."),
    key(
        "conductivity",
        Kind::OneOf(&[CONDUCTIVITY, Kind::Numbered(GAS, &CONDUCTIVITY)]),
        "Thermal conductivity, a number or a table over temperature.",
    ),
    key(
        "specific heat",
        number("a specific heat", Dimension::SpecificHeat, "J/kgK", 1.0, 20_000.0),
        "Specific heat.",
    ),
    key(
        "density",
        number("a density", Dimension::Density, "kg/m3", 1.0, 10_000.0),
        "Density.",
    ),
    key(
        "moisture",
        number("a moisture content", Dimension::Percent, "%", 0.0, 100.0),
        "Moisture by mass; used only with `moisture delay: yes`.",
    ),
    key(
        "moisture delay",
        Kind::YesNo,
        "Whether the moisture's delay is counted; mostly the assessed conductivity holds it.",
    ),
    key(
        "coefficients",
        Kind::Tuple(&plain("a coefficient", -1e9, 1e9), 8),
        "a0 to a7 of the regression, from the assessment report.",
    ),
    key("tables", Kind::List(&Kind::Map(TABLE)), "Assessed tables of a coating."),
    key(
        "between",
        Kind::Choice(&["interpolate", "next"]),
        "Between entries: interpolate linearly, or the next more onerous one (default).",
    ),
    key("thicknesses", Kind::List(&THICKNESS), "Stock thicknesses."),
    key(
        "round to",
        THICKNESS,
        "Step of the thickness where there is no stock: 1 mm, 50 µm for films.",
    ),
    key("most layers", Kind::Whole(1, 20), "Most layers that were assessed."),
    key(
        "environment",
        Kind::Choice(super::member::ENVIRONMENTS),
        "The environment a coating may serve in.",
    ),
    key(
        "volume solids",
        number("a share in percent", Dimension::Percent, "%", 1.0, 100.0),
        "Volume solids of a coating.",
    ),
    key("maximum dft per coat", FILM, "Greatest dry film of one coat."),
    key("loss factor", Kind::Map(LOSS), "Loss in application."),
    key(
        "assessed",
        Kind::Map(ASSESSED),
        "The range that was assessed; nothing is claimed outside it.",
    ),
    key("price", Kind::Map(PRICE), "Price of the protection in place."),
    key(
        "carbon",
        plain("a carbon factor", 0.0, 1000.0),
        "kg CO2e per kg of product.",
    ),
    key("evidence", Kind::Map(EVIDENCE), "The report that the data comes from."),
    key("note", Kind::Text, "Any remark."),
];

/// An assessed table.
pub const TABLE: &[Key] = &[
    required("period", Kind::Period, "The period that the table is for."),
    key(
        "shape",
        Kind::Choice(TABLE_SHAPES),
        "The shape of section, open unless stated.",
    ),
    key("sides", Kind::Whole(3, 4), "3 or 4 sides exposed; 4 unless stated."),
    required(
        "steel temperature",
        Kind::List(&STEEL_TEMPERATURE),
        "Critical temperatures of the columns.",
    ),
    required(
        "rows",
        Kind::Numbered(FACTOR, &Kind::List(&Kind::OneOf(&[FILM, Kind::Blank]))),
        "Dry films by section factor; `~` where it is not attained.",
    ),
];

/// `assessed`.
pub const ASSESSED: &[Key] = &[
    key(
        "section factor",
        Kind::Tuple(&Kind::Number(FACTOR), 2),
        "Least and greatest section factor.",
    ),
    key("thickness", Kind::Tuple(&THICKNESS, 2), "Least and greatest thickness."),
    key("dft", Kind::Tuple(&FILM, 2), "Least and greatest dry film."),
    key(
        "steel temperature",
        Kind::Tuple(&STEEL_TEMPERATURE, 2),
        "Least and greatest steel temperature.",
    ),
    key("period", Kind::Tuple(&Kind::Period, 2), "Shortest and longest period."),
    key(
        "shapes",
        Kind::List(&Kind::Choice(&[
            "open",
            "hollow",
            "rectangular hollow",
            "circular hollow",
            "cellular",
            "solid",
        ])),
        "Shapes of section.",
    ),
    key(
        "orientation",
        Kind::List(&Kind::Choice(&["beam", "column"])),
        "Tested as beam, as column.",
    ),
    key(
        "fires",
        Kind::List(&Kind::Name(NameOf::Fire)),
        "Fires; standard unless stated.",
    ),
];

/// `loss factor`.
pub const LOSS: &[Key] = &[
    key(
        "shop",
        number("a loss in percent", Dimension::Percent, "%", 0.0, 95.0),
        "Loss in the shop.",
    ),
    key(
        "site",
        number("a loss in percent", Dimension::Percent, "%", 0.0, 95.0),
        "Loss on site.",
    ),
];

/// `price`.
pub const PRICE: &[Key] = &[
    key(
        "per m2",
        plain("a price", 0.0, 1e6),
        "Price per protected square metre.",
    ),
    key(
        "per m2 and mm",
        plain("a price", 0.0, 1e6),
        "Price per square metre and millimetre of thickness.",
    ),
    key("per litre", plain("a price", 0.0, 1e6), "Price per litre of coating."),
    key("per kg", plain("a price", 0.0, 1e6), "Price per kg of product."),
];

/// `evidence`.
pub const EVIDENCE: &[Key] = &[
    key("report", Kind::Text, "Number of the report."),
    key("issued", Kind::Date, "Date of issue."),
    key("expires", Kind::Date, "Date it expires."),
];
