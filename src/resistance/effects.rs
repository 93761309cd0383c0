//! Effects of actions against resistances at temperature, EN 1993-1-2:2005 4.2.3: what is checked, and what is refused.

use crate::resistance::bending::{self, Bent, Kappa};
use crate::resistance::buckling::{self, Lengths};
use crate::resistance::class::{Action, classify};
use crate::resistance::critical::{Actions, Check, Limit, Member, Unverified, lowest, not_covered};
use crate::resistance::search::meets;
use crate::resistance::{shear, tension};
use crate::section::{Properties, Shape};
use crate::units::{Force, Length, Moment};

/// A magnitude that is there and not zero.
///
/// # Errors
/// What is not a number.
fn stated(value: Option<f64>) -> Result<Option<f64>, Unverified> {
    match value {
        Some(value) if !value.is_finite() => not_covered("an effect in fire is not a finite number"),
        value => Ok(value.filter(|value| *value != 0.0)),
    }
}

/// The critical temperature from effects, each held against its resistance.
pub(super) fn by_effects(member: &Member, actions: &Actions) -> Result<Limit, Unverified> {
    let compression = stated(actions.axial_compression.map(Force::kn))?;
    let pull = stated(actions.axial_tension.map(Force::kn))?;
    let moment = stated(actions.bending.map(Moment::knm))?;
    let minor = stated(actions.bending_minor.map(Moment::knm))?;
    let sheared = stated(actions.shear.map(Force::kn))?;
    if compression.is_some_and(|n| n < 0.0) || pull.is_some_and(|n| n < 0.0) {
        return not_covered("an axial force is to be given as a positive number");
    }
    if compression.is_some() && pull.is_some() {
        return not_covered("compression and tension can't act at once");
    }
    let axial = compression.or(pull);
    if axial.is_some() && (moment.is_some() || minor.is_some()) {
        return not_covered("axial force with bending is not yet computed");
    }
    if moment.is_some() && minor.is_some() {
        return not_covered("bending about both axes is not yet computed");
    }
    if minor.is_some() && sheared.is_some() {
        return not_covered("shear with bending about the weak axis is not yet computed");
    }
    let properties = match member.shape.properties() {
        Ok(Some(properties)) => properties,
        Ok(None) => {
            return not_covered(
                "the resistance of a stated section is not known; state the critical temperature instead",
            );
        }
        Err(error) => return Err(Unverified::NotCovered(error.to_string())),
    };
    let mut checks = Vec::new();
    if let Some(force) = compression {
        checks.push(compressed(member, actions, &properties, force)?);
    }
    if let Some(force) = pull {
        let at = meets(force, tension::CLAUSE, |t| {
            tension::resistance(properties.area, member.fy, member.gamma_m_fi, t).kn()
        })?;
        checks.push(Check::new(at, at, tension::CLAUSE, None));
    }
    if let Some(force) = sheared {
        checks.push(in_shear(member, &properties, force.abs())?);
    }
    if let Some(moment) = moment {
        let axis = bending::Axis::Y;
        held_laterally(member, actions, &properties)?;
        checks.push(bent(member, actions, &properties, axis, moment.abs())?);
    }
    if let Some(moment) = minor {
        checks.push(bent(member, actions, &properties, bending::Axis::Z, moment.abs())?);
    }
    lowest(checks)
}

/// A length that is there and sound.
fn length(value: Option<Length>, key: &'static str) -> Result<Length, Unverified> {
    match value {
        None => Err(Unverified::Missing(key)),
        Some(value) if value.mm().is_finite() && value.mm() >= 0.0 => Ok(value),
        Some(_) => Err(Unverified::NotCovered(format!("the {key} is not a length"))),
    }
}

fn compressed(member: &Member, actions: &Actions, properties: &Properties, force: f64) -> Result<Check, Unverified> {
    let y = length(actions.buckling_length, "buckling length")?;
    let z = match actions.buckling_length_minor {
        None => y,
        minor => length(minor, "buckling length minor")?,
    };
    let (axis, slenderness) = buckling::governing_slenderness(&member.shape, properties, member.fy, Lengths { y, z });
    if slenderness > 0.0 && twists(&member.shape) {
        return not_covered("torsional-flexural buckling, which this shape is prone to, is not yet computed");
    }
    let clause = if slenderness > 0.0 {
        axis.clause()
    } else {
        "EN 1993-1-2 4.2.3.2 (4.5), compression"
    };
    let at = meets(force, clause, |t| {
        buckling::resistance(slenderness, properties, member.fy, member.gamma_m_fi, t).kn()
    })?;
    let class = classify(&member.shape, member.fy, Action::Compression);
    Ok(Check::new(at, at, clause, class))
}

/// Whether torsional-flexural buckling can govern over flexural buckling: the shear centre lies off the centroid. An
/// angle is taken by its axis v-v alone, as EN 1993-1-1:2005 BB.1.2 does.
fn twists(shape: &Shape) -> bool {
    match shape {
        Shape::Channel(_) | Shape::TaperChannel(_) | Shape::Tee(_) | Shape::TaperTee(_) => true,
        Shape::WeldedI(i) => i.b_top != i.b_bottom || i.tf_top != i.tf_bottom,
        _ => false,
    }
}

fn in_shear(member: &Member, properties: &Properties, force: f64) -> Result<Check, Unverified> {
    let Some(area) = shear::area(&member.shape, properties) else {
        return not_covered("the shear area of this shape is not known");
    };
    if shear::web_is_slender(&member.shape, member.fy) {
        return not_covered("shear buckling, which the slender web is prone to, is not yet computed");
    }
    let at = meets(force, shear::CLAUSE, |t| {
        shear::resistance(area, member.fy, member.gamma_m_fi, t).kn()
    })?;
    Ok(Check::new(at, at, shear::CLAUSE, None))
}

/// Refuses a beam that can buckle sideways. Hollow and solid sections bent about their weak axis, square and circular
/// ones among them, can't (EN 1993-1-1:2005 6.3.2.1 (2)).
fn held_laterally(member: &Member, actions: &Actions, properties: &Properties) -> Result<(), Unverified> {
    let stiff = match member.shape {
        Shape::RectangularHollow(_) | Shape::CircularHollow(_) | Shape::Flat(_) | Shape::Round(_) => {
            properties.iy_mm4 <= properties.iz_mm4 * (1.0 + 1e-9)
        }
        _ => false,
    };
    if stiff || actions.laterally_restrained || length(actions.lateral_length, "lateral length")?.mm() == 0.0 {
        return Ok(());
    }
    not_covered("lateral-torsional buckling is not yet computed")
}

fn bent(
    member: &Member,
    actions: &Actions,
    properties: &Properties,
    axis: bending::Axis,
    moment: f64,
) -> Result<Check, Unverified> {
    if matches!(member.shape, Shape::Angle(_)) {
        return not_covered("bending of angles is not yet computed");
    }
    let (action, major) = match axis {
        bending::Axis::Y => (Action::Bending, true),
        bending::Axis::Z => (Action::BendingMinor, false),
    };
    let Some(class) = classify(&member.shape, member.fy, action) else {
        return not_covered("the cross-section class in bending is not known");
    };
    let bent = Bent {
        shape: &member.shape,
        properties,
        class: class.class,
        axis,
        fy: member.fy,
        gamma_m_fi: member.gamma_m_fi,
        gamma_m0: member.gamma_m0,
        shear: actions.shear.filter(|_| major),
    };
    let clause = bending::clause(class.class);
    let at = |protected: bool| {
        // Under a slab the temperature differs along the depth, which is no help about z-z.
        let kappa = Kappa::of(member.slab_on_three_sides && major, protected, actions.continuous);
        meets(moment, clause, |t| bending::resistance(&bent, kappa, t).knm())
    };
    Ok(Check::new(at(false)?, at(true)?, clause, Some(class)))
}
