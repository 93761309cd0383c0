//! Keys of a member, a group and the defaults.

use super::section::{SECTION, SHAPES};
use super::{Dimension, Key, Kind, NameOf, key, number, plain, required, size, temperature};

/// The role of a member in the frame.
pub const ROLES: &[&str] = &[
    "beam",
    "column",
    "brace",
    "tie",
    "hanger",
    "purlin",
    "rail",
    "rafter",
    "truss chord",
    "truss web",
    "trimmer",
    "transfer beam",
    "lintel",
];

/// A thickness of protection, each layer's.
const THICKNESS: Kind = number("a thickness", Dimension::Length, "mm", 0.01, 1000.0);
/// A dry film; a bare number is in µm.
const FILM: Kind = number("a dry film thickness", Dimension::Length, "µm", 1.0, 50_000.0);
const AXIAL: Kind = number("a force", Dimension::Force, "kN", -1e6, 1e6);
const BENDING: Kind = number("a moment", Dimension::Moment, "kNm", -1e6, 1e6);
const BUCKLING: Kind = number("a buckling length", Dimension::Length, "m", 0.0, 1000.0);
const UTILISATION: Kind = plain("a degree of utilisation", 0.0, 100.0);

/// Keys of a member that no verdict rests on.
pub const ASIDE: &[&str] = &[
    "mark",
    "location",
    "drawing",
    "revision",
    "note",
    "count",
    "length",
    "environment",
    "supported by",
    "steadies",
    "departures",
];

/// Every key of a member. Groups and defaults may carry all but `mark` and `departures`.
pub const MEMBER: &[Key] = &[
    required(
        "mark",
        Kind::Name(NameOf::Mark),
        "The member's mark, unique in the design.",
    ),
    key(
        "group",
        Kind::Name(NameOf::Group),
        "The group whose keys hold where the member does not say otherwise.",
    ),
    key("location", Kind::Map(LOCATION), "Where it is; schedules go by it."),
    key("drawing", Kind::Text, "Drawing number."),
    key("revision", Kind::Text, "Revision of the member."),
    key("note", Kind::Text, "Any remark."),
    key("count", Kind::Whole(1, 1_000_000), "How many members of this mark, 1."),
    key(
        "length",
        number("a length", Dimension::Length, "m", 0.001, 1000.0),
        "Length of one member; without it the quantities are not given.",
    ),
    required("role", Kind::Choice(ROLES), "What the member does in the frame."),
    required(
        "section",
        Kind::OneOf(&[Kind::Designation, Kind::Map(SECTION)]),
        "A designation of the section tables, or a mapping with `shape`.",
    ),
    key(
        "openings",
        Kind::Map(OPENINGS),
        "Web openings of cellular and castellated beams.",
    ),
    key("taper", Kind::Map(TAPER), "Haunched and tapered members."),
    required(
        "steel",
        Kind::OneOf(&[Kind::Choice(GRADES), Kind::Map(STEEL)]),
        "Steel grade, or `{yield: 350 MPa}`.",
    ),
    key(
        "surface",
        Kind::OneOf(&[Kind::Choice(&["plain", "galvanised"]), Kind::Map(SURFACE)]),
        "Surface; the lower emissivity only with `{galvanised: {to: EN ISO 1461, category: A}}`.",
    ),
    key(
        "exposure",
        Kind::OneOf(&[Kind::Choice(EXPOSURES), Kind::Map(EXPOSURE)]),
        "What the fire reaches; all round unless stated.",
    ),
    key(
        "shielded by",
        Kind::OneOf(&[Kind::Choice(&["slab", "wall", "none"]), Kind::Map(SHIELD)]),
        "What covers the face that is not exposed.",
    ),
    key(
        "environment",
        Kind::Choice(ENVIRONMENTS),
        "Service environment of a coating.",
    ),
    required(
        "period",
        Kind::OneOf(&[Kind::Period, Kind::Map(PERIOD)]),
        "Fire resistance period, or `{none: yes, because: text}`.",
    ),
    key(
        "fire",
        Kind::Name(NameOf::Fire),
        "Name of the fire; standard unless stated.",
    ),
    key(
        "critical temperature",
        Kind::OneOf(&[
            temperature("a critical temperature", 100.0, 1200.0),
            Kind::Map(CRITICAL),
        ]),
        "Stated critical temperature; otherwise worked out from `loading`.",
    ),
    key(
        "loading",
        Kind::Map(LOADING),
        "Utilisation, load ratio or effects in the fire situation.",
    ),
    key(
        "protection",
        Kind::OneOf(&[
            Kind::Name(NameOf::Product),
            Kind::Choice(&["none"]),
            Kind::Map(PROTECTION),
        ]),
        "none, a product's name, or a mapping with `product`.",
    ),
    key(
        "supported by",
        Kind::List(&Kind::Name(NameOf::Mark)),
        "Marks of the members that carry this one.",
    ),
    key(
        "steadies",
        Kind::List(&Kind::Name(NameOf::Mark)),
        "Marks of the members that this brace keeps stable.",
    ),
    key(
        "connection",
        Kind::Map(CONNECTION),
        "The connection, against EN 1993-1-2 4.2.1(6).",
    ),
    key(
        "restrained",
        Kind::YesNo,
        "Whether the assembly is restrained (ASCE 29 ratings).",
    ),
    key(
        "departures",
        Kind::List(&Kind::Map(DEPARTURE)),
        "Agreed departures from findings; of a member only.",
    ),
];

/// Steel grades that are known by name.
pub const GRADES: &[&str] = &["S235", "S275", "S355", "S420", "S450", "S460", "A992", "A36", "A572-50"];
/// Exposures that are known by name.
pub const EXPOSURES: &[&str] = &["all round", "three sides", "flange only"];
/// Environments, by letter and in words.
pub const ENVIRONMENTS: &[&str] = &[
    "X",
    "Y",
    "Z1",
    "Z2",
    "exposed",
    "semi exposed",
    "internal humid",
    "internal dry",
];
/// Faces of the enclosing box.
pub const FACES: &[&str] = &["top", "bottom", "left", "right"];

/// `location`.
pub const LOCATION: &[Key] = &[
    key("level", Kind::Text, "Level or storey."),
    key("grid", Kind::Text, "Grid reference."),
    key("zone", Kind::Text, "Zone of the building."),
    key("phase", Kind::Text, "Phase of the works."),
];

/// `openings`.
pub const OPENINGS: &[Key] = &[
    required(
        "shape",
        Kind::Choice(&["circular", "hexagonal", "rectangular"]),
        "Shape of the openings.",
    ),
    key("diameter", size("a diameter"), "Diameter of circular openings."),
    key("width", size("a width"), "Width of hexagonal or rectangular openings."),
    key(
        "height",
        size("a height"),
        "Height of hexagonal or rectangular openings.",
    ),
    key("spacing", size("a spacing"), "Centres of the openings."),
    key(
        "web below",
        size("a depth"),
        "Depth of the tee below the opening, if not half the rest.",
    ),
];

/// `taper`.
pub const TAPER: &[Key] = &[
    key("depth at end", size("a depth"), "Depth at the other end."),
    key(
        "depths",
        Kind::List(&size("a depth")),
        "Depths along the member at equal spacing.",
    ),
];

/// `steel` as a mapping.
pub const STEEL: &[Key] = &[required(
    "yield",
    number("a yield strength", Dimension::Stress, "MPa", 100.0, 1500.0),
    "Yield strength at 20 °C.",
)];

/// `surface` as a mapping.
pub const SURFACE: &[Key] = &[required(
    "galvanised",
    Kind::Map(GALVANISED),
    "Hot-dip galvanised, as declared.",
)];

/// `surface: galvanised`.
pub const GALVANISED: &[Key] = &[
    required("to", Kind::Choice(&["EN ISO 1461"]), "Standard of the zinc coating."),
    required(
        "category",
        Kind::Choice(&["A", "B", "C", "D"]),
        "Category of the steel; the lower emissivity needs A or B.",
    ),
];

/// `exposure` as a mapping.
pub const EXPOSURE: &[Key] = &[
    key(
        "covered",
        Kind::List(&Kind::Choice(FACES)),
        "Faces of the enclosing box that the fire does not reach.",
    ),
    key(
        "perimeter",
        size("a heated perimeter"),
        "Heated perimeter of the steel, as measured by the user.",
    ),
];

/// `shielded by` as a mapping.
pub const SHIELD: &[Key] = &[required("deck", Kind::Map(DECK), "A metal deck.")];

/// `shielded by: deck`.
pub const DECK: &[Key] = &[
    key(
        "concrete",
        Kind::YesNo,
        "Whether the deck carries concrete; bare sheeting is no shield.",
    ),
    key(
        "contact",
        number("a ratio", Dimension::Ratio, "", 0.0, 1.0),
        "Share of the flange in contact with the deck.",
    ),
    key(
        "voids filled",
        Kind::YesNo,
        "Whether the voids above the flange are filled.",
    ),
    key(
        "profile",
        Kind::Choice(&["trapezoidal", "re-entrant"]),
        "Profile of the deck.",
    ),
];

/// `period` as a mapping.
pub const PERIOD: &[Key] = &[
    required("none", Kind::YesNo, "yes: no fire resistance is wanted of the member."),
    required("because", Kind::Text, "Why none is wanted."),
];

/// `critical temperature` as a mapping.
pub const CRITICAL: &[Key] = &[
    required(
        "value",
        temperature("a critical temperature", 100.0, 1200.0),
        "The critical temperature.",
    ),
    key("by", Kind::Text, "Who stated it."),
    key("status", Kind::Choice(&["preliminary", "approved"]), "How firm it is."),
];

/// `loading`.
pub const LOADING: &[Key] = &[
    key(
        "utilisation",
        UTILISATION,
        "Degree of utilisation μ0 = Efi,d/Rfi,d,0 at t = 0 in fire, EN 1993-1-2 4.2.4.",
    ),
    key(
        "ambient utilisation",
        UTILISATION,
        "Utilisation at normal temperature; μ0 is its product with the reduction, (4.24).",
    ),
    key(
        "reduction",
        plain("a reduction factor", 0.0, 1.0),
        "ηfi, the reduction factor of the load level in fire.",
    ),
    key(
        "permanent",
        plain("an action", 0.0, 1e9),
        "Permanent action Gk, in any unit that `variable` shares.",
    ),
    key(
        "variable",
        plain("an action", 0.0, 1e9),
        "Leading variable action Qk, in the unit of `permanent`.",
    ),
    key(
        "combination factor",
        plain("a combination factor", 0.0, 1.0),
        "ψ of the variable action in fire, as the national annex names it.",
    ),
    key(
        "load ratio",
        plain("a load ratio", 0.0, 1.0),
        "rf of AS 4100 12.5, with that method only.",
    ),
    key(
        "axial",
        AXIAL,
        "Axial force in fire; compression positive, in ties and hangers tension positive.",
    ),
    key("bending", BENDING, "Bending moment about the strong axis in fire."),
    key("bending minor", BENDING, "Bending moment about the weak axis in fire."),
    key(
        "shear",
        number("a force", Dimension::Force, "kN", -1e6, 1e6),
        "Shear force in fire.",
    ),
    key(
        "buckling length",
        BUCKLING,
        "Buckling length in fire about the strong axis.",
    ),
    key(
        "buckling length minor",
        BUCKLING,
        "Buckling length in fire about the weak axis; the major one unless stated.",
    ),
    key(
        "lateral length",
        number("a length", Dimension::Length, "m", 0.0, 1000.0),
        "Length between lateral restraints.",
    ),
    key(
        "moment shape",
        Kind::Choice(&[
            "uniform",
            "distributed load",
            "central load",
            "end moment",
            "double curvature",
        ]),
        "Shape of the moment diagram.",
    ),
    key(
        "support",
        Kind::Choice(&["simple", "continuous"]),
        "Whether the beam is continuous over its supports (κ2).",
    ),
];

/// `protection` as a mapping.
pub const PROTECTION: &[Key] = &[
    required("product", Kind::Name(NameOf::Product), "Name of the product."),
    key(
        "form",
        Kind::Choice(&["profile", "box"]),
        "Follows the profile or boxes it in; box for boards, profile for the rest.",
    ),
    key(
        "thickness",
        Kind::OneOf(&[THICKNESS, Kind::List(&THICKNESS)]),
        "Thickness of each layer; a list for unequal layers.",
    ),
    key("layers", Kind::Whole(1, 20), "Number of layers."),
    key("dft", FILM, "Dry film thickness of a coating."),
    key("reading", FILM, "Measured dry film thickness."),
    key("primer", Kind::Text, "Primer."),
    key("topcoat", Kind::Text, "Topcoat."),
    key(
        "applied",
        Kind::Choice(&["shop", "site"]),
        "Where the protection is applied.",
    ),
];

/// `connection`.
pub const CONNECTION: &[Key] = &[
    key("utilisation", UTILISATION, "Degree of utilisation of the connection."),
    key(
        "same protection",
        Kind::YesNo,
        "Whether the connection has the protection of the member.",
    ),
];

/// An entry of `departures`.
pub const DEPARTURE: &[Key] = &[
    required("from", Kind::Name(NameOf::Finding), "The finding departed from."),
    key("because", Kind::Text, "The reason; always wanted."),
    key("by", Kind::Text, "Who agreed; wanted for an error."),
    key("until", Kind::Date, "How long it holds; wanted for an error."),
    key(
        "at",
        Kind::Map(AGREED),
        "The figures it was agreed at; it lapses when they worsen.",
    ),
];

/// `departures: at`.
pub const AGREED: &[Key] = &[
    key("needs", THICKNESS, "The thickness needed when it was agreed."),
    key(
        "section factor",
        number("a section factor", Dimension::SectionFactor, "1/m", 0.1, 5000.0),
        "The section factor when it was agreed.",
    ),
    key(
        "temperature",
        temperature("a temperature", 20.0, 1400.0),
        "The steel temperature when it was agreed.",
    ),
    key("resistance", Kind::Period, "The fire resistance when it was agreed."),
];

/// Names of the shapes of a section mapping, for the choice of `shape`.
pub const SHAPE_NAMES: &[&str] = &{
    let mut names = [""; SHAPES.len()];
    let mut at = 0;
    while at < SHAPES.len() {
        names[at] = SHAPES[at].name;
        at += 1;
    }
    names
};
