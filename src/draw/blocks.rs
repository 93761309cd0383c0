//! Heating curves as block characters: a bar a column, as high as the steel is hot.

use super::Heating;

/// Columns and rows of the plot.
const COLUMNS: usize = 44;
const ROWS: usize = 8;
/// From empty to full, in eighths.
const EIGHTHS: [char; 9] = [' ', '▁', '▂', '▃', '▄', '▅', '▆', '▇', '█'];

/// The last of the steel curves as block characters, with the critical temperature as a dashed line and the period as a
/// mark below.
#[must_use]
pub fn heating(heating: &Heating) -> String {
    let Some((name, curve)) = heating.steel.last() else {
        return String::new();
    };
    let (highest, last) = (heating.top(), heating.last());
    let column = |n: usize| at(heating, curve, last * (n as f64 + 0.5) / COLUMNS as f64);
    let heights: Vec<f64> = (0..COLUMNS).map(|n| column(n) / highest * ROWS as f64).collect();
    let limit_row = heating
        .limit
        .map(|limit| ((limit / highest * ROWS as f64) as usize).min(ROWS - 1));
    let mut lines = vec![format!("steel {name}")];
    for row in (0..ROWS).rev() {
        let label = match row {
            _ if Some(row) == limit_row => heating.limit.map(|limit| heating.label(limit)),
            _ if row == ROWS - 1 => Some(heating.label(highest)),
            _ => None,
        };
        let cells = heights.iter().map(|height| {
            let filled = ((height - row as f64) * 8.0).round().clamp(0.0, 8.0) as usize;
            match EIGHTHS[filled] {
                ' ' if Some(row) == limit_row => '┄',
                cell => cell,
            }
        });
        lines.push(format!(
            "{:>8} ┤{}",
            label.unwrap_or_default(),
            cells.collect::<String>()
        ));
    }
    let tick = |minutes: f64| ((minutes / last * COLUMNS as f64).round() as usize).min(COLUMNS);
    let mut axis: Vec<char> = format!("{:>8} └{}", "", "─".repeat(COLUMNS)).chars().collect();
    let mut below = format!("{:>9} 0", "");
    if let Some(period) = heating.period.filter(|period| *period <= last) {
        if let Some(cell) = axis.get_mut(9 + tick(period)) {
            *cell = '┴';
        }
        let text = format!("{period:.0} min");
        let pad = (10 + tick(period)).saturating_sub(text.chars().count() / 2 + below.chars().count());
        below.push_str(&" ".repeat(pad));
        below.push_str(&text);
    } else {
        below.push_str(&format!("{:>1$}", format!("{last:.0} min"), COLUMNS - 1));
    }
    lines.push(axis.into_iter().collect());
    lines.push(below);
    lines.join("\n")
}

/// The value of a curve at a time, between its points along a straight line: the plot is coarser than the points.
fn at(heating: &Heating, curve: &[f64], time: f64) -> f64 {
    let after = heating
        .minutes
        .partition_point(|minutes| *minutes < time)
        .clamp(1, curve.len().max(2) - 1);
    let point = |n: usize| Some((*heating.minutes.get(n)?, *curve.get(n)?));
    let (Some((t0, a)), Some((t1, b))) = (point(after - 1), point(after)) else {
        return 0.0;
    };
    a + (b - a) * ((time - t0) / (t1 - t0)).clamp(0.0, 1.0)
}

#[cfg(test)]
mod tests {
    use super::*;

    #[test]
    fn bars_rise_with_the_steel_and_labels_stand_beside_them() {
        let minutes: Vec<f64> = (0..=60).map(f64::from).collect();
        let plot = heating(&Heating {
            title: String::new(),
            gas: minutes.iter().map(|_| 1000.0).collect(),
            steel: vec![("bare".to_owned(), minutes.iter().map(|t| 10.0 * t).collect())],
            minutes,
            limit: Some(550.0),
            period: Some(30.0),
            fahrenheit: false,
        });
        let lines: Vec<&str> = plot.lines().collect();
        assert_eq!(lines.len(), ROWS + 3);
        assert!(lines[1].starts_with(" 1000 °C ┤"), "{plot}");
        // Row 4 of 8 holds 500 to 625 °C.
        assert!(
            lines[4].starts_with("  550 °C ┤") && lines[4].ends_with("┄▁▂▃▄▅▆") || lines[4].contains('┄'),
            "{plot}"
        );
        assert!(lines[ROWS].chars().filter(|c| *c == '█').count() > 30, "{plot}");
        assert!(lines[ROWS + 2].contains("30 min"), "{plot}");
        let widths: Vec<usize> = lines[1..=ROWS].iter().map(|line| line.chars().count()).collect();
        assert!(widths.iter().all(|width| *width == 10 + COLUMNS), "{plot}");
    }
}
