//! Why a product can't hold a member, in words.

use crate::protection::product::ShapeClass;
use crate::units::{DisplayUnits, Temperature, Time, significant};

/// Why a product can't hold a member.
#[derive(Debug, Clone, PartialEq)]
pub enum Refusal {
    /// No assessed thickness holds this section factor for the period at the temperature.
    TooSlender {
        /// The temperature behind the thickest assessed build-up, where it is known.
        reached: Option<Temperature>,
    },
    /// Something else lies outside what was assessed.
    Outside(Outside),
    /// The product was not assessed for the shape.
    ShapeNotAssessed(ShapeClass),
    /// The product was not assessed for beams, or for columns.
    OrientationNotAssessed(&'static str),
    /// The product was not assessed for the fire.
    FireNotAssessed,
    /// The method is read but not yet computed; why, as a sentence.
    NotCovered(&'static str),
}

/// What of a demand lies outside what was assessed.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum Outside {
    /// The period.
    Period {
        /// The period wanted.
        wanted: Time,
        /// The shortest assessed, where there is one.
        least: Option<Time>,
        /// The longest assessed.
        most: Time,
    },
    /// The critical temperature.
    CriticalTemperature {
        /// The member's.
        of_member: Temperature,
        /// The lowest assessed.
        least: Temperature,
        /// The highest assessed, where there is one.
        most: Option<Temperature>,
    },
    /// The number of sides exposed.
    Sides {
        /// The member's.
        of_member: u8,
        /// The only one assessed.
        assessed: u8,
        /// For sections of this shape.
        shape: ShapeClass,
    },
}

impl Outside {
    fn words(self, units: DisplayUnits) -> String {
        let minutes = |time: Time| format!("{} min", significant(time.min(), 1));
        match self {
            Self::Period { wanted, least, most } => {
                let range = match least {
                    Some(least) => format!("{} to {}", significant(least.min(), 1), minutes(most)),
                    None => format!("up to {}", minutes(most)),
                };
                format!("the period is {}; assessed is {range}", minutes(wanted))
            }
            Self::CriticalTemperature { of_member, least, most } => {
                let range = match most {
                    Some(most) => format!("{} to {}", units.temperature(least), units.temperature(most)),
                    None => format!("{} and above", units.temperature(least)),
                };
                let of_member = units.temperature(of_member);
                format!("the critical temperature is {of_member}; assessed is {range}")
            }
            Self::Sides {
                of_member,
                assessed,
                shape,
            } => {
                let shape = shape.words();
                format!("{of_member} sides are exposed; for {shape} sections, {assessed} are assessed")
            }
        }
    }
}

impl Refusal {
    /// What it says, with its figures in the units of the design.
    #[must_use]
    pub fn words(&self, units: DisplayUnits) -> String {
        match self {
            Self::TooSlender { .. } => "no assessed thickness holds it".to_owned(),
            Self::Outside(outside) => outside.words(units),
            Self::ShapeNotAssessed(shape) => format!("not assessed for {} sections", shape.words()),
            Self::OrientationNotAssessed(word) => format!("not assessed for {word}s"),
            Self::FireNotAssessed => "not assessed for this fire".to_owned(),
            Self::NotCovered(why) => (*why).to_owned(),
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn figures_are_in_the_units_of_the_design() {
        let celsius = Temperature::from_celsius;
        let cold = Refusal::Outside(Outside::CriticalTemperature {
            of_member: celsius(300.0),
            least: celsius(350.0),
            most: Some(celsius(700.0)),
        });
        assert_eq!(
            cold.words(DisplayUnits::Metric),
            "the critical temperature is 300 °C; assessed is 350 °C to 700 °C"
        );
        assert_eq!(
            cold.words(DisplayUnits::Imperial),
            "the critical temperature is 572 °F; assessed is 662 °F to 1292 °F"
        );
        let long = Refusal::Outside(Outside::Period {
            wanted: Time::from_min(240.0),
            least: None,
            most: Time::from_min(90.0),
        });
        assert_eq!(
            long.words(DisplayUnits::Imperial),
            "the period is 240 min; assessed is up to 90 min"
        );
        let sides = Refusal::Outside(Outside::Sides {
            of_member: 3,
            assessed: 4,
            shape: ShapeClass::Open,
        });
        assert_eq!(
            sides.words(DisplayUnits::Metric),
            "3 sides are exposed; for open sections, 4 are assessed"
        );
    }
}
