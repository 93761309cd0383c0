//! Decoding a product of a protection file.

use std::sync::Arc;

use crate::design::decode::member::environment;
use crate::design::decode::reader::Reader;
use crate::design::keys::protection as keys;
use crate::design::keys::{Key, Kind as KeyKind, Measure};
use crate::design::model::library::{Evidence, NamedProduct, Rates};
use crate::design::model::member::Extent;
use crate::design::slip::{Slip, SlipKind};
use crate::heating::flux::{Conduction, Insulation};
use crate::protection::product::{Assessed, Kind, Method, Product, ShapeClass};
use crate::protection::table::Table;
use crate::syntax::{Node, Value};
use crate::text::{Span, Spanned};
use crate::units::{Conductivity, Density, Length, SectionFactor, SpecificHeat, Temperature, Time};

/// The values of a product while it is read.
#[derive(Default)]
struct Draft {
    kind: Option<usize>,
    method: Option<usize>,
    conduction: Option<Conduction>,
    specific_heat: Option<f64>,
    density: Option<f64>,
    moisture: Option<f64>,
    delay: bool,
    coefficients: Option<[f64; 8]>,
    tables: Vec<Table>,
    interpolate: bool,
    stock: Vec<f64>,
    round_to: Option<f64>,
    most_layers: Option<u32>,
    most_per_coat: Option<f64>,
    solids: Option<f64>,
    assessed: Assessed,
    fires: Option<Vec<Spanned<String>>>,
}

/// Decodes a product under its name.
pub fn product(reader: &mut Reader, name: Spanned<String>, node: &Node, extent: Span) -> NamedProduct {
    let owner = format!("the product `{}`", name.value);
    let before = reader.slips.len();
    let mut draft = Draft::default();
    let mut rates = Rates::default();
    let mut evidence = Evidence::default();
    let mut place = None;
    let read = reader.entries(node, keys::PRODUCT, &owner, |reader, key, entry| {
        let value = &entry.value;
        match key.name {
            "environment" => place = environment(reader, value, key).value().copied(),
            "loss factor" => {
                reader.entries(value, keys::LOSS, "`loss factor`", |reader, key, entry| {
                    let loss = reader
                        .quantity(&entry.value, key)
                        .value()
                        .map(|percent| percent / 100.0);
                    if key.name == "shop" {
                        rates.loss_shop = loss
                    } else {
                        rates.loss_site = loss
                    }
                });
            }
            "price" => price(reader, value, &mut rates),
            "carbon" => rates.carbon = reader.quantity(value, key).value().copied(),
            "evidence" => evidence = read_evidence(reader, value),
            _ => draft.take(reader, key, value),
        }
    });
    if read {
        reader.wanted(node, keys::PRODUCT, &owner);
        draft.wanted(reader, node, &owner);
    }
    let readable = read && reader.slips.len() == before;
    let fires = draft.fires.take().unwrap_or_default();
    NamedProduct {
        name,
        product: if readable { draft.build().map(Arc::new) } else { None },
        fires,
        environment: place,
        evidence,
        rates,
        extent: Extent(extent),
    }
}

impl Draft {
    fn take(&mut self, reader: &mut Reader, key: &'static Key, node: &Node) {
        match key.name {
            "kind" => self.kind = reader.choice(node, key).value().copied(),
            "method" => self.method = reader.choice(node, key).value().copied(),
            "conductivity" => self.conduction = conduction(reader, node, key),
            "specific heat" => self.specific_heat = reader.quantity(node, key).value().copied(),
            "density" => self.density = reader.quantity(node, key).value().copied(),
            "moisture" => self.moisture = reader.quantity(node, key).value().copied(),
            "moisture delay" => self.delay = reader.yes_no(node, key).value() == Some(&true),
            "coefficients" => self.coefficients = reader.tuple::<8>(node, key).value().copied(),
            "tables" => {
                for entry in reader.list(node) {
                    self.tables.extend(table(reader, entry));
                }
            }
            "between" => self.interpolate = reader.choice(node, key).value() == Some(&0),
            "thicknesses" => {
                for entry in reader.list(node) {
                    self.stock.extend(reader.quantity(entry, key).value());
                }
                self.stock.sort_by(f64::total_cmp);
            }
            "round to" => self.round_to = reader.quantity(node, key).value().copied(),
            "most layers" => self.most_layers = reader.whole(node, key).value().copied(),
            "volume solids" => self.solids = reader.quantity(node, key).value().map(|percent| percent / 100.0),
            "maximum dft per coat" => self.most_per_coat = reader.quantity(node, key).value().copied(),
            "assessed" => self.assessed(reader, node),
            _ => {}
        }
    }

    fn assessed(&mut self, reader: &mut Reader, node: &Node) {
        let assessed = &mut self.assessed;
        let mut fires = None;
        reader.entries(node, keys::ASSESSED, "`assessed`", |reader, key, entry| {
            let node = &entry.value;
            match key.name {
                "section factor" => assessed.factor = range(reader, node, key, SectionFactor::from_per_m),
                "thickness" | "dft" => assessed.thickness = range(reader, node, key, Length::from_mm),
                "steel temperature" => assessed.temperature = range(reader, node, key, Temperature::from_celsius),
                "period" => assessed.period = range(reader, node, key, Time::from_min),
                "shapes" => {
                    for entry in reader.list(node) {
                        match reader.choice(entry, key).value() {
                            Some(1) => assessed
                                .shapes
                                .extend([ShapeClass::RectangularHollow, ShapeClass::CircularHollow]),
                            Some(0) => assessed.shapes.push(ShapeClass::Open),
                            Some(2) => assessed.shapes.push(ShapeClass::RectangularHollow),
                            Some(3) => assessed.shapes.push(ShapeClass::CircularHollow),
                            Some(4) => assessed.shapes.push(ShapeClass::Cellular),
                            Some(_) => assessed.shapes.push(ShapeClass::Solid),
                            None => {}
                        }
                    }
                }
                "orientation" => {
                    for entry in reader.list(node) {
                        match reader.choice(entry, key).value() {
                            Some(0) => assessed.beam = true,
                            Some(_) => assessed.column = true,
                            None => {}
                        }
                    }
                }
                _ => fires = reader.names(node, key).value().cloned(),
            }
        });
        self.fires = fires;
    }

    /// Reports the keys that the method can't do without.
    fn wanted(&self, reader: &mut Reader, node: &Node, owner: &str) {
        let lacks = |key: &&str| node.get(key).is_none();
        let wants: &[&'static str] = match self.method {
            Some(0) => &["conductivity", "specific heat", "density"],
            Some(1) => &["tables"],
            Some(_) => &["coefficients"],
            None => &[],
        };
        for key in wants.iter().copied().filter(|key| lacks(key)) {
            reader.missing(node.span, key, owner);
        }
        if self.delay && node.get("moisture").is_none() {
            reader.missing(node.span, "moisture", owner);
        }
        if self.kind == Some(2) && self.method == Some(0) {
            let text =
                format!("{owner} is a coating: its films come from an assessed table, not from constant properties");
            let span = node.get("method").map_or(node.span, |at| at.span);
            reader
                .slips
                .push(Slip::new(SlipKind::WrongKind, span, text).at_key("method"));
        }
    }

    fn build(self) -> Option<Product> {
        let kind = [Kind::Board, Kind::Spray, Kind::Coating, Kind::Concrete][self.kind?];
        let method = match self.method? {
            0 => Method::Properties(Insulation {
                conduction: self.conduction?,
                specific_heat: SpecificHeat::from_j_kgk(self.specific_heat?),
                density: Density::from_kg_m3(self.density?),
                moisture_delay: self.moisture.filter(|_| self.delay && kind != Kind::Coating),
            }),
            1 => Method::Tables {
                tables: self.tables,
                interpolate: self.interpolate,
            },
            _ => Method::Regression(Box::new(self.coefficients?)),
        };
        Some(Product {
            kind,
            method,
            assessed: self.assessed,
            stock: self.stock.into_iter().map(Length::from_mm).collect(),
            round_to: self.round_to.map(Length::from_mm),
            most_layers: self.most_layers.unwrap_or(1),
            most_per_coat: self.most_per_coat.map(Length::from_mm),
            volume_solids: self.solids,
        })
    }
}

/// Two numbers, the lesser first.
fn range<T>(reader: &mut Reader, node: &Node, key: &'static Key, make: fn(f64) -> T) -> Option<(T, T)> {
    let [from, to] = *reader.tuple::<2>(node, key).value()?;
    if from > to {
        let text = format!(
            "the range of `{}` runs backwards; the lesser value comes first",
            key.name
        );
        reader
            .slips
            .push(Slip::new(SlipKind::OutOfBounds, node.span, text).at_key(key.name));
        return None;
    }
    Some((make(from), make(to)))
}

fn conduction(reader: &mut Reader, node: &Node, key: &'static Key) -> Option<Conduction> {
    if !matches!(node.value, Value::Mapping(_)) {
        return reader
            .quantity(node, key)
            .value()
            .map(|value| Conduction::Constant(Conductivity::from_w_mk(*value)));
    }
    let measure = gas_measure(key)?;
    let rows = numbered(reader, node, key, measure, |reader, value| {
        reader.quantity(value, key).value().copied()
    })?;
    let rows = rows
        .into_iter()
        .map(|(t, c)| (Temperature::from_celsius(t), Conductivity::from_w_mk(c)))
        .collect();
    Some(Conduction::Table(rows))
}

/// The measure of a numbered mapping's keys.
fn gas_measure(key: &'static Key) -> Option<Measure> {
    let kinds: &[KeyKind] = match &key.kind {
        KeyKind::OneOf(kinds) => kinds,
        other => std::slice::from_ref(other),
    };
    kinds.iter().find_map(|kind| {
        if let KeyKind::Numbered(measure, _) = kind {
            Some(*measure)
        } else {
            None
        }
    })
}

/// A mapping from ascending numbers.
fn numbered<T>(
    reader: &mut Reader,
    node: &Node,
    key: &'static Key,
    measure: Measure,
    mut value: impl FnMut(&mut Reader, &Node) -> Option<T>,
) -> Option<Vec<(f64, T)>> {
    let Value::Mapping(entries) = &node.value else {
        reader.wrong_kind(node, key);
        return None;
    };
    let mut rows = Vec::with_capacity(entries.len());
    for entry in entries {
        let number = reader.measured(&entry.key, key, measure).value().copied()?;
        rows.push((number, value(reader, &entry.value)?));
    }
    rows.sort_by(|a, b| a.0.total_cmp(&b.0));
    if let Some(pair) = rows.windows(2).find(|pair| pair[0].0 == pair[1].0) {
        reader.twice(node, &format!("{}", pair[0].0));
        return None;
    }
    if rows.is_empty() {
        reader.wrong_kind(node, key);
        return None;
    }
    Some(rows)
}

fn table(reader: &mut Reader, node: &Node) -> Option<Table> {
    let before = reader.slips.len();
    let mut period = None;
    let mut shape = ShapeClass::Open;
    let mut sides = 4;
    let mut temperatures = Vec::new();
    let mut rows: Vec<(f64, Vec<Option<f64>>)> = Vec::new();
    let read = reader.entries(node, keys::TABLE, "a table", |reader, key, entry| {
        let value = &entry.value;
        match key.name {
            "period" => period = reader.period(value, key).value().copied(),
            "shape" => {
                const SHAPES: [ShapeClass; 5] = [
                    ShapeClass::Open,
                    ShapeClass::RectangularHollow,
                    ShapeClass::CircularHollow,
                    ShapeClass::Cellular,
                    ShapeClass::Solid,
                ];
                shape = reader.choice(value, key).value().map_or(shape, |at| SHAPES[*at]);
            }
            "sides" => sides = reader.whole(value, key).value().copied().unwrap_or(sides),
            "steel temperature" => {
                for entry in reader.list(value) {
                    temperatures.extend(reader.quantity(entry, key).value().copied());
                }
            }
            _ => {
                if let Some(measure) = gas_measure(key) {
                    rows = numbered(reader, value, key, measure, cells).unwrap_or_default();
                }
            }
        }
    });
    if read {
        reader.wanted(node, keys::TABLE, "a table");
    }
    if let Some(row) = rows.iter().find(|row| row.1.len() != temperatures.len()) {
        let text = format!(
            "the row {} has {} films for {} steel temperatures",
            row.0,
            row.1.len(),
            temperatures.len()
        );
        let span = node.get("rows").map_or(node.span, |at| at.span);
        reader
            .slips
            .push(Slip::new(SlipKind::WrongKind, span, text).at_key("rows"));
    }
    if temperatures.windows(2).any(|pair| pair[1] <= pair[0]) {
        let span = node.get("steel temperature").map_or(node.span, |at| at.span);
        let text = "the steel temperatures of a table ascend from column to column";
        reader
            .slips
            .push(Slip::new(SlipKind::OutOfBounds, span, text).at_key("steel temperature"));
    }
    if !read || reader.slips.len() > before {
        return None;
    }
    let rows = rows.into_iter().map(|(factor, cells)| {
        let cells = cells.into_iter().map(|cell| cell.map(Length::from_mm)).collect();
        (SectionFactor::from_per_m(factor), cells)
    });
    Some(Table {
        period: Time::from_min(period?),
        shape,
        sides: u8::try_from(sides).unwrap_or(4),
        temperatures: temperatures.into_iter().map(Temperature::from_celsius).collect(),
        rows: rows.collect(),
    })
}

/// A film of a table; the key's own measure is that of its section factors.
static FILM: Key = Key {
    name: "rows",
    kind: KeyKind::Number(Measure {
        noun: "a dry film thickness",
        dimension: crate::units::Dimension::Length,
        unit: "µm",
        min: 1.0,
        max: 50_000.0,
    }),
    required: true,
    doc: "",
};

fn cells(reader: &mut Reader, node: &Node) -> Option<Vec<Option<f64>>> {
    let mut cells = Vec::new();
    for entry in reader.list(node) {
        match entry.value {
            Value::Null => cells.push(None),
            _ => cells.push(Some(*reader.quantity(entry, &FILM).value()?)),
        }
    }
    Some(cells)
}

fn price(reader: &mut Reader, node: &Node, rates: &mut Rates) {
    reader.entries(node, keys::PRICE, "`price`", |reader, key, entry| {
        let value = reader.quantity(&entry.value, key).value().copied();
        match key.name {
            "per m2" => rates.per_m2 = value,
            "per m2 and mm" => rates.per_m2_mm = value,
            "per litre" => rates.per_litre = value,
            _ => rates.per_kg = value,
        }
    });
}

fn read_evidence(reader: &mut Reader, node: &Node) -> Evidence {
    let mut evidence = Evidence::default();
    reader.entries(node, keys::EVIDENCE, "`evidence`", |reader, key, entry| {
        match key.name {
            "report" => evidence.report = reader.text(&entry.value, key).value().cloned(),
            "issued" => evidence.issued = reader.date(&entry.value, key).value().copied(),
            _ => {
                if let crate::design::given::Given::Value(date) = reader.date(&entry.value, key) {
                    evidence.expires = Some(date);
                }
            }
        }
    });
    evidence
}
