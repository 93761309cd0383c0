//! Progress of work that takes its time, on standard error, where a terminal is there.

use std::io::IsTerminal;
use std::sync::mpsc::{RecvTimeoutError, channel};
use std::time::Duration;

use indicatif::{ProgressBar, ProgressStyle};

use crate::analysis::memo::Memo;

/// Work that is done sooner shows nothing.
const PATIENCE: Duration = Duration::from_secs(1);
/// Between two looks at how far it is.
const PAUSE: Duration = Duration::from_millis(100);

/// Does the work; after a second says how many different members were evaluated.
pub fn during<T>(memo: &Memo, work: impl FnOnce() -> T) -> T {
    if !std::io::stderr().is_terminal() {
        return work();
    }
    std::thread::scope(|scope| {
        let (working, done) = channel::<()>();
        scope.spawn(move || {
            let mut wait = PATIENCE;
            let mut bar: Option<ProgressBar> = None;
            while done.recv_timeout(wait) == Err(RecvTimeoutError::Timeout) {
                wait = PAUSE;
                let bar = bar.get_or_insert_with(started);
                bar.set_position(memo.evaluated());
                bar.tick();
            }
            if let Some(bar) = bar {
                bar.finish_and_clear();
            }
        });
        let result = work();
        // The other end wakes when this one is gone.
        drop(working);
        result
    })
}

fn started() -> ProgressBar {
    let bar = ProgressBar::new_spinner();
    if let Ok(style) = ProgressStyle::with_template("{spinner} {elapsed}: {human_pos} different members evaluated") {
        bar.set_style(style);
    }
    bar
}
