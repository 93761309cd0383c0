//! Progress of a check that takes long.

use std::time::Duration;

use tokio::runtime::Handle;
use tokio::sync::oneshot;
use tower_lsp::Client as Editor;
use tower_lsp::lsp_types::notification::Progress as ProgressNotice;
use tower_lsp::lsp_types::request::WorkDoneProgressCreate;
use tower_lsp::lsp_types::{
    NumberOrString, ProgressParams, ProgressParamsValue, WorkDoneProgress, WorkDoneProgressBegin,
    WorkDoneProgressCreateParams, WorkDoneProgressEnd,
};

/// How long a check may take before its user is told.
const SILENT: Duration = Duration::from_secs(1);
/// How long the editor may take to agree.
const PATIENCE: Duration = Duration::from_secs(5);

/// Tells the editor of a check while this is held, once it has taken a second.
pub struct Progress(#[allow(dead_code)] oneshot::Sender<()>);

impl Progress {
    /// Begins to watch a check.
    pub fn watch(runtime: &Handle, editor: Editor, number: u64) -> Self {
        let (held, mut ended) = oneshot::channel::<()>();
        runtime.spawn(async move {
            // The sender says nothing; that it is gone ends the wait.
            if tokio::time::timeout(SILENT, &mut ended).await.is_ok() {
                return;
            }
            let token = NumberOrString::String(format!("scorchline-check-{number}"));
            let create = WorkDoneProgressCreateParams { token: token.clone() };
            let asked = tokio::time::timeout(PATIENCE, editor.send_request::<WorkDoneProgressCreate>(create)).await;
            if !matches!(asked, Ok(Ok(()))) {
                return;
            }
            let tell = |progress: WorkDoneProgress| {
                editor.send_notification::<ProgressNotice>(ProgressParams {
                    token: token.clone(),
                    value: ProgressParamsValue::WorkDone(progress),
                })
            };
            tell(WorkDoneProgress::Begin(WorkDoneProgressBegin {
                title: "checking the design".to_owned(),
                ..WorkDoneProgressBegin::default()
            }))
            .await;
            let _ = ended.await;
            tell(WorkDoneProgress::End(WorkDoneProgressEnd { message: None })).await;
        });
        Self(held)
    }
}
