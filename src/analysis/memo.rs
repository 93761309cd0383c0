//! Two levels of memo: members by their inputs, and beneath them families of marches.
//!
//! Each keeps two generations. What is asked for lives on in the young one; when that has grown past what the design at
//! hand can need, it becomes the old one, and what nobody asked for since is dropped.

use std::hash::{BuildHasher, Hash};
use std::sync::atomic::{AtomicU64, Ordering};
use std::sync::{Arc, Mutex, PoisonError};

use rustc_hash::{FxBuildHasher, FxHashMap};

use crate::analysis::evaluate::evaluate;
use crate::analysis::inputs::Inputs;
use crate::analysis::outcome::Outcome;
use crate::heating::family::Family;
use crate::heating::fire::Fire;
use crate::heating::flux::{Bare, Emissivity, Insulation, Protected};
use crate::heating::history::History;
use crate::protection::requirement::{Demand, Families};
use crate::units::Length;

type FamilyKey = (Fire, u64, u64, u64, u64, Insulation);

/// What a march depends on, numbers by their bits.
#[derive(Debug, Clone, PartialEq, Eq, Hash)]
enum HistoryKey {
    /// Fire, section factor, shadow factor and surface.
    Bare(Fire, u64, u64, Emissivity),
    /// Fire, section factor, thickness and material.
    Protected(Fire, u64, u64, Insulation),
}

/// What was worked out before.
#[derive(Debug, Default)]
pub struct Memo {
    members: Shelves<Inputs, Outcome>,
    families: Shelves<FamilyKey, Family>,
    histories: Shelves<HistoryKey, History>,
    evaluated: AtomicU64,
}

/// How many results are kept beyond what a design needs: enough to undo far back.
const SPARE: usize = 4096;
/// The most families of marches in a generation; one has some tens of kilobytes.
const FAMILIES: usize = 512;
/// The most marches in a generation; one has a few kilobytes.
const HISTORIES: usize = 4096;

impl Memo {
    /// The outcome of a member's inputs.
    #[must_use]
    pub fn outcome(&self, inputs: Inputs) -> Arc<Outcome> {
        if let Some(known) = self.members.get(&inputs) {
            return known;
        }
        self.evaluated.fetch_add(1, Ordering::Relaxed);
        let outcome = Arc::new(evaluate(&inputs, self));
        self.members.put(inputs, &outcome);
        outcome
    }

    /// The march of a bare member.
    #[must_use]
    pub fn bare(&self, piece: &Bare<'_>) -> Arc<History> {
        let (factor, shadow) = (piece.factor.bits(), piece.shadow.to_bits());
        let key = HistoryKey::Bare(piece.fire.clone(), factor, shadow, piece.emissivity);
        self.histories.get_or(key, || History::of_bare(piece))
    }

    /// How many members were worked out, those known before not counted.
    #[must_use]
    pub fn evaluated(&self) -> u64 {
        self.evaluated.load(Ordering::Relaxed)
    }

    /// Lets go of what has not been asked for lately, by the number of members of the designs at hand.
    pub fn settle(&self, members: usize) {
        self.members.settle(2 * members + SPARE);
        self.families.settle(FAMILIES);
        self.histories.settle(HISTORIES);
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
        self.families.get_or(key, || {
            Family::new(
                demand.fire.clone(),
                demand.factor,
                insulation.clone(),
                demand.period,
                range,
            )
        })
    }

    fn history(
        &self,
        piece: &Protected<'_>,
        insulation: &Insulation,
        demand: &Demand<'_>,
        thickness: Length,
    ) -> Arc<History> {
        let (factor, thickness) = (demand.factor.bits(), thickness.bits());
        let key = HistoryKey::Protected(demand.fire.clone(), factor, thickness, insulation.clone());
        self.histories.get_or(key, || History::of_protected(piece))
    }
}

/// Shelves that threads seldom have to wait for each other at.
#[derive(Debug)]
struct Shelves<K, V>([Mutex<Generations<K, V>>; SHELVES]);

const SHELVES: usize = 16;

#[derive(Debug)]
struct Generations<K, V> {
    young: FxHashMap<K, Arc<V>>,
    old: FxHashMap<K, Arc<V>>,
}

impl<K, V> Default for Shelves<K, V> {
    fn default() -> Self {
        Self(std::array::from_fn(|_| {
            Mutex::new(Generations {
                young: FxHashMap::default(),
                old: FxHashMap::default(),
            })
        }))
    }
}

impl<K: Hash + Eq, V> Shelves<K, V> {
    fn shelf(&self, key: &K) -> std::sync::MutexGuard<'_, Generations<K, V>> {
        let hash = FxBuildHasher.hash_one(key);
        let shelf = &self.0[(hash >> 32) as usize % SHELVES];
        // A panic elsewhere leaves a map whole: each insertion is one step.
        shelf.lock().unwrap_or_else(PoisonError::into_inner)
    }

    fn get(&self, key: &K) -> Option<Arc<V>> {
        let mut shelf = self.shelf(key);
        if let Some(known) = shelf.young.get(key) {
            return Some(Arc::clone(known));
        }
        let (key, known) = shelf.old.remove_entry(key)?;
        shelf.young.insert(key, Arc::clone(&known));
        Some(known)
    }

    fn get_or(&self, key: K, make: impl FnOnce() -> V) -> Arc<V> {
        if let Some(known) = self.get(&key) {
            return known;
        }
        let made = Arc::new(make());
        self.put(key, &made);
        made
    }

    fn put(&self, key: K, value: &Arc<V>) {
        self.shelf(&key).young.insert(key, Arc::clone(value));
    }

    fn settle(&self, most: usize) {
        for shelf in &self.0 {
            let mut shelf = shelf.lock().unwrap_or_else(PoisonError::into_inner);
            if shelf.young.len() > most.div_ceil(SHELVES) {
                shelf.old = std::mem::take(&mut shelf.young);
            }
        }
    }
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn what_is_asked_for_stays_and_the_rest_goes() {
        let shelves = Shelves::<u32, u32>::default();
        for key in 0..2000 {
            shelves.put(key, &Arc::new(key));
        }
        shelves.settle(1000);
        assert_eq!(shelves.get(&7).as_deref(), Some(&7));
        for key in 2000..4000 {
            shelves.put(key, &Arc::new(key));
        }
        shelves.settle(1000);
        assert_eq!(shelves.get(&7).as_deref(), Some(&7));
        assert_eq!(shelves.get(&8), None);
    }
}
