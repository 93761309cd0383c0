//! Showing quantities in the units that the design asks for.

use super::{Length, SectionFactor, Temperature};

/// The units of reports and of the editor (`basis: units`).
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Default)]
pub enum DisplayUnits {
    /// mm, µm, °C, 1/m.
    #[default]
    Metric,
    /// in, mil, °F, 1/m (the section factor of the Eurocode method stays in 1/m).
    Imperial,
}

impl DisplayUnits {
    /// A thickness of board, spray or steel: `17.4 mm` or `0.685 in`.
    #[must_use]
    pub fn thickness(self, value: Length) -> String {
        match self {
            Self::Metric => format!("{} mm", significant(value.mm(), 1)),
            Self::Imperial => format!("{} in", significant(value.mm() / 25.4, 3)),
        }
    }

    /// A thickness that is needed, rounded up in the last place shown, so that what is shown serves.
    #[must_use]
    pub fn needed_thickness(self, value: Length) -> String {
        self.thickness(up(value, if self == Self::Metric { 0.1 } else { 0.0254 }))
    }

    /// A dry film that is needed, rounded up likewise.
    #[must_use]
    pub fn needed_film(self, value: Length) -> String {
        self.film(up(value, if self == Self::Metric { 0.001 } else { 0.002_54 }))
    }

    /// A dry film thickness: `450 µm` or `17.7 mil`.
    #[must_use]
    pub fn film(self, value: Length) -> String {
        match self {
            Self::Metric => format!("{} µm", significant(value.um(), 0)),
            Self::Imperial => format!("{} mil", significant(value.mm() / 0.0254, 1)),
        }
    }

    /// A temperature in whole degrees: `550 °C` or `1022 °F`.
    #[must_use]
    pub fn temperature(self, value: Temperature) -> String {
        match self {
            Self::Metric => format!("{:.0} °C", value.celsius()),
            Self::Imperial => format!("{:.0} °F", value.celsius() * 1.8 + 32.0),
        }
    }

    /// A mass in whole kg, or in lb: the international pound, exactly 0.45359237 kg.
    #[must_use]
    pub fn mass(self, kg: f64) -> String {
        match self {
            Self::Metric => format!("{kg:.0} kg"),
            Self::Imperial => format!("{:.0} lb", kg / 0.453_592_37),
        }
    }

    /// A surface in whole m², or in ft²: the international foot, exactly 0.3048 m.
    #[must_use]
    pub fn surface(self, m2: f64) -> String {
        match self {
            Self::Metric => format!("{m2:.0} m²"),
            Self::Imperial => format!("{:.0} ft²", m2 / (0.3048 * 0.3048)),
        }
    }

    /// A volume of paint in whole litres, or in gal: the US liquid gallon of 231 cubic inches, exactly 3.785411784 litres.
    #[must_use]
    pub fn volume(self, litres: f64) -> String {
        match self {
            Self::Metric => format!("{litres:.0} litres"),
            Self::Imperial => format!("{:.0} gal", litres / 3.785_411_784),
        }
    }

    /// A section factor in whole 1/m, one decimal below 100: `188 1/m`.
    #[must_use]
    pub fn section_factor(self, value: SectionFactor) -> String {
        let decimals = if value.per_m() < 99.95 { 1 } else { 0 };
        format!("{} 1/m", significant(value.per_m(), decimals))
    }
}

/// A length rounded up to a step in mm.
fn up(value: Length, step: f64) -> Length {
    Length::from_mm((value.mm() / step - 1e-6).ceil() * step)
}

/// A number with at most `decimals` decimals, trailing zeros and a negative zero dropped.
#[must_use]
pub fn significant(value: f64, decimals: usize) -> String {
    let mut text = format!("{value:.decimals$}");
    if text.contains('.') {
        text.truncate(text.trim_end_matches('0').trim_end_matches('.').len());
    }
    if text == "-0" { "0".to_owned() } else { text }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn shows_few_decimals() {
        assert_eq!(significant(17.40, 1), "17.4");
        assert_eq!(significant(20.0, 1), "20");
        assert_eq!(significant(-0.01, 1), "0");
        assert_eq!(DisplayUnits::Metric.film(Length::from_mm(0.45)), "450 µm");
        assert_eq!(
            DisplayUnits::Imperial.temperature(Temperature::from_celsius(550.0)),
            "1022 °F"
        );
        assert_eq!(DisplayUnits::Imperial.mass(453.592_37), "1000 lb");
        assert_eq!(DisplayUnits::Imperial.surface(92.903_04), "1000 ft²");
        assert_eq!(DisplayUnits::Imperial.volume(378.541_178_4), "100 gal");
        assert_eq!(
            DisplayUnits::Metric.section_factor(SectionFactor::from_per_m(59.33)),
            "59.3 1/m"
        );
    }
}
