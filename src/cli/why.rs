//! `why`: what a finding means.

use super::{Ending, Trouble, output};
use crate::design::keys::nearest;
use crate::findings::registry;
use crate::report::why::explanation;

/// Explains a finding, or lists all.
pub fn why(name: Option<&str>) -> Result<Ending, Trouble> {
    let text = match name {
        None => list(),
        Some(name) => match registry::find(&name.to_ascii_lowercase()) {
            Some(found) => explanation(found),
            None => {
                let near = nearest(name, registry::REGISTRY.iter().map(|known| known.name));
                let hint = near.map_or_else(
                    || "`scorchline why` lists all".to_owned(),
                    |near| format!("perhaps `{near}`"),
                );
                return Err(format!("no finding is called `{name}`; {hint}"));
            }
        },
    };
    output::result(None, &text)?;
    Ok(Ending::Clear)
}

fn list() -> String {
    registry::REGISTRY
        .iter()
        .map(|known| format!("{:<30} {:<12} {}\n", known.name, known.severity.word(), known.summary))
        .collect()
}
