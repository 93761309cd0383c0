//! The server: what it can do, and one thin handler a message.

use std::future::Future;
use std::pin::Pin;
use std::sync::Arc;
use std::sync::atomic::{AtomicBool, Ordering};
use std::task::{Context, Poll};
use std::time::Duration;

use tokio::sync::Notify;
use tower_lsp::jsonrpc::{Request, Response, Result};
use tower_lsp::lsp_types::*;
use tower_lsp::{Client as Editor, LanguageServer, LspService, Server as Transport};
use tower_service::Service;

use crate::lsp::documents::{Document, path_of};
use crate::lsp::requests::{actions, ask, ask_all, commands, complete, diagnose, links, names, outline, reading};
use crate::lsp::settings::{Client, Settings};
use crate::lsp::shared::{Shared, lock};
use crate::lsp::worker::Worker;
use crate::text::Buffer;

/// How long the editor may take to answer what the server asks of it.
const PATIENCE: Duration = Duration::from_secs(10);

/// The server.
pub(super) struct Server {
    editor: Editor,
    shared: Arc<Shared>,
    stopped: Arc<AtomicBool>,
}

/// Serves on standard input and output until the editor says `exit` or closes them. Answers the status of the process: 0
/// after `shutdown`, else 1.
///
/// # Errors
/// Where no threads can be had.
pub fn serve() -> std::io::Result<u8> {
    let runtime = tokio::runtime::Builder::new_multi_thread()
        .worker_threads(2)
        .enable_all()
        .build()?;
    let status = runtime.block_on(async {
        let stopped = Arc::new(AtomicBool::new(false));
        let (service, socket) = LspService::new(|editor| Server {
            editor,
            shared: Arc::default(),
            stopped: Arc::clone(&stopped),
        });
        let exit = Arc::new(Notify::new());
        let service = Watched {
            service,
            exit: Arc::clone(&exit),
        };
        let transport = Transport::new(tokio::io::stdin(), tokio::io::stdout(), socket);
        tokio::select! {
            () = transport.serve(service) => {}
            () = exit.notified() => {
                // What was answered before goes out.
                tokio::time::sleep(Duration::from_millis(20)).await;
            }
        }
        u8::from(!stopped.load(Ordering::SeqCst))
    });
    // The threads that read standard input and check can't be ended; they end with the process.
    std::mem::forget(runtime);
    Ok(status)
}

/// The service, watched for `exit`: by itself it would live on while standard input is open.
struct Watched<S> {
    service: S,
    exit: Arc<Notify>,
}

impl<S> Service<Request> for Watched<S>
where
    S: Service<Request, Response = Option<Response>>,
    S::Future: Send + 'static,
{
    type Response = Option<Response>;
    type Error = S::Error;
    type Future = Pin<Box<dyn Future<Output = std::result::Result<Option<Response>, S::Error>> + Send>>;

    fn poll_ready(&mut self, context: &mut Context<'_>) -> Poll<std::result::Result<(), S::Error>> {
        self.service.poll_ready(context)
    }

    fn call(&mut self, request: Request) -> Self::Future {
        if request.method() == "exit" {
            self.exit.notify_one();
        }
        Box::pin(self.service.call(without_null(request)))
    }
}

/// Some editors send `null` where a message has no parameters, which the service would refuse.
fn without_null(request: Request) -> Request {
    if !matches!(request.params(), Some(serde_json::Value::Null)) {
        return request;
    }
    let (method, id, _) = request.into_parts();
    let bare = Request::build(method);
    match id {
        Some(id) => bare.id(id).finish(),
        None => bare.finish(),
    }
}

#[tower_lsp::async_trait]
impl LanguageServer for Server {
    async fn initialize(&self, params: InitializeParams) -> Result<InitializeResult> {
        let settings = params
            .initialization_options
            .and_then(Settings::read)
            .unwrap_or_default();
        let mut client = Client::of(&params.capabilities);
        client.images = settings.images.unwrap_or(client.images);
        client.pulls = settings.pull;
        *lock(&self.shared.client) = client;
        *lock(&self.shared.settings) = settings;
        #[allow(deprecated)]
        let root = params.root_uri;
        let named = params.workspace_folders.unwrap_or_default();
        let uris = named.into_iter().map(|folder| folder.uri);
        let mut folders: Vec<Url> = uris.collect();
        if folders.is_empty() {
            folders.extend(root);
        }
        self.shared.change(|documents| {
            documents.folders = folders.iter().filter_map(path_of).collect();
        });
        Ok(InitializeResult {
            capabilities: super::capabilities::capabilities(&client),
            server_info: Some(ServerInfo {
                name: "scorchline".to_owned(),
                version: Some(env!("CARGO_PKG_VERSION").to_owned()),
            }),
        })
    }

    async fn initialized(&self, _: InitializedParams) {
        let worker = Worker::new(
            Arc::clone(&self.shared),
            self.editor.clone(),
            tokio::runtime::Handle::current(),
        );
        std::thread::spawn(|| worker.run());
        if lock(&self.shared.client).watches {
            let editor = self.editor.clone();
            // A request to the editor inside a handler could wait for the handler.
            tokio::spawn(async move {
                let watching = editor.register_capability(vec![super::capabilities::watching()]);
                let _ = tokio::time::timeout(PATIENCE, watching).await;
            });
        }
    }

    async fn shutdown(&self) -> Result<()> {
        self.stopped.store(true, Ordering::SeqCst);
        Ok(())
    }

    async fn did_open(&self, params: DidOpenTextDocumentParams) {
        let opened = params.text_document;
        let Some(path) = path_of(&opened.uri) else { return };
        self.shared.change(|documents| {
            let document = Document {
                uri: opened.uri,
                version: opened.version,
                changed: documents.generation,
                buffer: Buffer::new(&opened.text),
                edited: None,
            };
            documents.open.insert(path, document);
        });
    }

    async fn did_change(&self, params: DidChangeTextDocumentParams) {
        let Some(path) = path_of(&params.text_document.uri) else {
            return;
        };
        let encoding = lock(&self.shared.client).encoding;
        self.shared.change(|documents| {
            documents.change(&path, params.text_document.version, params.content_changes, encoding);
        });
    }

    async fn did_save(&self, params: DidSaveTextDocumentParams) {
        let Some(path) = path_of(&params.text_document.uri) else {
            return;
        };
        self.shared.change(|documents| {
            if let Some(document) = documents.open.get_mut(&path) {
                document.edited = None;
            }
            documents.changed_on_disk.push(path);
        });
    }

    async fn did_close(&self, params: DidCloseTextDocumentParams) {
        let Some(path) = path_of(&params.text_document.uri) else {
            return;
        };
        self.shared.change(|documents| {
            documents.open.remove(&path);
            documents.changed_on_disk.push(path);
        });
    }

    async fn did_change_watched_files(&self, params: DidChangeWatchedFilesParams) {
        let paths: Vec<_> = params
            .changes
            .iter()
            .filter_map(|change| path_of(&change.uri))
            .collect();
        self.shared.change(|documents| {
            documents.listing += 1;
            documents.changed_on_disk.extend(paths);
        });
    }

    async fn did_change_workspace_folders(&self, params: DidChangeWorkspaceFoldersParams) {
        let paths = |folders: Vec<WorkspaceFolder>| -> Vec<_> {
            folders.iter().filter_map(|folder| path_of(&folder.uri)).collect()
        };
        let (added, removed) = (paths(params.event.added), paths(params.event.removed));
        self.shared.change(|documents| {
            documents.folders.retain(|folder| !removed.contains(folder));
            documents.folders.extend(added);
            documents.listing += 1;
        });
    }

    async fn did_change_configuration(&self, params: DidChangeConfigurationParams) {
        let Some(settings) = Settings::read(params.settings) else {
            return;
        };
        *lock(&self.shared.settings) = settings;
        if let Some(images) = settings.images {
            lock(&self.shared.client).images = images;
        }
        self.shared.change(|_| {});
    }

    async fn goto_definition(&self, params: GotoDefinitionParams) -> Result<Option<GotoDefinitionResponse>> {
        let at = params.text_document_position_params;
        let found = ask(&self.shared, &at.text_document.uri, move |asked| {
            names::definition(asked, at.position)
        });
        Ok(found.await?.map(GotoDefinitionResponse::Array))
    }

    async fn references(&self, params: ReferenceParams) -> Result<Option<Vec<Location>>> {
        let (at, declaration) = (params.text_document_position, params.context.include_declaration);
        ask(&self.shared, &at.text_document.uri, move |asked| {
            names::references(asked, at.position, declaration)
        })
        .await
    }

    async fn prepare_rename(&self, at: TextDocumentPositionParams) -> Result<Option<PrepareRenameResponse>> {
        ask(&self.shared, &at.text_document.uri, move |asked| {
            names::prepare(asked, at.position)
        })
        .await
    }

    async fn rename(&self, params: RenameParams) -> Result<Option<WorkspaceEdit>> {
        let at = params.text_document_position;
        let edit = ask(&self.shared, &at.text_document.uri, move |asked| {
            Some(names::rename(asked, at.position, &params.new_name))
        });
        edit.await?.unwrap_or(Ok(None))
    }

    async fn document_symbol(&self, params: DocumentSymbolParams) -> Result<Option<DocumentSymbolResponse>> {
        ask(&self.shared, &params.text_document.uri, outline::document).await
    }

    async fn symbol(&self, params: WorkspaceSymbolParams) -> Result<Option<Vec<SymbolInformation>>> {
        ask_all(&self.shared, move |snapshot| {
            outline::workspace(snapshot, &params.query)
        })
        .await
    }

    async fn folding_range(&self, params: FoldingRangeParams) -> Result<Option<Vec<FoldingRange>>> {
        ask(&self.shared, &params.text_document.uri, outline::folds).await
    }

    async fn selection_range(&self, params: SelectionRangeParams) -> Result<Option<Vec<SelectionRange>>> {
        ask(&self.shared, &params.text_document.uri, move |asked| {
            outline::selections(asked, &params.positions)
        })
        .await
    }

    async fn code_lens(&self, params: CodeLensParams) -> Result<Option<Vec<CodeLens>>> {
        ask(&self.shared, &params.text_document.uri, outline::lenses).await
    }

    async fn document_link(&self, params: DocumentLinkParams) -> Result<Option<Vec<DocumentLink>>> {
        let folders = self.shared.documents().folders.clone();
        ask(&self.shared, &params.text_document.uri, move |asked| {
            links::links(asked, folders)
        })
        .await
    }

    async fn code_action(&self, params: CodeActionParams) -> Result<Option<CodeActionResponse>> {
        let uri = params.text_document.uri.clone();
        ask(&self.shared, &uri, move |asked| actions::code_actions(asked, &params)).await
    }

    async fn diagnostic(&self, params: DocumentDiagnosticParams) -> Result<DocumentDiagnosticReportResult> {
        let report = ask(&self.shared, &params.text_document.uri, diagnose::document).await?;
        let nothing = DocumentDiagnosticReport::Full(RelatedFullDocumentDiagnosticReport::default());
        Ok(report.unwrap_or(DocumentDiagnosticReportResult::Report(nothing)))
    }

    async fn workspace_diagnostic(&self, _: WorkspaceDiagnosticParams) -> Result<WorkspaceDiagnosticReportResult> {
        let report = ask_all(&self.shared, diagnose::workspace).await?;
        let nothing = WorkspaceDiagnosticReport::default();
        Ok(report.unwrap_or(WorkspaceDiagnosticReportResult::Report(nothing)))
    }

    async fn execute_command(&self, params: ExecuteCommandParams) -> Result<Option<serde_json::Value>> {
        ask_all(&self.shared, move |snapshot| Some(commands::run(snapshot, &params)))
            .await?
            .unwrap_or(Ok(None))
    }

    async fn hover(&self, params: HoverParams) -> Result<Option<Hover>> {
        let at = params.text_document_position_params;
        ask(&self.shared, &at.text_document.uri, move |asked| {
            reading::hovered(asked, at.position)
        })
        .await
    }

    async fn inlay_hint(&self, params: InlayHintParams) -> Result<Option<Vec<InlayHint>>> {
        ask(&self.shared, &params.text_document.uri, move |asked| {
            reading::hinted(asked, params.range)
        })
        .await
    }

    async fn completion(&self, params: CompletionParams) -> Result<Option<CompletionResponse>> {
        let at = params.text_document_position;
        ask(&self.shared, &at.text_document.uri, move |asked| {
            complete::completed(asked, at.position)
        })
        .await
    }
}
