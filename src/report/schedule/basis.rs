//! The basis that a schedule rests on.

use serde::Serialize;

use crate::design::model::head::{Basis as Design, Method, Project};

/// The basis of design. Where several designs differ in a value it is `None`.
#[derive(Debug, Clone, Default, PartialEq, Serialize)]
pub struct Basis {
    /// Name of the project.
    pub project: Option<String>,
    /// Its reference.
    pub reference: Option<String>,
    /// Its revision.
    pub revision: Option<String>,
    /// Its status.
    pub status: Option<String>,
    /// Method with its edition; `None` too where it can't be read or is not supported.
    pub method: Option<String>,
    /// Units of the tables: metric or imperial. JSON and CSV have those of their keys.
    pub units: Option<String>,
    /// Currency of the costs.
    pub currency: Option<String>,
    /// Cost of steel per kg.
    pub steel_rate_per_kg: Option<f64>,
    /// Carbon of steel, kg of CO2 equivalent per kg.
    pub steel_carbon_per_kg: Option<f64>,
    /// The named default, °C.
    pub default_critical_temperature_c: Option<f64>,
    /// γM,fi.
    pub gamma_m_fi: Option<f64>,
    /// γM0.
    pub gamma_m0: Option<f64>,
    /// γG.
    pub gamma_permanent: Option<f64>,
    /// γQ,1.
    pub gamma_variable: Option<f64>,
    /// ξ.
    pub xi: Option<f64>,
    /// Where yield strengths come from.
    pub yield_from: Option<String>,
    /// Section tables searched; empty for all.
    pub section_tables: Option<Vec<String>>,
    /// What a hollow section without a finish is: hot finished, cold formed; `None` if not settled.
    pub hollow: Option<String>,
}

/// The basis of one design.
pub(super) fn basis(project: &Project, design: &Design) -> Basis {
    let factors = &design.factors;
    Basis {
        project: project.name.clone(),
        reference: project.reference.clone(),
        revision: project.revision.clone(),
        status: project.status.clone(),
        method: match design.method.value() {
            Some(method) => Some(method.edition().to_owned()),
            None if design.method.is_absent() => Some(Method::default().edition().to_owned()),
            None => None,
        },
        units: Some(if design.imperial { "imperial" } else { "metric" }.to_owned()),
        currency: design.currency.clone(),
        steel_rate_per_kg: design.steel_rate,
        steel_carbon_per_kg: design.carbon_rate,
        default_critical_temperature_c: design.default_critical.value().map(|value| value.celsius()),
        gamma_m_fi: Some(factors.gamma_m_fi),
        gamma_m0: Some(factors.gamma_m0),
        gamma_permanent: Some(factors.permanent),
        gamma_variable: Some(factors.variable),
        xi: Some(factors.xi),
        yield_from: Some(
            if design.yield_from_en10025 {
                "EN 10025"
            } else {
                "EN 1993-1-1 Table 3.1"
            }
            .to_owned(),
        ),
        section_tables: Some(design.section_tables.iter().map(|name| (*name).to_owned()).collect()),
        hollow: design
            .hollow_hot_finished
            .map(|hot| if hot { "hot finished" } else { "cold formed" }.to_owned()),
    }
}

/// What two bases have in common.
pub(super) fn common(a: Basis, b: &Basis) -> Basis {
    fn same<T: PartialEq>(a: Option<T>, b: &Option<T>) -> Option<T> {
        a.filter(|a| b.as_ref() == Some(a))
    }
    Basis {
        project: same(a.project, &b.project),
        reference: same(a.reference, &b.reference),
        revision: same(a.revision, &b.revision),
        status: same(a.status, &b.status),
        method: same(a.method, &b.method),
        units: same(a.units, &b.units),
        currency: same(a.currency, &b.currency),
        steel_rate_per_kg: same(a.steel_rate_per_kg, &b.steel_rate_per_kg),
        steel_carbon_per_kg: same(a.steel_carbon_per_kg, &b.steel_carbon_per_kg),
        default_critical_temperature_c: same(a.default_critical_temperature_c, &b.default_critical_temperature_c),
        gamma_m_fi: same(a.gamma_m_fi, &b.gamma_m_fi),
        gamma_m0: same(a.gamma_m0, &b.gamma_m0),
        gamma_permanent: same(a.gamma_permanent, &b.gamma_permanent),
        gamma_variable: same(a.gamma_variable, &b.gamma_variable),
        xi: same(a.xi, &b.xi),
        yield_from: same(a.yield_from, &b.yield_from),
        section_tables: same(a.section_tables, &b.section_tables),
        hollow: same(a.hollow, &b.hollow),
    }
}
