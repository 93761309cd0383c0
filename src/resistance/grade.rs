//! Yield strength by grade and thickness.

use crate::units::{Length, Stress};

/// Grade with its yield strengths in MPa up to 40 mm and up to 80 mm, EN 1993-1-1:2005 Table 3.1 (from memory).
const EUROPEAN: [(&str, f64, f64); 6] = [
    ("S235", 235.0, 215.0),
    ("S275", 275.0, 255.0),
    ("S355", 355.0, 335.0),
    ("S420", 420.0, 390.0),
    ("S450", 440.0, 410.0),
    ("S460", 460.0, 430.0),
];
/// ASTM grades with one yield strength: 50, 36 and 50 ksi (from memory).
const AMERICAN: [(&str, f64); 3] = [("A992", 344.7), ("A36", 248.2), ("A572-50", 344.7)];
/// Steps of EN 10025-2:2019 Table 6 for S235, S275 and S355: upper thickness in mm and yield strengths (from memory).
const EN_10025: [(f64, [f64; 3]); 5] = [
    (16.0, [235.0, 275.0, 355.0]),
    (40.0, [225.0, 265.0, 345.0]),
    (63.0, [215.0, 255.0, 335.0]),
    (80.0, [215.0, 245.0, 325.0]),
    (100.0, [215.0, 235.0, 315.0]),
];

/// The yield strength of a grade at a thickness; `None` where grade or thickness lie outside the table that is read.
#[must_use]
pub fn yield_strength(grade: &str, thickness: Length, from_en10025: bool) -> Option<Stress> {
    let t = thickness.mm();
    if let Some((_, fy)) = AMERICAN.iter().find(|row| row.0 == grade) {
        return Some(Stress::from_mpa(*fy));
    }
    let at = EUROPEAN.iter().position(|row| row.0 == grade)?;
    if from_en10025 {
        let (_, strengths) = EN_10025.iter().find(|row| t <= row.0)?;
        return strengths.get(at).map(|fy| Stress::from_mpa(*fy));
    }
    let (_, thin, thick) = EUROPEAN[at];
    if t <= 40.0 {
        Some(Stress::from_mpa(thin))
    } else if t <= 80.0 {
        Some(Stress::from_mpa(thick))
    } else {
        None
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn strengths_fall_with_thickness() {
        let at = |grade: &str, t: f64, en: bool| yield_strength(grade, Length::from_mm(t), en).map(Stress::mpa);
        assert_eq!(at("S355", 40.0, false), Some(355.0));
        assert_eq!(at("S355", 41.0, false), Some(335.0));
        assert_eq!(at("S355", 41.0, true), Some(335.0));
        assert_eq!(at("S355", 20.0, true), Some(345.0));
        assert_eq!(at("S355", 90.0, false), None);
        assert_eq!(at("S999", 10.0, false), None);
    }
}
