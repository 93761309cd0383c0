//! Findings: what a design's author should know.
//!
//! Each is declared, and where it is not decided in reading also found, in a file of its own, named after it, under the
//! phase that decides it.

mod context;
pub mod departures;
pub mod design_intent;
pub mod finding;
pub mod fire;
pub mod insert;
pub mod reading;
pub mod registry;
pub mod uses;

use std::sync::Arc;

use jiff::civil::Date;

use self::context::Context;
use self::finding::Finding;
use self::uses::Uses;
use crate::analysis::design::{Design, MemberAt};
use crate::analysis::outcome::Outcome;

/// Every finding that one member tells by itself, on a date.
pub fn member(design: &Design, at: MemberAt, outcome: &Outcome, on: Date, out: &mut Vec<Finding>) {
    let mut cx = Context::new(design, at, outcome, on, out);
    reading::member(&mut cx);
    design_intent::member(&mut cx);
    fire::member(&mut cx);
}

/// Every finding between members; outcomes in the order of the design's members, and what those use.
pub fn between(design: &Design, outcomes: &[Arc<Outcome>], uses: &Uses, out: &mut Vec<Finding>) {
    reading::design(design, uses, out);
    if uses.any_linked() {
        design_intent::design(design, outcomes, out);
    }
}
