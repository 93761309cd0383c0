//! Two levels of memo: members by their inputs, and beneath them families of marches.

use std::sync::atomic::{AtomicU64, Ordering};
use std::sync::{Arc, RwLock};

use rustc_hash::FxHashMap;

use crate::analysis::evaluate::evaluate;
use crate::analysis::inputs::Inputs;
use crate::analysis::outcome::Outcome;
use crate::heating::family::Family;
use crate::heating::fire::Fire;
use crate::heating::flux::Insulation;
use crate::protection::requirement::{Demand, Families};
use crate::units::Length;

type FamilyKey = (Fire, u64, u64, u64, u64, Insulation);

/// What was worked out before. Grows with what is asked; one serves a whole check.
#[derive(Debug, Default)]
pub struct Memo {
    members: RwLock<FxHashMap<Inputs, Arc<Outcome>>>,
    families: RwLock<FxHashMap<FamilyKey, Arc<Family>>>,
    evaluated: AtomicU64,
}

impl Memo {
    /// The outcome of a member's inputs.
    #[must_use]
    pub fn outcome(&self, inputs: Inputs) -> Arc<Outcome> {
        if let Some(known) = self
            .members
            .read()
            .ok()
            .and_then(|members| members.get(&inputs).cloned())
        {
            return known;
        }
        self.evaluated.fetch_add(1, Ordering::Relaxed);
        let outcome = Arc::new(evaluate(&inputs, self));
        if let Ok(mut members) = self.members.write() {
            members.insert(inputs, Arc::clone(&outcome));
        }
        outcome
    }

    /// How many members were worked out, those known before not counted.
    #[must_use]
    pub fn evaluated(&self) -> u64 {
        self.evaluated.load(Ordering::Relaxed)
    }
}

impl Families for Memo {
    fn family(&self, demand: &Demand<'_>, insulation: &Insulation, range: (Length, Length)) -> Arc<Family> {
        let key = (
            demand.fire.clone(),
            demand.factor.bits(),
            demand.period.bits(),
            range.0.bits(),
            range.1.bits(),
            insulation.clone(),
        );
        if let Some(known) = self
            .families
            .read()
            .ok()
            .and_then(|families| families.get(&key).cloned())
        {
            return known;
        }
        let family = Arc::new(Family::new(
            demand.fire.clone(),
            demand.factor,
            insulation.clone(),
            demand.period,
            range,
        ));
        if let Ok(mut families) = self.families.write() {
            families.insert(key, Arc::clone(&family));
        }
        family
    }
}
