//! Decoding a member, a group or the defaults.

use crate::design::decode::loading;
use crate::design::decode::protection;
use crate::design::decode::reader::{Reader, same_word};
use crate::design::decode::section;
use crate::design::given::Given;
use crate::design::keys::Key;
use crate::design::keys::member as table;
use crate::design::model::member::{
    Agreed, Connection, Departure, Environment, Extent, Location, Member, MemberKeys, Openings, Period, Role, Shield,
    StatedTemperature, Steel, Surface,
};
use crate::design::slip::SlipKind;
use crate::section::{Exposure, Face, Faces};
use crate::syntax::{Node, Value};
use crate::text::Spanned;
use crate::units::{Length, Stress, Temperature, Time};

/// Whose keys are decoded.
#[derive(Debug, Clone, Copy, PartialEq, Eq)]
pub enum Owner {
    /// A member of the list.
    Member,
    /// A group.
    Group,
    /// The defaults.
    Defaults,
}

impl Owner {
    const fn words(self) -> &'static str {
        match self {
            Self::Member => "a member",
            Self::Group => "a group",
            Self::Defaults => "`defaults`",
        }
    }
}

/// Decodes an item of `members`.
pub fn member(reader: &mut Reader, node: &Node, broken: bool) -> Member {
    let mut member = Member {
        broken,
        extent: Extent(node.span),
        ..Member::default()
    };
    if matches!(node.value, Value::Null) {
        reader.slip(
            SlipKind::WrongKind,
            node,
            "an empty entry: a member is a mapping that begins with `mark`",
        );
        return member;
    }
    let mut keys = MemberKeys::default();
    let is_mapping = reader.entries(
        node,
        table::MEMBER,
        Owner::Member.words(),
        |reader, key, entry| match key.name {
            "mark" => member.mark = reader.text(&entry.value, key),
            "departures" => member.departures = departures(reader, &entry.value, key),
            _ => member_key(reader, &mut keys, key, &entry.value, Owner::Member),
        },
    );
    keys.strange = has_strange_keys(reader, node);
    member.keys = keys;
    if is_mapping && member.mark.is_absent() && !broken {
        reader.missing(node.span, "mark", "a member");
    }
    member
}

/// Decodes the keys of a group or of the defaults.
pub fn shared_keys(reader: &mut Reader, node: &Node, owner: Owner) -> MemberKeys {
    let mut keys = MemberKeys::default();
    if matches!(node.value, Value::Null) {
        return keys;
    }
    reader.entries(node, table::MEMBER, owner.words(), |reader, key, entry| {
        match key.name {
            "mark" | "departures" => {
                let text = format!(
                    "`{}` belongs to a single member; {} can't carry it",
                    key.name,
                    owner.words()
                );
                reader.slip(SlipKind::UnknownKey, &entry.key, text);
            }
            "group" if owner == Owner::Group => {
                reader.slip(
                    SlipKind::UnknownKey,
                    &entry.key,
                    "groups don't nest: a group can't name another",
                );
            }
            _ => member_key(reader, &mut keys, key, &entry.value, owner),
        }
    });
    keys.strange = has_strange_keys(reader, node);
    keys
}

/// Whether a mapping of member keys has one that is not known, or one twice, and a verdict may rest on what was meant.
/// Only where something is wrong at all is it gone through again.
fn has_strange_keys(reader: &Reader, node: &Node) -> bool {
    let Value::Mapping(entries) = &node.value else {
        return true;
    };
    let mut seen: Vec<&str> = Vec::new();
    !reader.slips.is_empty()
        && entries.iter().any(|entry| {
            let Value::Scalar(name) = &entry.key.value else {
                return true;
            };
            let known = Key::find(table::MEMBER, &name.text).is_some() && !seen.contains(&name.text.as_str());
            seen.push(&name.text);
            let meant = Key::nearest(table::MEMBER, &name.text);
            !known && meant.is_none_or(|meant| !table::ASIDE.contains(&meant))
        })
}

fn member_key(reader: &mut Reader, keys: &mut MemberKeys, key: &'static Key, node: &Node, owner: Owner) {
    match key.name {
        "group" => keys.group = reader.text(node, key),
        "location" => keys.location = location(reader, node),
        "drawing" => keys.drawing = reader.text(node, key),
        "revision" => keys.revision = reader.text(node, key),
        "note" => keys.note = reader.text(node, key),
        "count" => keys.count = reader.whole(node, key),
        "length" => keys.length = reader.quantity(node, key).map(Length::from_mm),
        "role" => keys.role = reader.choice(node, key).map(|at| Role::ALL[at]),
        "section" => keys.section = section::section(reader, node, key),
        "openings" => keys.openings = openings(reader, node),
        "taper" => keys.taper = taper(reader, node),
        "steel" => keys.steel = steel(reader, node, key),
        "surface" => keys.surface = surface(reader, node, key),
        "exposure" => keys.exposure = exposure(reader, node, key),
        "shielded by" => keys.shield = shield(reader, node, key),
        "environment" => keys.environment = environment(reader, node, key),
        "period" => keys.period = period(reader, node, key),
        "fire" => keys.fire = reader.text(node, key),
        "critical temperature" => keys.critical_temperature = critical(reader, node, key),
        "loading" => keys.loading = loading::loading(reader, node),
        "protection" => keys.protection = protection::protection(reader, node, key),
        "supported by" => keys.supported_by = reader.names(node, key),
        "steadies" => keys.steadies = reader.names(node, key),
        "connection" => keys.connection = connection(reader, node),
        "restrained" => keys.restrained = reader.yes_no(node, key),
        other => reader.slip(
            SlipKind::UnknownKey,
            node,
            format!("{} can't carry `{other}`", owner.words()),
        ),
    }
}

/// Environment from its index among the table's words, letters first.
pub fn environment(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Environment> {
    const ORDER: [Environment; 4] = [Environment::X, Environment::Y, Environment::Z1, Environment::Z2];
    reader.choice(node, key).map(|at| ORDER[at % ORDER.len()])
}

fn location(reader: &mut Reader, node: &Node) -> Given<Box<Location>> {
    let mut location = Location::default();
    let read = reader.entries(node, table::LOCATION, "`location`", |reader, key, entry| {
        let text = reader.text(&entry.value, key).value().cloned();
        match key.name {
            "level" => location.level = text,
            "grid" => location.grid = text,
            "zone" => location.zone = text,
            _ => location.phase = text,
        }
    });
    if read {
        Given::new(Box::new(location), node.span)
    } else {
        Given::unreadable(node.span)
    }
}

fn openings(reader: &mut Reader, node: &Node) -> Given<Box<Openings>> {
    let mut openings = Openings {
        shape: "",
        width: None,
        height: None,
        spacing: None,
        web_below: None,
    };
    let before = reader.slips.len();
    let read = reader.entries(node, table::OPENINGS, "`openings`", |reader, key, entry| {
        let node = &entry.value;
        match key.name {
            "shape" => {
                openings.shape = reader
                    .choice(node, key)
                    .value()
                    .map_or("", |at| key.kind.choices()[*at]);
            }
            "diameter" | "width" => openings.width = length(reader, node, key),
            "height" => openings.height = length(reader, node, key),
            "spacing" => openings.spacing = length(reader, node, key),
            _ => openings.web_below = length(reader, node, key),
        }
    });
    if read {
        reader.wanted(node, table::OPENINGS, "`openings`");
    }
    if read && reader.slips.len() == before {
        Given::new(Box::new(openings), node.span)
    } else {
        Given::unreadable(node.span)
    }
}

fn taper(reader: &mut Reader, node: &Node) -> Given<Vec<Length>> {
    let mut depths = Vec::new();
    let before = reader.slips.len();
    let read = reader.entries(node, table::TAPER, "`taper`", |reader, key, entry| {
        for node in reader.list(&entry.value) {
            depths.extend(length(reader, node, key));
        }
    });
    if read && reader.slips.len() == before {
        Given::new(depths, node.span)
    } else {
        Given::unreadable(node.span)
    }
}

fn length(reader: &mut Reader, node: &Node, key: &'static Key) -> Option<Length> {
    reader.quantity(node, key).value().map(|mm| Length::from_mm(*mm))
}

fn steel(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Steel> {
    if matches!(node.value, Value::Mapping(_)) {
        let mut steel = Given::unreadable(node.span);
        if reader.entries(node, table::STEEL, "`steel`", |reader, key, entry| {
            if let Some(mpa) = reader.quantity(&entry.value, key).value() {
                steel = Given::new(Steel::Yield(Stress::from_mpa(*mpa)), node.span);
            }
        }) {
            reader.wanted(node, table::STEEL, "`steel`");
        }
        return steel;
    }
    reader
        .word(node, key, table::GRADES, SlipKind::UnknownSteel)
        .map(|at| Steel::Grade(table::GRADES[at]))
}

fn surface(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Surface> {
    if !matches!(node.value, Value::Mapping(_)) {
        return reader
            .choice(node, key)
            .map(|at| if at == 0 { Surface::Plain } else { Surface::Galvanised });
    }
    let mut surface = Given::unreadable(node.span);
    let whole = node.span;
    if reader.entries(node, table::SURFACE, "`surface`", |reader, _, entry| {
        let before = reader.slips.len();
        let mut category = None;
        if reader.entries(&entry.value, table::GALVANISED, "`galvanised`", |reader, key, entry| {
            let read = reader.choice(&entry.value, key);
            if key.name == "category" {
                category = read.value().map(|at| ['A', 'B', 'C', 'D'][*at]);
            }
        }) {
            reader.wanted(&entry.value, table::GALVANISED, "`galvanised`");
        }
        if let (Some(category), true) = (category, reader.slips.len() == before) {
            surface = Given::new(Surface::GalvanisedTo { category }, whole);
        }
    }) {
        reader.wanted(node, table::SURFACE, "`surface`");
    }
    surface
}

fn exposure(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Exposure> {
    if !matches!(node.value, Value::Mapping(_)) {
        return reader.choice(node, key).map(|at| match at {
            0 => Exposure::AllRound,
            1 => Exposure::ThreeSides,
            _ => Exposure::FlangeOnly,
        });
    }
    let mut exposure = Given::unreadable(node.span);
    let read = reader.entries(node, table::EXPOSURE, "`exposure`", |reader, key, entry| {
        if key.name == "perimeter" {
            if let Some(perimeter) = length(reader, &entry.value, key) {
                exposure = Given::new(Exposure::Perimeter(perimeter), node.span);
            }
            return;
        }
        let mut faces = Faces::NONE;
        let mut all = true;
        for face in reader.list(&entry.value) {
            match reader.choice(face, key).value() {
                Some(at) => faces = faces.with([Face::Top, Face::Bottom, Face::Left, Face::Right][*at]),
                None => all = false,
            }
        }
        if all {
            exposure = Given::new(Exposure::Covered(faces), node.span);
        }
    });
    if read && node.get("covered").is_none() && node.get("perimeter").is_none() {
        reader.missing(node.span, "covered", "`exposure`");
    }
    exposure
}

fn shield(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Shield> {
    if !matches!(node.value, Value::Mapping(_)) {
        return reader
            .choice(node, key)
            .map(|at| [Shield::Slab, Shield::Wall, Shield::None][at]);
    }
    let before = reader.slips.len();
    let (mut concrete, mut contact, mut voids_filled, mut re_entrant) = (None, None, None, None);
    if reader.entries(node, table::SHIELD, "`shielded by`", |reader, _, entry| {
        reader.entries(&entry.value, table::DECK, "`deck`", |reader, key, entry| {
            match key.name {
                "concrete" => concrete = reader.yes_no(&entry.value, key).value().copied(),
                "contact" => contact = reader.quantity(&entry.value, key).value().copied(),
                "voids filled" => voids_filled = reader.yes_no(&entry.value, key).value().copied(),
                _ => re_entrant = reader.choice(&entry.value, key).value().map(|at| *at == 1),
            }
        });
    }) {
        reader.wanted(node, table::SHIELD, "`shielded by`");
    }
    if reader.slips.len() > before {
        return Given::unreadable(node.span);
    }
    Given::new(
        Shield::Deck {
            concrete,
            contact,
            voids_filled,
            re_entrant,
        },
        node.span,
    )
}

fn period(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<Period> {
    if !matches!(node.value, Value::Mapping(_)) {
        return reader.period(node, key).map(|min| Period::Of(Time::from_min(min)));
    }
    let (mut none, mut because) = (false, None);
    if !reader.entries(node, table::PERIOD, "`period`", |reader, key, entry| {
        if key.name == "none" {
            none = reader.yes_no(&entry.value, key).value().copied().unwrap_or(false);
        } else {
            because = reader.text(&entry.value, key).value().cloned();
        }
    }) {
        return Given::unreadable(node.span);
    }
    reader.wanted(node, table::PERIOD, "`period`");
    if none {
        Given::new(Period::None { because }, node.span)
    } else {
        Given::unreadable(node.span)
    }
}

fn critical(reader: &mut Reader, node: &Node, key: &'static Key) -> Given<StatedTemperature> {
    let stated = |celsius: f64| StatedTemperature {
        value: Temperature::from_celsius(celsius),
        by: None,
        preliminary: None,
    };
    if !matches!(node.value, Value::Mapping(_)) {
        return reader.quantity(node, key).map(stated);
    }
    let (mut value, mut by, mut preliminary) = (None, None, None);
    if reader.entries(
        node,
        table::CRITICAL,
        "`critical temperature`",
        |reader, key, entry| match key.name {
            "value" => value = reader.quantity(&entry.value, key).value().copied(),
            "by" => by = reader.text(&entry.value, key).value().cloned(),
            _ => preliminary = reader.choice(&entry.value, key).value().map(|at| *at == 0),
        },
    ) {
        reader.wanted(node, table::CRITICAL, "`critical temperature`");
    }
    match value {
        Some(celsius) => Given::new(
            StatedTemperature {
                by,
                preliminary,
                ..stated(celsius)
            },
            node.span,
        ),
        None => Given::unreadable(node.span),
    }
}

fn connection(reader: &mut Reader, node: &Node) -> Given<Connection> {
    let mut connection = Connection::default();
    let before = reader.slips.len();
    let read = reader.entries(
        node,
        table::CONNECTION,
        "`connection`",
        |reader, key, entry| match key.name {
            "utilisation" => connection.utilisation = reader.quantity(&entry.value, key).value().copied(),
            _ => connection.same_protection = reader.yes_no(&entry.value, key).value().copied(),
        },
    );
    if read && reader.slips.len() == before {
        Given::new(connection, node.span)
    } else {
        Given::unreadable(node.span)
    }
}

fn departures(reader: &mut Reader, node: &Node, key: &'static Key) -> Vec<Departure> {
    let Value::Sequence(entries) = &node.value else {
        if !matches!(node.value, Value::Null) {
            reader.wrong_kind(node, key);
        }
        return Vec::new();
    };
    entries.iter().filter_map(|entry| departure(reader, entry)).collect()
}

fn departure(reader: &mut Reader, node: &Node) -> Option<Departure> {
    let mut from = None;
    let (mut because, mut by, mut until) = (Given::Absent, Given::Absent, Given::Absent);
    let mut at = Agreed::default();
    let read = reader.entries(node, table::DEPARTURE, "a departure", |reader, key, entry| {
        match key.name {
            "from" => {
                if let Given::Value(Spanned { value, span }) = reader.text(&entry.value, key) {
                    from = Some(Spanned { value, span });
                }
            }
            "because" => because = reader.text(&entry.value, key),
            "by" => by = reader.text(&entry.value, key),
            "until" => until = reader.date(&entry.value, key),
            _ => at = agreed(reader, &entry.value),
        }
    });
    if read {
        reader.wanted(node, table::DEPARTURE, "a departure");
    }
    Some(Departure {
        from: from?,
        because,
        by,
        until,
        at,
        extent: Extent(node.span),
    })
}

fn agreed(reader: &mut Reader, node: &Node) -> Agreed {
    let mut agreed = Agreed::default();
    reader.entries(node, table::AGREED, "`at`", |reader, key, entry| match key.name {
        "needs" => agreed.needs = length(reader, &entry.value, key),
        "section factor" => agreed.section_factor = reader.quantity(&entry.value, key).value().copied(),
        "temperature" => {
            agreed.temperature = reader
                .quantity(&entry.value, key)
                .value()
                .map(|c| Temperature::from_celsius(*c));
        }
        _ => agreed.resistance = reader.period(&entry.value, key).value().map(|min| Time::from_min(*min)),
    });
    agreed
}

/// Whether a value is the word `none`.
pub fn is_none_word(node: &Node) -> bool {
    matches!(&node.value, Value::Scalar(scalar) if same_word("none", &scalar.text))
}
