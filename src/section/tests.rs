//! Every shape against the same shape cut into a fine polygon, and what must hold of every exposure.

use proptest::prelude::*;

use crate::section::outline::{Outline, Point};
use crate::section::shadow::shadow_factor;
use crate::section::shape::{
    Angle, Channel, CircularHollow, Flat, ParallelI, RectangularHollow, Round, TaperChannel, TaperI, TaperTee, Tee,
    WeldedI,
};
use crate::section::{Casing, Exposure, Face, Faces, Geometry, Shape, heated};
use crate::units::Length;

const CHORDS: u32 = 400;

fn mm(value: f64) -> Length {
    Length::from_mm(value)
}

/// Possible shapes of every family: dimensions that fit by construction, so that few are thrown away.
fn any_shape() -> impl Strategy<Value = Shape> {
    let parts = (
        40.0..1200.0_f64,
        30.0..500.0_f64,
        2.0..20.0_f64,
        1.0..2.0_f64,
        0.0..0.9_f64,
        0.0..0.9_f64,
    );
    (0_u8..12, parts, 0.0..0.15_f64).prop_filter_map("an impossible section", |(family, parts, slope)| {
        let (h, b, tw, thicker, r, toe) = parts;
        let tf = tw * thicker;
        let (h, b) = (h + 4.0 * tf, b + 4.0 * tf);
        let radius = mm(r * tf);
        let (h, b, tw, tf, toe) = (mm(h), mm(b), mm(tw), mm(tf), mm(toe * tf / 3.0));
        let tf_at = mm((b.mm() - tw.mm()) / 4.0);
        let slope = slope.min(0.5 * tf.mm() / tf_at.mm());
        let shape = match family {
            0 => Shape::I(ParallelI {
                h,
                b,
                tw,
                tf,
                r: radius,
            }),
            1 => Shape::TaperI(TaperI {
                h,
                b,
                tw,
                tf,
                r: radius,
                toe,
                slope,
                tf_at,
            }),
            2 => Shape::WeldedI(WeldedI {
                h,
                b_top: b,
                tf_top: tf,
                b_bottom: mm(b.mm() * thicker),
                tf_bottom: mm(tf.mm() * 1.2),
                tw,
                weld: toe,
            }),
            3 => Shape::Channel(Channel {
                h,
                b,
                tw,
                tf,
                r: radius,
            }),
            4 => Shape::TaperChannel(TaperChannel {
                h,
                b,
                tw,
                tf,
                r: radius,
                toe,
                slope,
                tf_at,
            }),
            5 => Shape::Angle(Angle {
                h,
                b,
                t: tw,
                root: radius,
                toe,
            }),
            6 => Shape::Tee(Tee {
                h,
                b,
                tw,
                tf,
                r: radius,
            }),
            7 => Shape::TaperTee(TaperTee {
                h,
                b,
                tw,
                tf,
                r: radius,
                toe,
                slope,
                tf_at,
            }),
            8 => Shape::RectangularHollow(RectangularHollow {
                h,
                b,
                t: tw,
                ro: mm(1.5 * tw.mm()),
                ri: tw,
            }),
            9 => Shape::CircularHollow(CircularHollow { d: h, t: tw }),
            10 => Shape::Flat(Flat { b, t: tf }),
            _ => Shape::Round(Round { d: b }),
        };
        shape.check().is_ok().then_some(shape)
    })
}

fn any_faces() -> impl Strategy<Value = Faces> {
    proptest::collection::vec(0_usize..4, 0..4).prop_map(|picks| picks.into_iter().map(|n| Face::ALL[n]).collect())
}

/// Area, first and second moments of a polygon by the shoelace sums, and its length.
fn shoelace(points: &[Point]) -> [f64; 5] {
    let mut sums = [0.0; 5];
    for (n, p) in points.iter().enumerate() {
        let q = points[(n + 1) % points.len()];
        let cross = p.x * q.y - q.x * p.y;
        sums[0] += cross / 2.0;
        sums[1] += cross * (p.y + q.y) / 6.0;
        sums[2] += cross * (p.y * p.y + p.y * q.y + q.y * q.y) / 12.0;
        sums[3] += cross * (p.x * p.x + p.x * q.x + q.x * q.x) / 12.0;
        sums[4] += (q.x - p.x).hypot(q.y - p.y);
    }
    sums
}

fn close(a: f64, b: f64, share: f64) -> bool {
    (a - b).abs() <= share * b.abs().max(1e-9)
}

/// The polygon above a level, by cutting it: for the plastic modulus by another route.
fn first_moment_above(outline: &Outline, level: f64) -> (f64, f64) {
    let points = outline.polygon(CHORDS);
    let mut kept = Vec::new();
    for (n, p) in points.iter().enumerate() {
        let q = points[(n + 1) % points.len()];
        if p.y >= level {
            kept.push(*p);
        }
        if (p.y - level) * (q.y - level) < 0.0 {
            let x = p.x + (q.x - p.x) * (level - p.y) / (q.y - p.y);
            kept.push(Point { x, y: level });
        }
    }
    if kept.len() < 3 {
        return (0.0, 0.0);
    }
    let sums = shoelace(&kept);
    (sums[0], sums[1] - level * sums[0])
}

proptest! {
    #![proptest_config(ProptestConfig { failure_persistence: None, ..ProptestConfig::default() })]

    #[test]
    fn a_fine_polygon_has_the_same_figures(shape in any_shape()) {
        let (outer, hole) = shape.outlines().unwrap();
        let outer = outer.unwrap();
        let gross = shoelace(&outer.polygon(CHORDS));
        let cut = hole.as_ref().map_or([0.0; 5], |hole| shoelace(&hole.polygon(CHORDS)));
        let area = gross[0] - cut[0];
        let geometry = shape.geometry().unwrap();
        prop_assert!(close(geometry.area.mm2(), area, 1e-5));
        prop_assert!(close(geometry.perimeter.mm(), gross[4], 1e-5));
        let own = shape.properties().unwrap().unwrap();
        let bounds = outer.bounds();
        let y = bounds.max.y - own.centroid_from_top.mm();
        let x = bounds.min.x + own.centroid_from_left.mm();
        prop_assert!(((gross[1] - cut[1]) / area - y).abs() < 1e-3);
        prop_assert!(close(own.iy_mm4, gross[2] - cut[2] - area * y * y, 1e-4));
        prop_assert!(close(own.iz_mm4, gross[3] - cut[3] - area * x * x, 1e-4));
        prop_assert!(own.iv_mm4 <= own.iy_mm4.min(own.iz_mm4) * (1.0 + 1e-9));
        prop_assert!(close(own.iu_mm4 + own.iv_mm4, own.iy_mm4 + own.iz_mm4, 1e-9));
        prop_assert!(own.wpl_y_mm3 >= own.wel_y_mm3 && own.wpl_z_mm3 >= own.wel_z_mm3);
    }

    #[test]
    fn the_part_above_a_line_is_that_of_the_polygon(shape in any_shape(), share in 0.01..0.99_f64) {
        let outer = shape.outlines().unwrap().0.unwrap();
        let bounds = outer.bounds();
        let level = bounds.min.y + share * bounds.height();
        let exact = outer.above(level);
        let (area, moment) = first_moment_above(&outer, level);
        let whole = outer.moments().area;
        prop_assert!((exact.area - area).abs() < 1e-5 * whole, "{} {}", exact.area, area);
        prop_assert!((exact.moment - moment).abs() < 1e-5 * whole * bounds.height());
    }

    #[test]
    fn the_faces_share_out_the_whole_outline(shape in any_shape()) {
        let geometry = shape.geometry().unwrap();
        let faces = geometry.faces.unwrap();
        prop_assert!(close(faces.exposed(Faces::NONE), geometry.perimeter.mm(), 1e-9));
        prop_assert!(faces.exposed(Faces::ALL) == 0.0);
    }

    #[test]
    fn covering_more_never_exposes_more(shape in any_shape(), faces in any_faces(), more in 0_usize..4) {
        let geometry = shape.geometry().unwrap();
        for casing in [Casing::Bare, Casing::Profile, Casing::Box] {
            let all = heated(&geometry, Exposure::AllRound, casing).unwrap();
            let three = heated(&geometry, Exposure::ThreeSides, casing).unwrap();
            prop_assert!(three.perimeter <= all.perimeter);
            let less = heated(&geometry, Exposure::Covered(faces), casing);
            let least = heated(&geometry, Exposure::Covered(faces.with(Face::ALL[more])), casing);
            if let (Ok(less), Ok(least)) = (less, least) {
                prop_assert!(least.perimeter.mm() <= less.perimeter.mm() + 1e-9);
            }
        }
    }

    #[test]
    fn the_shadow_factor_is_at_most_one(shape in any_shape(), faces in any_faces(), nominal: bool) {
        let geometry = shape.geometry().unwrap();
        if let Ok(factor) = shadow_factor(&geometry, Exposure::Covered(faces), nominal) {
            prop_assert!(factor > 0.0 && factor <= 1.0);
        }
        if geometry.convex {
            prop_assert_eq!(shadow_factor(&geometry, Exposure::AllRound, nominal).unwrap(), 1.0);
        }
    }

    #[test]
    fn no_dimensions_make_a_panic(family in 0_u8..5, numbers in proptest::array::uniform5(any::<f64>())) {
        let [h, b, tw, tf, r] = numbers.map(mm);
        let shape = match family {
            0 => Shape::I(ParallelI { h, b, tw, tf, r }),
            1 => Shape::Angle(Angle { h, b, t: tw, root: r, toe: tf }),
            2 => Shape::RectangularHollow(RectangularHollow { h, b, t: tw, ro: tf, ri: r }),
            3 => Shape::TaperChannel(TaperChannel { h, b, tw, tf, r, toe: r, slope: r.mm(), tf_at: tw }),
            _ => Shape::WeldedI(WeldedI { h, b_top: b, tf_top: tw, b_bottom: tf, tf_bottom: r, tw, weld: h }),
        };
        if let Ok(geometry) = Geometry::of(&shape) {
            prop_assert!(geometry.area.mm2() > 0.0 && geometry.perimeter.mm() > 0.0);
        }
    }
}
