//! From plain inputs to the outcome: joins section, resistance, heating and protection for one member.

use crate::analysis::inputs::{Cover, Inputs, ProductInput, SectionInput};
use crate::analysis::memo::Memo;
use crate::analysis::outcome::{
    BareState, Buckling, Critical, ExposedSection, Gap, LimitFrom, Outcome, ProtectedState, Verdict,
};
use crate::design::model::head::Factors;
use crate::design::model::member::{Load, Reduction, Role, Steel, Surface};
use crate::heating::fire::Fire;
use crate::heating::flux::{Bare, Emissivity, effective_factor};
use crate::protection::product::{Kind as ProductKind, ShapeClass};
use crate::protection::refusal::Refusal;
use crate::protection::requirement::{self, Demand};
use crate::protection::stock;
use crate::resistance::buckling::{Lengths, governing_slenderness};
use crate::resistance::critical::{self, Actions, Loading, Unverified, critical_temperature};
use crate::resistance::grade::{Grade, YieldSource, governing_thickness, yield_strength};
use crate::resistance::utilisation::{ActionMix, from_ambient, reduction_factor};
use crate::section::shadow::shadow_factor;
use crate::section::{Casing, Exposure, ExposureRefusal, Geometry, Kind, heated};
use crate::units::{Force, Length, SectionFactor, Stress, Temperature, Time};

/// Works out a member. Nothing is claimed that its inputs do not carry.
#[must_use]
pub fn evaluate(inputs: &Inputs, memo: &Memo) -> Outcome {
    let mut outcome = Outcome {
        verdict: Verdict::NotVerified,
        gaps: Vec::new(),
        section: None,
        critical: None,
        bare: None,
        protected: None,
    };
    outcome.gaps.extend(inputs.unread.iter().map(|key| Gap::Unread(key)));
    outcome
        .gaps
        .extend(inputs.not_covered.iter().map(|(key, why)| Gap::NotCovered {
            key,
            why: (*why).to_owned(),
        }));
    let (Some(section), Some(fire)) = (&inputs.section, &inputs.fire) else {
        return outcome;
    };
    let geometry = match section.geometry() {
        Ok(geometry) => geometry,
        Err(error) => {
            outcome.gaps.push(Gap::NotCovered {
                key: "section",
                why: error.to_string(),
            });
            return outcome;
        }
    };
    let casing = match &inputs.cover {
        Cover::Product(product) if product.boxed => Casing::Box,
        Cover::Product(_) => Casing::Profile,
        _ => Casing::Bare,
    };
    let exposed = match exposed(inputs, section, &geometry, casing, fire.is_nominal()) {
        Ok(exposed) => exposed,
        Err(refusal) => {
            outcome.gaps.push(Gap::NotCovered {
                key: "exposure",
                why: refusal.to_string(),
            });
            return outcome;
        }
    };
    outcome.section = Some(exposed.clone());
    let mut cold = false;
    if inputs.not_covered.iter().any(|(key, _)| *key != "method") {
        return outcome;
    }
    let found = (!limit_is_hidden(inputs)).then(|| limit(inputs, section, &geometry));
    match found {
        None => {}
        Some(Ok(critical)) => {
            if let Some(section) = &mut outcome.section {
                section.class = critical.1;
            }
            outcome.critical = Some(critical.0);
        }
        Some(Err(Unverified::FailsCold { utilisation, .. })) => {
            cold = true;
            outcome.gaps.push(Gap::FailsCold(utilisation));
        }
        Some(Err(Unverified::Missing(key))) => outcome.gaps.push(Gap::Missing(key)),
        Some(Err(Unverified::NotCovered(why))) => outcome.gaps.push(Gap::CriticalTemperature(why)),
    }
    let piece = bare_piece(inputs, fire, &exposed);
    let history = memo.bare(&piece);
    let limit = outcome.critical.as_ref();
    outcome.bare = Some(BareState {
        at_period: inputs.period.map(|period| history.temperature_at(&piece, period)),
        resistance: limit.and_then(|limit| history.time_to(&piece, limit.bare)),
    });
    if let (Cover::Product(product), Some(limit), Some(period)) = (&inputs.cover, limit, inputs.period) {
        let demand = demand(inputs, fire, &exposed, geometry.kind, (limit.protected, period));
        outcome.protected = Some(protect(product, &demand, memo));
    }
    outcome.verdict = verdict(inputs, &outcome, cold);
    outcome
}

/// The member without protection.
pub(super) fn bare_piece<'a>(inputs: &Inputs, fire: &'a Fire, exposed: &ExposedSection) -> Bare<'a> {
    Bare {
        fire,
        factor: effective_factor(exposed.bare_factor),
        shadow: exposed.shadow_factor,
        emissivity: match inputs.surface {
            Surface::GalvanisedTo { category: 'A' | 'B' } => Emissivity::Galvanised,
            _ => Emissivity::Steel,
        },
    }
}

/// What is asked of its protection.
pub(super) fn demand<'a>(
    inputs: &Inputs,
    fire: &'a Fire,
    exposed: &ExposedSection,
    kind: Option<Kind>,
    (limit, period): (Temperature, Time),
) -> Demand<'a> {
    asked(inputs, fire, exposed.factor, kind, (limit, period))
}

/// What a member would ask of a protection that encases it at a section factor; `limit` is the critical temperature of
/// the protected member. `None` where its section, fire or period is not known, or no fire resistance is wanted.
#[must_use]
pub fn demand_at(inputs: &Inputs, factor: SectionFactor, limit: Temperature) -> Option<Demand<'_>> {
    let kind = inputs.section.as_ref()?.shape.geometry().ok()?.kind;
    let fire = inputs.fire.as_ref()?;
    Some(asked(inputs, fire, factor, kind, (limit, inputs.period?)))
}

fn asked<'a>(
    inputs: &Inputs,
    fire: &'a Fire,
    factor: SectionFactor,
    kind: Option<Kind>,
    (limit, period): (Temperature, Time),
) -> Demand<'a> {
    Demand {
        fire,
        factor: effective_factor(factor),
        limit,
        period,
        shape: shape_class(kind),
        sides: sides(inputs.reached.exposure, inputs.role),
        beam: inputs.role.is_some_and(Role::reads_as_beam),
    }
}

fn exposed(
    inputs: &Inputs,
    section: &SectionInput,
    geometry: &Geometry,
    casing: Casing,
    nominal: bool,
) -> Result<ExposedSection, ExposureRefusal> {
    let exposure = inputs.reached.exposure;
    let bare = heated(geometry, exposure, Casing::Bare)?;
    let own = heated(geometry, exposure, casing)?;
    Ok(ExposedSection {
        shape: section.shape.name(),
        area: geometry.area,
        mass_per_m: section.mass.unwrap_or(geometry.mass.kg_m()),
        heated_perimeter: own.perimeter,
        factor: own.factor,
        bare_factor: bare.factor,
        box_factor: heated(geometry, exposure, Casing::Box).ok().map(|heated| heated.factor),
        shadow_factor: shadow_factor(geometry, exposure, nominal)?,
        class: None,
        below_ten: own.factor.per_m() < crate::heating::flux::LEAST_FACTOR,
    })
}

fn shape_class(kind: Option<Kind>) -> ShapeClass {
    match kind {
        Some(Kind::RectangularHollow) => ShapeClass::RectangularHollow,
        Some(Kind::CircularHollow) => ShapeClass::CircularHollow,
        Some(Kind::Solid) => ShapeClass::Solid,
        Some(Kind::Open) | None => ShapeClass::Open,
    }
}

fn sides(exposure: Exposure, role: Option<Role>) -> u8 {
    let beam = role.is_some_and(Role::reads_as_beam);
    if beam && matches!(exposure, Exposure::ThreeSides | Exposure::FlangeOnly) {
        3
    } else {
        4
    }
}

/// The critical temperature with the cross-section class.
fn limit(inputs: &Inputs, section: &SectionInput, geometry: &Geometry) -> Result<(Critical, Option<u8>), Unverified> {
    if let Some(stated) = inputs.stated {
        let by_loading = match &inputs.loading {
            Some(loading) => match by_loading(inputs, loading, section, geometry) {
                // No stated temperature saves a member that fails cold.
                Err(fails @ Unverified::FailsCold { .. }) => return Err(fails),
                derived => derived.ok(),
            },
            None => None,
        };
        let critical = Critical {
            as_built: stated,
            bare: stated,
            protected: stated,
            by_loading: by_loading.as_ref().map(|(critical, _)| critical.as_built),
            from: LimitFrom::Stated,
            governing: "stated".to_owned(),
            buckling: None,
        };
        return Ok((critical, by_loading.and_then(|(_, class)| class)));
    }
    match &inputs.loading {
        Some(loading) => by_loading(inputs, loading, section, geometry),
        None => default_limit(inputs),
    }
}

/// Whether what is written of the limit can't be read, or may stand where nothing can be read, such as under a misspelt
/// key: that is told at its place, and nothing is taken in its stead.
fn limit_is_hidden(inputs: &Inputs) -> bool {
    let unread = |keys: &[&str]| inputs.unread.iter().any(|key| keys.contains(key));
    unread(&["critical temperature"])
        || inputs.stated.is_none() && unread(&["loading"])
        || inputs.stated.is_none() && inputs.loading.is_none() && unread(&["member", "key", "group"])
}

fn by_loading(
    inputs: &Inputs,
    loading: &crate::design::model::member::Loading,
    section: &SectionInput,
    geometry: &Geometry,
) -> Result<(Critical, Option<u8>), Unverified> {
    let bare = matches!(inputs.cover, Cover::Bare);
    let role = inputs.role.unwrap_or(Role::Beam);
    let member = critical::Member {
        shape: section.shape,
        fy: strength(inputs, geometry, section)?,
        gamma_m_fi: inputs.factors.gamma_m_fi,
        gamma_m0: inputs.factors.gamma_m0,
        compression_member: matches!(role, Role::Column | Role::Brace),
        tension_member: role.is_tie(),
        slab_on_three_sides: inputs.reached.slab,
    };
    let limit = critical_temperature(&member, &resolve(&loading.load, &loading.restraint, inputs, role)?)?;
    let critical = Critical {
        as_built: if bare { limit.bare } else { limit.protected },
        bare: limit.bare,
        protected: limit.protected,
        by_loading: None,
        from: LimitFrom::Loading,
        governing: if bare { limit.governing_bare } else { limit.governing },
        buckling: ignored_buckling(loading, section, member.fy, role),
    };
    Ok((critical, limit.class))
}

/// The least slenderness from which on buckling counts (EN 1993-1-1:2005 6.3.1.2 (4)).
const STOCKY: f64 = 0.2;

/// What a utilisation leaves out: (4.22) is not for members whose stability is to be considered (EN 1993-1-2:2005 4.2.4
/// (2)), as that of all that may be compressed is.
fn ignored_buckling(
    loading: &crate::design::model::member::Loading,
    section: &SectionInput,
    fy: Stress,
    role: Role,
) -> Option<Buckling> {
    let alone = matches!(loading.load, Load::Utilisation(_) | Load::Ambient { .. });
    if !alone || role.reads_as_beam() || role.is_tie() {
        return None;
    }
    let restraint = &loading.restraint;
    let (Some(major), Ok(Some(properties))) = (restraint.buckling_length, section.shape.properties()) else {
        return Some(Buckling::LengthUnknown);
    };
    let lengths = Lengths {
        y: major,
        z: restraint.buckling_length_minor.unwrap_or(major),
    };
    let (_, slenderness) = governing_slenderness(&section.shape, &properties, fy, lengths);
    (slenderness > STOCKY).then_some(Buckling::Slender(slenderness))
}

fn default_limit(inputs: &Inputs) -> Result<(Critical, Option<u8>), Unverified> {
    let role = inputs.role.unwrap_or(Role::Column);
    let restrained_beam = role.reads_as_beam() && inputs.reached.slab;
    match inputs.default_critical {
        Some(t) if restrained_beam || role.is_tie() => Ok((
            Critical {
                as_built: t,
                bare: t,
                protected: t,
                by_loading: None,
                from: LimitFrom::Default,
                governing: "the named default of the basis of design".to_owned(),
                buckling: None,
            },
            None,
        )),
        _ => Err(Unverified::NotCovered(
            "neither a critical temperature nor `loading` is given".to_owned(),
        )),
    }
}

fn strength(inputs: &Inputs, geometry: &Geometry, section: &SectionInput) -> Result<Stress, Unverified> {
    match &inputs.steel {
        Some(Steel::Yield(fy)) => Ok(*fy),
        Some(Steel::Grade(name)) => {
            let refused = |why: &str| Unverified::NotCovered(why.to_owned());
            let grade = Grade::from_name(name).ok_or_else(|| refused("the grade of steel is not known"))?;
            let thickness = governing_thickness(&section.shape)
                .or_else(|| geometry.flange.map(|flange| flange.thickness))
                .ok_or_else(|| refused("the yield strength goes by a thickness; state `steel: {yield: ..}`"))?;
            let source = if inputs.yield_from_en10025 {
                YieldSource::En10025
            } else {
                YieldSource::Table31
            };
            yield_strength(grade, thickness, source).map_err(|error| Unverified::NotCovered(error.to_string()))
        }
        None => Err(Unverified::Missing("steel")),
    }
}

fn resolve(
    load: &Load,
    restraint: &crate::design::model::member::Restraint,
    inputs: &Inputs,
    role: Role,
) -> Result<Loading, Unverified> {
    let Factors {
        permanent,
        variable,
        xi,
        gamma_m_fi,
        gamma_m0,
    } = inputs.factors;
    match load {
        Load::Utilisation(mu) => Ok(Loading::Utilisation(*mu)),
        Load::Ambient { utilisation, reduction } => {
            let eta = match reduction {
                Reduction::Factor(eta) => Some(*eta),
                Reduction::Actions {
                    permanent: gk,
                    variable: qk,
                    combination,
                } => reduction_factor(&ActionMix {
                    permanent: *gk,
                    variable: *qk,
                    combination: *combination,
                    gamma_permanent: permanent,
                    gamma_variable: variable,
                    xi,
                }),
            };
            let eta =
                eta.ok_or_else(|| Unverified::NotCovered("the design load at 20 °C is not positive".to_owned()))?;
            Ok(Loading::Utilisation(from_ambient(
                *utilisation,
                eta,
                gamma_m_fi,
                gamma_m0,
            )))
        }
        Load::Ratio(_) => Err(Unverified::NotCovered(
            "a load ratio belongs to AS 4100, which is not yet computed".to_owned(),
        )),
        Load::Effects(effects) => {
            // Compression is positive, in ties and hangers tension.
            let pulls = |force: Force| role.is_tie() == (force.kn() > 0.0);
            let size = |force: Force| Force::from_kn(force.kn().abs());
            Ok(Loading::Effects(Actions {
                axial_compression: effects.axial.filter(|force| !pulls(*force)).map(size),
                axial_tension: effects.axial.filter(|force| pulls(*force)).map(size),
                bending: effects.bending,
                bending_minor: effects.bending_minor,
                shear: effects.shear,
                buckling_length: restraint.buckling_length,
                buckling_length_minor: restraint.buckling_length_minor,
                lateral_length: restraint.lateral_length,
                laterally_restrained: inputs.reached.slab,
                continuous: restraint.continuous,
            }))
        }
    }
}

fn protect(input: &ProductInput, demand: &Demand<'_>, memo: &Memo) -> ProtectedState {
    let product = &input.product;
    let requirement = if input.fire_assessed {
        requirement::requirement(product, demand, memo)
    } else {
        Err(Refusal::FireNotAssessed)
    };
    let coating = product.kind == ProductKind::Coating;
    let stated = !input.layers.is_empty();
    let layers = if stated {
        Some(input.layers.clone())
    } else {
        requirement
            .as_ref()
            .ok()
            .and_then(|needed| needed.next.clone())
            .map(|up| up.layers)
    };
    let provided = layers
        .as_ref()
        .map(|layers| Length::from_mm(layers.iter().map(|layer| layer.mm()).sum()));
    let performance = match (&requirement, provided) {
        (Ok(_) | Err(Refusal::TooSlender { .. }), Some(provided)) if provided.mm() > 0.0 => {
            Some(requirement::performance(product, demand, provided, memo))
        }
        _ => None,
    };
    let outside = provided.and_then(|provided| requirement::outside_thickness(product, provided));
    ProtectedState {
        outside_thickness: outside,
        largest_factor: matches!(requirement, Err(Refusal::TooSlender { .. }))
            .then(|| requirement::largest_factor(product, demand))
            .flatten(),
        provided,
        stated,
        layers: match (coating, provided) {
            (true, Some(film)) => stock::coats(product, film),
            _ => layers.map(|layers| layers.len() as u32),
        },
        at_period: performance.and_then(|performance| performance.at_period),
        resistance: performance.and_then(|performance| performance.resistance),
        requirement,
    }
}

fn verdict(inputs: &Inputs, outcome: &Outcome, cold: bool) -> Verdict {
    let Some(period) = inputs.period else {
        return if inputs.unread.contains(&"period") {
            Verdict::NotVerified
        } else {
            Verdict::NoPeriod
        };
    };
    if inputs.incomplete() || matches!(inputs.cover, Cover::Unknown) {
        return Verdict::NotVerified;
    }
    if cold {
        return Verdict::Fails;
    }
    // A stated temperature that the loading contradicts proves nothing.
    if outcome
        .critical
        .as_ref()
        .is_none_or(|critical| critical.contradicted_by().is_some())
    {
        return Verdict::NotVerified;
    }
    if let Some(protected) = &outcome.protected {
        return match &protected.requirement {
            Ok(needed) if !needed.unstated.is_empty() || protected.outside_thickness.is_some() => Verdict::NotVerified,
            Ok(needed) => match protected.provided {
                Some(provided) if provided.mm() + 1e-9 >= needed.exact.mm() => Verdict::Passes,
                Some(_) => Verdict::Fails,
                None => Verdict::CannotBeProtected,
            },
            Err(Refusal::TooSlender { .. }) => Verdict::CannotBeProtected,
            Err(_) => Verdict::NotVerified,
        };
    }
    let lasts = |resistance: Option<Time>| resistance.is_none_or(|time| time.min() >= period.min());
    match outcome.bare {
        Some(bare) if lasts(bare.resistance) => Verdict::Passes,
        Some(_) => Verdict::Fails,
        None => Verdict::NotVerified,
    }
}
