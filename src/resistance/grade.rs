//! Yield strength by grade and thickness.
//!
//! Source: memory of EN 1993-1-1:2005 Table 3.1, EN 10025-2:2019, EN 10025-3:2019 and EN 10025-4:2019, and of
//! ASTM A992, A36 and A572.

use std::fmt;

use crate::section::Shape;
use crate::units::{Length, Stress};

/// A grade of structural steel.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash)]
pub enum Grade {
    /// S235.
    S235,
    /// S275.
    S275,
    /// S355.
    S355,
    /// S420.
    S420,
    /// S450.
    S450,
    /// S460.
    S460,
    /// ASTM A992, 50 ksi.
    A992,
    /// ASTM A36, 36 ksi.
    A36,
    /// ASTM A572 grade 50, 50 ksi.
    A572Grade50,
}

/// Which table the yield strength of a European grade is read from; national annexes choose.
#[derive(Debug, Clone, Copy, PartialEq, Eq, Hash, Default)]
pub enum YieldSource {
    /// EN 1993-1-1:2005 Table 3.1: one step, at 40 mm, up to 80 mm.
    #[default]
    Table31,
    /// The product standards EN 10025-2 to -4: steps at 16, 40, 63, 80 and 100 mm.
    En10025,
}

/// The thickness lies outside the table.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct OutsideTable {
    /// The thickness asked for.
    pub thickness: Length,
    /// The largest that the table has.
    pub largest: Length,
}

impl fmt::Display for OutsideTable {
    fn fmt(&self, f: &mut fmt::Formatter<'_>) -> fmt::Result {
        write!(
            f,
            "the table of yield strengths ends at {} mm, and the thickness is {:.1} mm; state `steel: {{yield: ..}}`",
            self.largest.mm(),
            self.thickness.mm()
        )
    }
}

impl std::error::Error for OutsideTable {}

/// One kip per square inch in MPa, exact to the digits given (ASTM SI 10).
const KSI: f64 = 6.894_757_293;
/// Upper thicknesses of EN 1993-1-1:2005 Table 3.1, mm.
const STEPS_TABLE_3_1: [f64; 2] = [40.0, 80.0];
/// Upper thicknesses of the product standards, mm.
const STEPS_EN_10025: [f64; 5] = [16.0, 40.0, 63.0, 80.0, 100.0];

impl Grade {
    /// All grades.
    pub const ALL: [Self; 9] = [
        Self::S235,
        Self::S275,
        Self::S355,
        Self::S420,
        Self::S450,
        Self::S460,
        Self::A992,
        Self::A36,
        Self::A572Grade50,
    ];

    /// Its name in design files.
    #[must_use]
    pub const fn name(self) -> &'static str {
        match self {
            Self::S235 => "S235",
            Self::S275 => "S275",
            Self::S355 => "S355",
            Self::S420 => "S420",
            Self::S450 => "S450",
            Self::S460 => "S460",
            Self::A992 => "A992",
            Self::A36 => "A36",
            Self::A572Grade50 => "A572-50",
        }
    }

    /// The grade of a name, whatever its case.
    #[must_use]
    pub fn from_name(name: &str) -> Option<Self> {
        Self::ALL
            .into_iter()
            .find(|grade| grade.name().eq_ignore_ascii_case(name.trim()))
    }

    /// fy in MPa at the steps of Table 3.1. S420 and S460 are those of EN 10025-3 and -4.
    const fn table_3_1(self) -> Option<[f64; 2]> {
        match self {
            Self::S235 => Some([235.0, 215.0]),
            Self::S275 => Some([275.0, 255.0]),
            Self::S355 => Some([355.0, 335.0]),
            Self::S420 => Some([420.0, 390.0]),
            Self::S450 => Some([440.0, 410.0]),
            Self::S460 => Some([460.0, 430.0]),
            Self::A992 | Self::A36 | Self::A572Grade50 => None,
        }
    }

    /// ReH in MPa at the steps of EN 10025; for S420 and S460 the lower of normalised (-3) and thermomechanical (-4).
    const fn en_10025(self) -> Option<[f64; 5]> {
        match self {
            Self::S235 => Some([235.0, 225.0, 215.0, 215.0, 215.0]),
            Self::S275 => Some([275.0, 265.0, 255.0, 245.0, 235.0]),
            Self::S355 => Some([355.0, 345.0, 335.0, 325.0, 315.0]),
            Self::S420 => Some([420.0, 400.0, 390.0, 370.0, 360.0]),
            Self::S450 => Some([450.0, 430.0, 410.0, 390.0, 380.0]),
            Self::S460 => Some([460.0, 440.0, 430.0, 410.0, 400.0]),
            Self::A992 | Self::A36 | Self::A572Grade50 => None,
        }
    }

    /// Yield strength and largest thickness in mm of the American grades: any rolled shape; plates up to 4 in (A572)
    /// and 8 in (A36).
    const fn american(self) -> Option<(f64, f64)> {
        match self {
            Self::A992 | Self::A572Grade50 => Some((50.0 * KSI, 101.6)),
            Self::A36 => Some((36.0 * KSI, 203.2)),
            _ => None,
        }
    }
}

/// The yield strength at 20 °C of a grade at a thickness. American grades have one table, whatever `source`.
///
/// # Errors
/// [`OutsideTable`] for a thickness above the last step (or not a positive number).
pub fn yield_strength(grade: Grade, thickness: Length, source: YieldSource) -> Result<Stress, OutsideTable> {
    let found = |steps: &[f64], strengths: &[f64]| {
        let at = (thickness.mm() > 0.0)
            .then(|| steps.iter().position(|step| thickness.mm() <= *step))
            .flatten();
        at.and_then(|at| strengths.get(at))
            .map(|fy| Stress::from_mpa(*fy))
            .ok_or(OutsideTable {
                thickness,
                largest: Length::from_mm(steps.last().copied().unwrap_or(0.0)),
            })
    };
    match (grade.american(), grade.table_3_1(), grade.en_10025(), source) {
        (Some((fy, largest)), ..) => found(&[largest], &[fy]),
        (None, Some(strengths), _, YieldSource::Table31) => found(&STEPS_TABLE_3_1, &strengths),
        (None, _, Some(strengths), YieldSource::En10025) => found(&STEPS_EN_10025, &strengths),
        (None, ..) => found(&[], &[]),
    }
}

/// The thickness that the yield strength of a section goes by: its thickest part (the diameter of a round bar). None
/// for stated figures.
#[must_use]
pub fn governing_thickness(shape: &Shape) -> Option<Length> {
    let keys: &[&str] = match shape {
        Shape::Round(_) => &["d"],
        _ => &["t", "tw", "tf", "tf top", "tf bottom"],
    };
    keys.iter()
        .filter_map(|key| shape.dimension(key))
        .max_by(|a, b| a.mm().total_cmp(&b.mm()))
}

#[cfg(test)]
mod tests {
    use super::*;
    use crate::section::shape::{CircularHollow, Round, WeldedI};

    fn at(grade: Grade, mm: f64, source: YieldSource) -> Option<f64> {
        yield_strength(grade, Length::from_mm(mm), source).ok().map(Stress::mpa)
    }

    /// EN 1993-1-1:2005 Table 3.1 and EN 10025-2:2019 Table 6 (memory).
    #[test]
    fn strengths_fall_with_thickness() {
        assert_eq!(at(Grade::S355, 40.0, YieldSource::Table31), Some(355.0));
        assert_eq!(at(Grade::S355, 41.0, YieldSource::Table31), Some(335.0));
        assert_eq!(at(Grade::S450, 10.0, YieldSource::Table31), Some(440.0));
        assert_eq!(at(Grade::S355, 16.0, YieldSource::En10025), Some(355.0));
        assert_eq!(at(Grade::S355, 20.0, YieldSource::En10025), Some(345.0));
        assert_eq!(at(Grade::S275, 70.0, YieldSource::En10025), Some(245.0));
        for grade in Grade::ALL {
            for source in [YieldSource::Table31, YieldSource::En10025] {
                let mut last = f64::INFINITY;
                for mm in [5.0, 16.0, 17.0, 40.0, 41.0, 63.0, 64.0, 80.0] {
                    let fy = at(grade, mm, source).unwrap();
                    assert!(fy <= last, "{grade:?} {mm}");
                    last = fy;
                }
            }
        }
    }

    #[test]
    fn above_the_table_is_an_error() {
        let error = yield_strength(Grade::S355, Length::from_mm(90.0), YieldSource::Table31).unwrap_err();
        assert_eq!(error.largest, Length::from_mm(80.0));
        assert!(error.to_string().contains("90.0 mm"), "{error}");
        assert_eq!(at(Grade::S235, 101.0, YieldSource::En10025), None);
        assert_eq!(at(Grade::A36, 204.0, YieldSource::Table31), None);
        assert_eq!(at(Grade::S235, f64::NAN, YieldSource::Table31), None);
        assert_eq!(at(Grade::S235, 0.0, YieldSource::Table31), None);
    }

    /// 50 and 36 ksi in MPa (computed).
    #[test]
    fn american_grades_are_converted_from_ksi() {
        assert!((at(Grade::A992, 20.0, YieldSource::Table31).unwrap() - 344.738).abs() < 1e-3);
        assert!((at(Grade::A36, 20.0, YieldSource::En10025).unwrap() - 248.211).abs() < 1e-3);
    }

    #[test]
    fn names_lead_back() {
        for grade in Grade::ALL {
            assert_eq!(Grade::from_name(grade.name()), Some(grade));
        }
        assert_eq!(Grade::from_name("s355 "), Some(Grade::S355));
        assert_eq!(Grade::from_name("S999"), None);
    }

    #[test]
    fn the_thickest_part_governs() {
        let mm = Length::from_mm;
        let girder = Shape::WeldedI(WeldedI {
            h: mm(900.0),
            b_top: mm(300.0),
            tf_top: mm(25.0),
            b_bottom: mm(300.0),
            tf_bottom: mm(45.0),
            tw: mm(12.0),
            weld: mm(6.0),
        });
        assert_eq!(governing_thickness(&girder), Some(mm(45.0)));
        let round = Shape::Round(Round { d: mm(60.0) });
        assert_eq!(governing_thickness(&round), Some(mm(60.0)));
        let tube = Shape::CircularHollow(CircularHollow {
            d: mm(168.3),
            t: mm(8.0),
        });
        assert_eq!(governing_thickness(&tube), Some(mm(8.0)));
    }
}
