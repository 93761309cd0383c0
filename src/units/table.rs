//! The kinds of quantity and the units that they may be written in.

/// What kind of quantity a key wants. Each has one base unit, in which [`parse_quantity`] answers.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Dimension {
    /// Base unit mm.
    Length,
    /// Base unit °C (an absolute temperature, so that °F is shifted too).
    Temperature,
    /// Base unit min.
    Time,
    /// Base unit kN.
    Force,
    /// Base unit kNm.
    Moment,
    /// Base unit MPa.
    Stress,
    /// Base unit W/mK.
    Conductivity,
    /// Base unit J/kgK.
    SpecificHeat,
    /// Base unit kg/m³.
    Density,
    /// Base unit mm².
    Area,
    /// Base unit kg/m.
    MassPerLength,
    /// Base unit 1/m.
    SectionFactor,
    /// Base unit W/m²K, the coefficient of heat transfer by convection.
    HeatTransfer,
    /// Base unit MJ/m².
    FireLoad,
    /// Base unit m².
    FloorArea,
    /// Base unit J/m²s½K, the thermal inertia b.
    ThermalInertia,
    /// Base unit m½, the opening factor O.
    OpeningFactor,
    /// A share of one; `65 %` is 0.65.
    Ratio,
    /// A number in percent; `70` and `70 %` are 70.
    Percent,
    /// A number without a unit.
    Number,
}

/// A unit that a quantity may be written in: `base = value * factor + shift`.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Unit {
    /// As it is written, the first of its spellings being the one shown.
    pub spellings: &'static [&'static str],
    /// The kind of quantity it measures.
    pub dimension: Dimension,
    /// Multiplies the number.
    pub factor: f64,
    /// Added after the factor (only temperatures have one).
    pub shift: f64,
}

const fn unit(dimension: Dimension, factor: f64, spellings: &'static [&'static str]) -> Unit {
    Unit {
        spellings,
        dimension,
        factor,
        shift: 0.0,
    }
}

/// One inch in millimetres, exact by definition.
const INCH: f64 = 25.4;
/// One pound in kilograms, exact by definition.
const POUND: f64 = 0.453_592_37;
/// One pound-force in kilonewtons, from the pound and standard gravity.
const POUND_FORCE: f64 = 0.004_448_221_615_260_5;

/// The units that are read, the base unit of each dimension first.
pub(super) const UNITS: &[Unit] = &[
    unit(Dimension::Length, 1.0, &["mm"]),
    unit(Dimension::Length, 1000.0, &["m"]),
    unit(Dimension::Length, 10.0, &["cm"]),
    unit(Dimension::Length, 0.001, &["µm", "μm", "um", "micron", "microns"]),
    unit(Dimension::Length, INCH, &["in", "inch", "inches", "\"", "″"]),
    unit(Dimension::Length, INCH / 1000.0, &["mil", "mils"]),
    unit(Dimension::Length, 12.0 * INCH, &["ft", "foot", "feet", "'", "′"]),
    unit(Dimension::Temperature, 1.0, &["°C", "C", "degC", "℃"]),
    Unit {
        spellings: &["°F", "F", "degF", "℉"],
        dimension: Dimension::Temperature,
        factor: 5.0 / 9.0,
        shift: -160.0 / 9.0,
    },
    Unit {
        spellings: &["K"],
        dimension: Dimension::Temperature,
        factor: 1.0,
        shift: -273.15,
    },
    unit(Dimension::Time, 1.0, &["min", "minutes", "minute", "mins"]),
    unit(Dimension::Time, 60.0, &["h", "hour", "hours", "hr", "hrs"]),
    unit(Dimension::Time, 1.0 / 60.0, &["s", "sec", "seconds", "second"]),
    unit(Dimension::Force, 1.0, &["kN"]),
    unit(Dimension::Force, 0.001, &["N"]),
    unit(Dimension::Force, 1000.0, &["MN"]),
    unit(Dimension::Force, 1000.0 * POUND_FORCE, &["kip", "kips"]),
    unit(Dimension::Force, POUND_FORCE, &["lbf"]),
    unit(Dimension::Moment, 1.0, &["kNm", "kN m", "kN·m", "kN*m"]),
    unit(Dimension::Moment, 0.001, &["Nm", "N m", "N·m"]),
    unit(Dimension::Moment, 1000.0, &["MNm"]),
    unit(
        Dimension::Moment,
        0.3048 * 1000.0 * POUND_FORCE,
        &["kip ft", "kip-ft", "kipft"],
    ),
    unit(
        Dimension::Moment,
        0.0254 * 1000.0 * POUND_FORCE,
        &["kip in", "kip-in", "kipin"],
    ),
    unit(Dimension::Stress, 1.0, &["MPa", "N/mm2", "N/mm²"]),
    unit(Dimension::Stress, 1000.0, &["GPa"]),
    unit(
        Dimension::Stress,
        1000.0 * POUND_FORCE / (INCH * INCH) * 1000.0,
        &["ksi"],
    ),
    unit(Dimension::Stress, POUND_FORCE / (INCH * INCH) * 1000.0, &["psi"]),
    unit(
        Dimension::Conductivity,
        1.0,
        &["W/mK", "W/(mK)", "W/(m K)", "W/m/K", "W/m K", "W/(m·K)", "W/m·K"],
    ),
    // 1 Btu (international table) is 1055.05585262 J; per hour, foot and degree Fahrenheit.
    unit(
        Dimension::Conductivity,
        1.730_734_666,
        &["Btu/hftF", "Btu/(h ft F)", "Btu/h ft °F", "Btu/hr ft F"],
    ),
    unit(
        Dimension::SpecificHeat,
        1.0,
        &["J/kgK", "J/(kgK)", "J/(kg K)", "J/kg K", "J/(kg·K)", "J/kg·K"],
    ),
    unit(
        Dimension::SpecificHeat,
        1000.0,
        &["kJ/kgK", "kJ/(kgK)", "kJ/(kg K)", "kJ/kg K"],
    ),
    unit(
        Dimension::SpecificHeat,
        4186.8,
        &["Btu/lbF", "Btu/(lb F)", "Btu/lb °F", "Btu/lb F"],
    ),
    unit(Dimension::Density, 1.0, &["kg/m3", "kg/m³"]),
    unit(
        Dimension::Density,
        POUND / (0.3048 * 0.3048 * 0.3048),
        &["lb/ft3", "lb/ft³", "pcf"],
    ),
    unit(Dimension::Area, 1.0, &["mm2", "mm²"]),
    unit(Dimension::Area, 100.0, &["cm2", "cm²"]),
    unit(Dimension::Area, INCH * INCH, &["in2", "in²"]),
    unit(Dimension::MassPerLength, 1.0, &["kg/m"]),
    unit(Dimension::MassPerLength, POUND / 0.3048, &["lb/ft", "plf"]),
    unit(Dimension::SectionFactor, 1.0, &["1/m", "/m", "m-1", "m⁻¹"]),
    unit(Dimension::SectionFactor, 1.0 / 0.3048, &["1/ft"]),
    unit(
        Dimension::HeatTransfer,
        1.0,
        &["W/m2K", "W/m²K", "W/(m2K)", "W/(m²K)", "W/(m2 K)", "W/(m² K)"],
    ),
    unit(Dimension::FireLoad, 1.0, &["MJ/m2", "MJ/m²"]),
    unit(Dimension::FloorArea, 1.0, &["m2", "m²"]),
    unit(Dimension::FloorArea, 0.3048 * 0.3048, &["ft2", "ft²"]),
    unit(
        Dimension::ThermalInertia,
        1.0,
        &["J/m2s1/2K", "J/m²s½K", "J/(m2 s1/2 K)"],
    ),
    unit(Dimension::OpeningFactor, 1.0, &["m1/2", "m½", "m^0.5"]),
    unit(Dimension::Ratio, 0.01, &["%"]),
    unit(Dimension::Percent, 1.0, &["%"]),
];

impl Dimension {
    /// The kind of quantity in a word, with its article, for messages: "a length".
    #[must_use]
    pub const fn noun(self) -> &'static str {
        match self {
            Self::Length => "a length",
            Self::Temperature => "a temperature",
            Self::Time => "a time",
            Self::Force => "a force",
            Self::Moment => "a moment",
            Self::Stress => "a stress",
            Self::Conductivity => "a thermal conductivity",
            Self::SpecificHeat => "a specific heat",
            Self::Density => "a density",
            Self::Area => "an area",
            Self::MassPerLength => "a mass per length",
            Self::SectionFactor => "a section factor",
            Self::HeatTransfer => "a coefficient of heat transfer",
            Self::FireLoad => "a fire load density",
            Self::FloorArea => "a floor area",
            Self::ThermalInertia => "a thermal inertia",
            Self::OpeningFactor => "an opening factor",
            Self::Ratio => "a ratio",
            Self::Percent => "a percentage",
            Self::Number => "a plain number",
        }
    }
}

/// The units that a dimension may be written in, for messages and documentation.
pub fn units_of(dimension: Dimension) -> impl Iterator<Item = &'static Unit> {
    UNITS.iter().filter(move |unit| unit.dimension == dimension)
}
