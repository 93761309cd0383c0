//! Heating curves as pictures: SVG, and block characters where no picture can be shown.

pub mod blocks;
pub mod svg;

/// A member's heating, ready to be drawn.
#[derive(Debug, Clone, PartialEq)]
pub struct Heating {
    /// What it is of, for those who can't see it.
    pub title: String,
    /// The times in min, ascending from 0.
    pub minutes: Vec<f64>,
    /// The gas in °C, at each time.
    pub gas: Vec<f64>,
    /// The steel in °C at each time, with what it is called: `bare`, `behind 20 mm`.
    pub steel: Vec<(String, Vec<f64>)>,
    /// The critical temperature in °C.
    pub limit: Option<f64>,
    /// The period in min.
    pub period: Option<f64>,
    /// Whether temperatures are labelled in °F.
    pub fahrenheit: bool,
}

impl Heating {
    /// The highest temperature to be shown, in °C: a round number above all curves.
    fn top(&self) -> f64 {
        let curves = self.steel.iter().map(|(_, curve)| curve).chain([&self.gas]);
        let highest = curves.flatten().copied().chain(self.limit).fold(0.0, f64::max);
        ((highest / 200.0).ceil() * 200.0).clamp(200.0, 3000.0)
    }

    /// The last time to be shown.
    fn last(&self) -> f64 {
        self.minutes.last().copied().filter(|last| *last > 0.0).unwrap_or(1.0)
    }

    /// A temperature as its label says it.
    fn label(&self, celsius: f64) -> String {
        if self.fahrenheit {
            format!("{:.0} °F", celsius * 1.8 + 32.0)
        } else {
            format!("{celsius:.0} °C")
        }
    }
}

/// A round step that divides an axis into a handful of parts.
fn step(length: f64) -> f64 {
    let steps = [5.0, 10.0, 15.0, 20.0, 30.0, 60.0, 90.0, 120.0];
    steps.into_iter().find(|step| length / step <= 6.0).unwrap_or(120.0)
}
