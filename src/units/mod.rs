//! Quantities: newtypes over `f64` with named constructors, text such as `20 mm` read into them.
//!
//! Each newtype holds its value in one base unit, named by its constructor and accessor, so that a thickness in
//! millimetres can't be taken for a length in metres. Conversion factors are exact by definition (inch, pound) unless
//! the doc says otherwise.

mod parse;
mod show;
mod table;

pub use parse::{QuantityError, parse_duration, parse_quantity};
pub use show::{DisplayUnits, significant};
pub use table::{Dimension, Unit, units_of};

/// Declares a quantity: a newtype over `f64` with one base unit.
macro_rules! quantity {
    ($(#[$doc:meta])* $name:ident, $from:ident, $get:ident) => {
        $(#[$doc])*
        #[derive(Debug, Clone, Copy, PartialEq, PartialOrd, Default, serde::Serialize)]
        #[serde(transparent)]
        pub struct $name(f64);

        impl $name {
            /// Makes the quantity from a number in its base unit. Any `f64` is taken; bounds are the caller's to check.
            #[must_use]
            pub const fn $from(value: f64) -> Self {
                Self(value)
            }

            /// The number in the base unit.
            #[must_use]
            pub const fn $get(self) -> f64 {
                self.0
            }

            /// The bits, for memo keys: two quantities are the same input only if these are equal.
            #[must_use]
            pub const fn bits(self) -> u64 {
                self.0.to_bits()
            }
        }
    };
}

quantity! {
    /// A length, base unit millimetre.
    Length, from_mm, mm
}
quantity! {
    /// An area, base unit square millimetre.
    Area, from_mm2, mm2
}
quantity! {
    /// A temperature, base unit degree Celsius.
    Temperature, from_celsius, celsius
}
quantity! {
    /// A time, base unit minute (the unit of fire resistance periods).
    Time, from_min, min
}
quantity! {
    /// A section factor: heated perimeter over area (or exposed surface over volume), base unit 1/m.
    SectionFactor, from_per_m, per_m
}
quantity! {
    /// A force, base unit kilonewton.
    Force, from_kn, kn
}
quantity! {
    /// A moment, base unit kilonewton metre.
    Moment, from_knm, knm
}
quantity! {
    /// A stress or modulus, base unit megapascal.
    Stress, from_mpa, mpa
}
quantity! {
    /// A thermal conductivity, base unit W/mK.
    Conductivity, from_w_mk, w_mk
}
quantity! {
    /// A specific heat, base unit J/kgK.
    SpecificHeat, from_j_kgk, j_kgk
}
quantity! {
    /// A density, base unit kg/m³.
    Density, from_kg_m3, kg_m3
}
quantity! {
    /// A mass per length of member, base unit kg/m.
    LinearMass, from_kg_m, kg_m
}

impl Length {
    /// Makes a length from metres.
    #[must_use]
    pub const fn from_m(value: f64) -> Self {
        Self(value * 1000.0)
    }

    /// The length in metres.
    #[must_use]
    pub const fn m(self) -> f64 {
        self.0 / 1000.0
    }

    /// Makes a length from micrometres, the unit of dry films.
    #[must_use]
    pub const fn from_um(value: f64) -> Self {
        Self(value / 1000.0)
    }

    /// The length in micrometres.
    #[must_use]
    pub const fn um(self) -> f64 {
        self.0 * 1000.0
    }
}

impl Area {
    /// The area in square metres.
    #[must_use]
    pub const fn m2(self) -> f64 {
        self.0 * 1e-6
    }
}

impl Time {
    /// Makes a time from seconds.
    #[must_use]
    pub const fn from_s(value: f64) -> Self {
        Self(value / 60.0)
    }

    /// The time in seconds.
    #[must_use]
    pub const fn s(self) -> f64 {
        self.0 * 60.0
    }
}

impl SectionFactor {
    /// The section factor of a perimeter over an area; both must be positive.
    #[must_use]
    pub fn from_perimeter(perimeter: Length, area: Area) -> Self {
        Self(perimeter.mm() / area.mm2() * 1000.0)
    }

    /// The effective thickness V/A in millimetres, the inverse of the factor: 200 1/m is 5 mm.
    #[must_use]
    pub fn effective_thickness(self) -> Length {
        Length(1000.0 / self.0)
    }
}
