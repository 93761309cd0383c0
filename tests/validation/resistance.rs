//! Reduction factors and critical temperatures against published and independently computed values.

use scorchline::resistance::class::{Action, classify};
use scorchline::resistance::critical::{
    Limit, Loading, Member, Unverified, buckling_factor, critical_temperature, from_utilisation, load_reduction,
};
use scorchline::resistance::reduction::{modulus_factor, yield_factor};
use scorchline::section::Shape;
use scorchline::section::catalogue::{Lookup, LookupOptions, find};
use scorchline::units::{Force, Length, Stress};

fn close(found: f64, wanted: f64, tolerance: f64, what: &str) {
    assert!(
        (found - wanted).abs() <= tolerance,
        "{what}: found {found}, wanted {wanted} ± {tolerance}"
    );
}

fn shape(name: &str) -> Shape {
    match find(name, &LookupOptions::default()) {
        Lookup::Found(row) => row.shape,
        other => panic!("{name}: {other:?}"),
    }
}

/// CTE DB SI Anejo D (Spanish building code, consolidated 2025), Table D.2. Status: published; the square roots are
/// printed truncated.
#[test]
fn cte_table_d2() {
    for (t, ky) in [
        (400.0, 1.0),
        (500.0, 0.78),
        (600.0, 0.47),
        (700.0, 0.23),
        (800.0, 0.11),
        (900.0, 0.06),
        (1000.0, 0.04),
    ] {
        close(yield_factor(t), ky, 1e-12, "ky");
    }
    for (t, root) in [
        (200.0, 1.05),
        (300.0, 1.11),
        (400.0, 1.19),
        (500.0, 1.14),
        (600.0, 1.23),
        (700.0, 1.33),
    ] {
        close((yield_factor(t) / modulus_factor(t)).sqrt(), root, 0.0101, "√(ky/kE)");
    }
}

/// EN 1993-1-2:2005 Table 4.1. Status: from memory, rounded to whole degrees.
#[test]
fn table_4_1() {
    for (mu, t) in [
        (0.22, 711.0),
        (0.30, 664.0),
        (0.40, 620.0),
        (0.50, 585.0),
        (0.60, 554.0),
        (0.70, 526.0),
        (0.80, 496.0),
    ] {
        close(from_utilisation(mu).unwrap().celsius(), t, 0.8, "(4.22)");
    }
    assert_eq!(from_utilisation(1.2), Err(Unverified::FailsCold(1.2)));
}

/// Steel Buildings in Europe, Multi-Storey Steel Buildings, Part 6, p. 6-54: G 3.5, Q 3.0, ψ 0.3. Status: published.
#[test]
fn load_factor() {
    close(load_reduction(3.5, 3.0, 0.3, (1.35, 1.5), 1.0), 0.477, 1e-3, "ηfi");
}

/// EN 1993-1-2:2005 4.2.3.2. Status: formula from memory, values computed.
#[test]
fn buckling_factors() {
    let table = [
        (355.0, [0.40225, 0.42558, 0.38766, 0.35058]),
        (235.0, [0.37446, 0.39579, 0.36115, 0.32737]),
    ];
    for (fy, values) in table {
        for (t, chi) in [400.0, 500.0, 600.0, 700.0].into_iter().zip(values) {
            close(buckling_factor(1.0, Stress::from_mpa(fy), t), chi, 6e-6, "χ");
        }
    }
}

fn column(name: &str, fy: f64, kn: f64, length: f64) -> Result<Limit, Unverified> {
    let member = Member {
        shape: shape(name),
        fy: Stress::from_mpa(fy),
        gamma_m_fi: 1.0,
        compression: true,
        tension: false,
        slab: false,
    };
    let length = Some(Length::from_m(length));
    critical_temperature(&member, Loading::Compression(Force::from_kn(kn), length, None))
}

/// HE 200 B, S275, A 7808 mm², iz 50.7 mm. Status: computed by a hand-written script from the printed, rounded figures;
/// hence 0.3 °C.
#[test]
fn he_200_b_in_compression() {
    for (length, kn, t) in [(2.0, 1000.0, 541.58), (2.0, 600.0, 628.43), (3.5, 600.0, 569.41)] {
        let limit = column("HE 200 B", 275.0, kn, length).unwrap();
        close(limit.protected.celsius(), t, 0.3, "HE 200 B");
        assert!(limit.governing.contains("z-z"));
    }
}

/// IPE 360 of S355 in compression is class 4: web c/t 37.3 > 42ε = 29.0 (EN 1993-1-1:2005 Table 5.2 with the ε of
/// EN 1993-1-2:2005 (4.2)). Status: computed by hand.
#[test]
fn ipe_360_is_class_4_in_compression() {
    let fy = Stress::from_mpa(355.0);
    let class = classify(&shape("IPE 360"), fy, Action::Compression).unwrap();
    assert_eq!(
        (class.class, class.governing.as_str()),
        (4, "web c/t 37.3 > 42ε = 29.0")
    );
    assert!(classify(&shape("IPE 360"), fy, Action::Bending).unwrap().class < 3);
    assert_eq!(column("IPE 360", 355.0, 100.0, 1.0).unwrap().protected.celsius(), 350.0);
}

/// A slender column at full use cold, ηfi 0.65, cold length: far below 500 °C (computed: 444, 420 and 410 °C at λ 0.8,
/// 1.0 and 1.2 for S355, buckling curve b).
#[test]
fn slender_columns_fail_below_500() {
    let fy = Stress::from_mpa(355.0);
    for (slenderness, wanted) in [(0.8_f64, 444.0), (1.0, 420.0), (1.2, 410.0)] {
        let phi: f64 = 0.5 * (1.0 + 0.34 * (slenderness - 0.2) + slenderness * slenderness);
        let cold = 1.0 / (phi + (phi * phi - slenderness * slenderness).sqrt());
        let (mut low, mut high) = (20.0, 1000.0);
        while high - low > 1e-3 {
            let t = 0.5 * (low + high);
            let holds = buckling_factor(slenderness, fy, t) * yield_factor(t) >= 0.65 * cold;
            if holds { low = t } else { high = t }
        }
        assert!(
            low < 500.0 && (low - wanted).abs() < 25.0,
            "λ {slenderness}: {low}, wanted about {wanted}"
        );
    }
}
