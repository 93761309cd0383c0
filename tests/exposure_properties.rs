//! What must hold of any section of the catalogue however the fire reaches it: more exposure is never cooler.

use proptest::prelude::*;
use proptest::sample::select;
use scorchline::heating::fire::Fire;
use scorchline::heating::flux::{Bare, Conduction, Emissivity, Insulation, Protected, effective_factor};
use scorchline::section::catalogue::{CatalogueRow, rows};
use scorchline::section::shadow::shadow_factor;
use scorchline::section::{Casing, Exposure, Face, Faces, heated};
use scorchline::units::{Conductivity, Density, Length, SpecificHeat, Time};

fn any_row() -> impl Strategy<Value = &'static CatalogueRow> {
    select(rows().iter().collect::<Vec<_>>())
}

fn any_faces() -> impl Strategy<Value = Faces> {
    proptest::collection::vec(select(Face::ALL.to_vec()), 0..3).prop_map(|faces| faces.into_iter().collect())
}

/// °C of the bare member; none where nothing of it is exposed.
fn bare(row: &CatalogueRow, exposure: Exposure, minutes: f64) -> Option<f64> {
    let geometry = row.geometry();
    let piece = Bare {
        fire: &Fire::Standard,
        factor: effective_factor(heated(geometry, exposure, Casing::Bare).ok()?.factor),
        shadow: shadow_factor(geometry, exposure, true).ok()?,
        emissivity: Emissivity::Steel,
    };
    Some(piece.temperature_at(Time::from_min(minutes)).celsius())
}

/// °C behind 20 mm of a spray, or of boards of the same material.
fn protected(row: &CatalogueRow, exposure: Exposure, casing: Casing, minutes: f64) -> Option<f64> {
    let material = Insulation {
        conduction: Conduction::Constant(Conductivity::from_w_mk(0.12)),
        specific_heat: SpecificHeat::from_j_kgk(1200.0),
        density: Density::from_kg_m3(300.0),
        moisture_delay: None,
    };
    let factor = effective_factor(heated(row.geometry(), exposure, casing).ok()?.factor);
    let piece = Protected::new(&Fire::Standard, factor, &material, Length::from_mm(20.0));
    Some(piece.temperature_at(Time::from_min(minutes)).celsius())
}

proptest! {
    #![proptest_config(ProptestConfig { cases: 256, failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn three_sides_are_never_hotter_than_all_round(row in any_row(), minutes in 10.0..120.0_f64) {
        let (three, all) = (Exposure::ThreeSides, Exposure::AllRound);
        let (some, whole) = (bare(row, three, minutes).unwrap(), bare(row, all, minutes).unwrap());
        prop_assert!(some <= whole + 0.1, "{} bare: {some} {whole}", row.designation);
        for casing in [Casing::Profile, Casing::Box] {
            let some = protected(row, three, casing, minutes).unwrap();
            let whole = protected(row, all, casing, minutes).unwrap();
            prop_assert!(some <= whole + 0.1, "{} {casing:?}: {some} {whole}", row.designation);
        }
    }

    #[test]
    fn more_exposure_is_never_cooler(
        row in any_row(), faces in any_faces(), more in select(Face::ALL.to_vec()), minutes in 10.0..120.0_f64,
    ) {
        let (most, least) = (Exposure::Covered(faces), Exposure::Covered(faces.with(more)));
        if let (Some(most), Some(least)) = (bare(row, most, minutes), bare(row, least, minutes)) {
            prop_assert!(least <= most + 0.1, "{} bare: {least} {most}", row.designation);
        }
        for casing in [Casing::Profile, Casing::Box] {
            let at = |exposure| protected(row, exposure, casing, minutes);
            if let (Some(most), Some(least)) = (at(most), at(least)) {
                prop_assert!(least <= most + 0.1, "{} {casing:?}: {least} {most}", row.designation);
            }
        }
    }
}
