//! What the fire really reaches, from the stated exposure and what is said to shield it.

use crate::design::model::member::Shield;
use crate::section::{Exposure, Face};

/// A deck counts as a slab where it touches at least this share of the flange (EN 1994-1-2:2005 4.3.4.2.2; from memory).
pub const CONTACT: f64 = 0.85;

/// Why the exposure that is used differs from the stated one, or rests on something unsaid.
#[derive(Debug, Clone, Copy, PartialEq)]
pub enum ShieldDoubt {
    /// Faces are said to be covered, but nothing is said to cover them. The stated exposure is used.
    NotStated,
    /// Faces are said to be covered, but the shield is none or bare sheeting: computed all round.
    NoShield,
    /// The deck touches less of the flange than counts as a slab, and its voids are not filled: computed all round.
    LowContact(f64),
    /// The deck's contact is not stated, and its voids are not filled: computed all round.
    VoidsOpen,
}

/// The exposure to compute with.
#[derive(Debug, Clone, Copy, PartialEq)]
pub struct Reached {
    /// What the fire reaches.
    pub exposure: Exposure,
    /// Whether a concrete slab lies on the top face (κ1 of EN 1993-1-2 4.2.3.3 (7) may be used, and the beam counts as
    /// restrained).
    pub slab: bool,
    /// What is doubtful about it.
    pub doubt: Option<ShieldDoubt>,
}

/// Resolves stated exposure and shield, on the safe side.
#[must_use]
pub fn reached(exposure: Exposure, shield: Option<Shield>) -> Reached {
    let covers_top = match exposure {
        Exposure::ThreeSides | Exposure::FlangeOnly => true,
        Exposure::Covered(faces) => faces.contains(Face::Top),
        Exposure::AllRound | Exposure::Perimeter(_) => false,
    };
    let covered = covers_top || matches!(exposure, Exposure::Covered(faces) if !faces.is_empty());
    let plain = |slab: bool, doubt: Option<ShieldDoubt>| Reached {
        exposure,
        slab: slab && covers_top,
        doubt,
    };
    let all_round = |doubt| Reached {
        exposure: Exposure::AllRound,
        slab: false,
        doubt: Some(doubt),
    };
    if !covered {
        return plain(false, None);
    }
    match shield {
        None => plain(false, Some(ShieldDoubt::NotStated)),
        Some(
            Shield::None
            | Shield::Deck {
                concrete: Some(false), ..
            },
        ) => all_round(ShieldDoubt::NoShield),
        Some(Shield::Slab) => plain(true, None),
        Some(Shield::Wall) => plain(false, None),
        Some(Shield::Deck { concrete: None, .. }) => all_round(ShieldDoubt::NoShield),
        Some(Shield::Deck {
            voids_filled: Some(true),
            ..
        }) => plain(true, None),
        Some(Shield::Deck {
            contact: Some(contact), ..
        }) if contact >= CONTACT => plain(true, None),
        Some(Shield::Deck {
            contact: Some(contact), ..
        }) => all_round(ShieldDoubt::LowContact(contact)),
        Some(Shield::Deck { contact: None, .. }) => all_round(ShieldDoubt::VoidsOpen),
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    const DECK: Shield = Shield::Deck {
        concrete: Some(true),
        contact: None,
        voids_filled: None,
        re_entrant: None,
    };

    #[test]
    fn a_slab_covers_the_top() {
        let slab = reached(Exposure::ThreeSides, Some(Shield::Slab));
        assert_eq!(
            slab,
            Reached {
                exposure: Exposure::ThreeSides,
                slab: true,
                doubt: None
            }
        );
        assert!(!reached(Exposure::AllRound, Some(Shield::Slab)).slab);
        assert!(!reached(Exposure::ThreeSides, Some(Shield::Wall)).slab);
    }

    #[test]
    fn bare_sheeting_is_no_shield() {
        let sheeting = Shield::Deck {
            concrete: Some(false),
            contact: None,
            voids_filled: None,
            re_entrant: None,
        };
        for shield in [Shield::None, sheeting] {
            let reached = reached(Exposure::ThreeSides, Some(shield));
            assert_eq!(reached.exposure, Exposure::AllRound);
            assert_eq!(reached.doubt, Some(ShieldDoubt::NoShield));
        }
    }

    #[test]
    fn a_deck_counts_by_contact_or_filled_voids() {
        let with = |contact, voids_filled| Shield::Deck {
            concrete: Some(true),
            contact,
            voids_filled,
            re_entrant: None,
        };
        assert_eq!(
            reached(Exposure::ThreeSides, Some(DECK)).doubt,
            Some(ShieldDoubt::VoidsOpen)
        );
        assert!(reached(Exposure::ThreeSides, Some(with(Some(0.85), None))).slab);
        assert!(reached(Exposure::ThreeSides, Some(with(Some(0.5), Some(true)))).slab);
        let low = reached(Exposure::ThreeSides, Some(with(Some(0.5), Some(false))));
        assert_eq!(
            (low.exposure, low.doubt),
            (Exposure::AllRound, Some(ShieldDoubt::LowContact(0.5)))
        );
    }
}
