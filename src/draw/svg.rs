//! Heating curves as SVG. The picture carries its own ground, so that it can be read on dark and light pages alike.

use std::fmt::Write;

use super::{Heating, step};

/// Width and height in px; editors cut wider pictures off.
const SIZE: (f64, f64) = (360.0, 210.0);
/// The plot within it: left, top, right, bottom.
const PLOT: (f64, f64, f64, f64) = (48.0, 12.0, 348.0, 166.0);
/// Colours of the steel curves, told apart by those who see no colours by their dashes.
const STEEL: [(&str, &str); 2] = [("#b3261e", "none"), ("#1f5fa8", "7 3")];

/// A heating as a picture.
#[must_use]
pub fn heating(heating: &Heating) -> String {
    let (width, height) = SIZE;
    let (left, top, right, bottom) = PLOT;
    let (highest, last) = (heating.top(), heating.last());
    let x = |minutes: f64| left + (right - left) * minutes / last;
    let y = |celsius: f64| bottom - (bottom - top) * (celsius / highest).clamp(0.0, 1.0);
    let mut svg = format!(
        "<svg xmlns=\"http://www.w3.org/2000/svg\" width=\"{width}\" height=\"{height}\" viewBox=\"0 0 {width} {height}\" \
         role=\"img\" font-family=\"sans-serif\" font-size=\"10\"><title>{}</title>\
         <rect width=\"{width}\" height=\"{height}\" fill=\"#ffffff\"/>",
        escaped(&heating.title)
    );
    let mut put = |piece: std::fmt::Arguments<'_>| {
        // Writing to a string can't fail.
        let _ = svg.write_fmt(piece);
    };
    let every = if highest > 800.0 { 400.0 } else { 200.0 };
    for n in 0..=5 {
        let celsius = every * f64::from(n);
        if celsius <= highest + 1.0 {
            let (at, label) = (y(celsius), heating.label(celsius));
            put(format_args!("<path d=\"M{left} {at:.1}H{right}\" stroke=\"#dddddd\"/>"));
            put(format_args!(
                "<text x=\"{:.1}\" y=\"{:.1}\" text-anchor=\"end\">{label}</text>",
                left - 4.0,
                at + 3.5
            ));
        }
    }
    let minutes = step(last);
    for n in 0..=12 {
        let time = minutes * f64::from(n);
        if time <= last + 1e-9 {
            put(format_args!(
                "<text x=\"{:.1}\" y=\"{:.1}\" text-anchor=\"middle\">{time:.0}</text>",
                x(time),
                bottom + 12.0
            ));
        }
    }
    put(format_args!(
        "<text x=\"{right}\" y=\"{:.1}\" text-anchor=\"end\">min</text>",
        bottom + 23.0
    ));
    if let Some(period) = heating.period.filter(|period| *period <= last) {
        put(format_args!(
            "<path d=\"M{:.1} {top}V{bottom}\" stroke=\"#555555\" stroke-dasharray=\"2 2\"/>",
            x(period)
        ));
    }
    if let Some(limit) = heating.limit {
        let at = y(limit);
        put(format_args!(
            "<path d=\"M{left} {at:.1}H{right}\" stroke=\"#8a5a00\" stroke-dasharray=\"5 3\"/>"
        ));
        put(format_args!(
            "<text x=\"{:.1}\" y=\"{:.1}\" fill=\"#8a5a00\">critical {}</text>",
            left + 110.0,
            at - 3.0,
            heating.label(limit)
        ));
    }
    let path = |curve: &[f64]| {
        let points = heating.minutes.iter().zip(curve).enumerate();
        points.fold(String::new(), |mut path, (n, (time, celsius))| {
            let _ = write!(
                path,
                "{}{:.1} {:.1}",
                if n == 0 { "M" } else { "L" },
                x(*time),
                y(*celsius)
            );
            path
        })
    };
    put(format_args!(
        "<path d=\"{}\" fill=\"none\" stroke=\"#999999\"/>",
        path(&heating.gas)
    ));
    for ((_, curve), (colour, dashes)) in heating.steel.iter().zip(STEEL) {
        put(format_args!(
            "<path d=\"{}\" fill=\"none\" stroke=\"{colour}\" stroke-width=\"1.8\" stroke-dasharray=\"{dashes}\"/>",
            path(curve)
        ));
    }
    put(format_args!(
        "<path d=\"M{left} {top}V{bottom}H{right}\" fill=\"none\" stroke=\"#333333\"/>"
    ));
    legend(heating, &mut put);
    svg.push_str("</svg>");
    svg
}

fn legend(heating: &Heating, put: &mut impl FnMut(std::fmt::Arguments<'_>)) {
    let mut at = PLOT.0;
    let line = SIZE.1 - 7.0;
    let gas = ("gas".to_owned(), "#999999", "none");
    let steel = heating
        .steel
        .iter()
        .zip(STEEL)
        .map(|((name, _), (colour, dashes))| (name.clone(), colour, dashes));
    for (name, colour, dashes) in std::iter::once(gas).chain(steel) {
        put(format_args!(
            "<path d=\"M{at:.1} {:.1}h16\" stroke=\"{colour}\" stroke-width=\"1.8\" stroke-dasharray=\"{dashes}\"/>\
             <text x=\"{:.1}\" y=\"{line:.1}\">{}</text>",
            line - 3.5,
            at + 20.0,
            escaped(&name)
        ));
        at += 34.0 + 5.6 * name.chars().count() as f64;
    }
}

/// Text as it may stand in a document of tags.
fn escaped(text: &str) -> String {
    text.replace('&', "&amp;")
        .replace('<', "&lt;")
        .replace('>', "&gt;")
        .replace('"', "&quot;")
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn names_can_do_no_harm_and_no_number_is_lost() {
        let svg = heating(&Heating {
            title: "<script>&\"".to_owned(),
            minutes: vec![0.0, 30.0, 60.0],
            gas: vec![20.0, 842.0, 945.0],
            steel: vec![("bare".to_owned(), vec![20.0, 700.0, 930.0])],
            limit: Some(550.0),
            period: Some(60.0),
            fahrenheit: false,
        });
        assert!(svg.contains("&lt;script&gt;&amp;&quot;") && !svg.contains("<script"));
        assert!(svg.contains("critical 550 °C") && !svg.contains("NaN"));
        assert_eq!(svg.matches("<path d=\"M48.0 ").count(), 3, "{svg}");
    }
}
