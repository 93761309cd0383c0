//! Source: a coating practice page, bare all round, whole 1/m. Status: published, second-hand. Tolerance:
//! 0.3 %: 551 mm over the rounded area of 16.4 cm² gives the 336 of IPE 140.

use crate::support::{factor, row, within};
use scorchline::section::{Casing, Exposure};

#[test]
fn two_small_sections() {
    for (name, published) in [("IPE 140", 336.0), ("HE 140 A", 253.0)] {
        let heated = factor(row(name).geometry(), Exposure::AllRound, Casing::Bare);
        within(name, heated.factor.per_m(), published, 3e-3);
    }
}
