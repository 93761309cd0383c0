// An independent client of the protocol, with what three editors say of themselves: `node clients.mjs BINARY PROJECT`.
import assert from 'node:assert/strict';
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { pathToFileURL } from 'node:url';
import rpc from 'vscode-jsonrpc/node.js';
import protocol from 'vscode-languageserver-protocol';

const [binary, project] = process.argv.slice(2);
const LINE = '  - { mark: Träger-梁-😀, role: beam, steel: S355, section: IPE 140, critical temperature: 580, period: 120, protection: chalk spray }';

// A full editor that counts in UTF-16, one that likes UTF-8 and knows snippets, and one that says the least.
const EDITORS = {
  full: {
    general: { positionEncodings: ['utf-16'], markdown: { parser: 'marked', version: '1.1.0' } },
    window: { workDoneProgress: true },
    workspace: {
      applyEdit: true, configuration: true, workspaceFolders: true, didChangeConfiguration: { dynamicRegistration: true },
      didChangeWatchedFiles: { dynamicRegistration: true, relativePatternSupport: true },
      workspaceEdit: { documentChanges: true }, inlayHint: { refreshSupport: true }, codeLens: { refreshSupport: true },
    },
    textDocument: {
      synchronization: { dynamicRegistration: true, didSave: true, willSave: true },
      publishDiagnostics: { relatedInformation: true, versionSupport: true, codeDescriptionSupport: true, tagSupport: { valueSet: [1, 2] } },
      completion: { completionItem: { snippetSupport: true, insertTextModeSupport: { valueSet: [1, 2] }, documentationFormat: ['markdown'] } },
      hover: { contentFormat: ['markdown', 'plaintext'] },
      documentSymbol: { hierarchicalDocumentSymbolSupport: true },
      codeAction: { codeActionLiteralSupport: { codeActionKind: { valueSet: ['', 'quickfix', 'refactor'] } } },
      rename: { prepareSupport: true }, inlayHint: { dynamicRegistration: true },
    },
  },
  snippets: {
    general: { positionEncodings: ['utf-8', 'utf-16'] },
    textDocument: {
      completion: { completionItem: { snippetSupport: true } },
      hover: { contentFormat: ['markdown'] },
      publishDiagnostics: { versionSupport: true },
    },
  },
  least: {},
};

const width = (text, encoding) => (encoding === 'utf-8' ? Buffer.byteLength(text) : text.length);

async function session(name, capabilities) {
  const server = spawn(binary, ['serve', '--stdio'], { stdio: ['pipe', 'pipe', 'inherit'] });
  const ended = new Promise(resolve => server.on('exit', resolve));
  const client = protocol.createProtocolConnection(
    new rpc.StreamMessageReader(server.stdout), new rpc.StreamMessageWriter(server.stdin));
  const told = new Map();
  let look = () => {};
  client.onNotification(protocol.PublishDiagnosticsNotification.type, params => {
    told.set(params.uri, params);
    look();
  });
  for (const type of [protocol.RegistrationRequest.type, protocol.WorkDoneProgressCreateRequest.type,
    protocol.InlayHintRefreshRequest.type, protocol.CodeLensRefreshRequest.type]) client.onRequest(type, () => null);
  client.listen();
  const until = met => new Promise((resolve, reject) => {
    const timer = setTimeout(() => reject(new Error(`${name}: nothing more was told`)), 30000);
    look = () => {
      const found = met();
      if (found) { clearTimeout(timer); look = () => {}; resolve(found); }
    };
    look();
  });
  const root = pathToFileURL(project).href;
  const answer = await client.sendRequest(protocol.InitializeRequest.type, {
    processId: process.pid, rootUri: root, workspaceFolders: [{ uri: root, name: 'project' }], capabilities,
  });
  const encoding = answer.capabilities.positionEncoding;
  assert.equal(encoding, capabilities.general?.positionEncodings?.[0] ?? 'utf-16');
  await client.sendNotification(protocol.InitializedNotification.type, {});
  const file = path.join(project, 'mill.steelwork.yaml');
  const uri = pathToFileURL(file).href;
  let text = `${fs.readFileSync(file, 'utf8')}${LINE}\n`;
  const line = text.split('\n').length - 2;
  const textDocument = { uri };
  await client.sendNotification(protocol.DidOpenTextDocumentNotification.type, {
    textDocument: { uri, languageId: 'yaml', version: 1, text },
  });
  const finding = code => told.get(uri)?.diagnostics.find(one => one.range.start.line === line && one.code === code);
  const headline = await until(() => finding('too-slender-to-protect'));
  const column = width(LINE.slice(0, LINE.indexOf('IPE 140')), encoding);
  assert.deepEqual(headline.range, { start: { line, character: column }, end: { line, character: column + 7 } });
  assert.equal(Boolean(headline.codeDescription), Boolean(capabilities.textDocument?.publishDiagnostics?.codeDescriptionSupport));
  if (headline.codeDescription) assert.ok(fs.readFileSync(new URL(headline.codeDescription.href), 'utf8').startsWith('too-slender'));

  const at = { textDocument, position: { line, character: column + 2 } };
  const hover = await client.sendRequest(protocol.HoverRequest.type, at);
  assert.match(hover.contents.value, /IPE 140/);
  assert.equal(hover.contents.kind, capabilities.textDocument?.hover ? 'markdown' : 'plaintext');
  const mark = await client.sendRequest(protocol.HoverRequest.type, { textDocument, position: { line, character: 13 } });
  assert.equal(/data:image\/svg/.test(mark.contents.value), name === 'full');
  const actions = await client.sendRequest(protocol.CodeActionRequest.type, {
    textDocument, range: headline.range, context: { diagnostics: [headline] },
  });
  const swap = actions.find(action => action.title.startsWith('swap to IPE'));
  const [edit] = swap.edit.changes[uri];
  await client.sendNotification(protocol.DidChangeTextDocumentNotification.type, {
    textDocument: { uri, version: 2 }, contentChanges: [{ range: edit.range, text: edit.newText }],
  });
  await until(() => told.get(uri)?.version === 2);
  assert.ok(!finding('too-slender-to-protect'));
  text = text.replace('section: IPE 140, critical temperature: 580', `section: ${edit.newText}, critical temperature: 580`);
  const held = await client.sendRequest(protocol.ExecuteCommandRequest.type, { command: 'scorchline.document', arguments: [uri] });
  assert.equal(held, text);
  const list = await client.sendRequest(protocol.CompletionRequest.type, { textDocument, position: { line, character: column + 3 } });
  assert.ok(list.items.some(item => item.label === 'IPE 160'), JSON.stringify(list).slice(0, 400));
  const symbols = await client.sendRequest(protocol.DocumentSymbolRequest.type, { textDocument });
  assert.equal(Boolean(symbols[0].location), !capabilities.textDocument?.documentSymbol);
  const hints = await client.sendRequest(protocol.InlayHintRequest.type, {
    textDocument, range: { start: { line, character: 0 }, end: { line: line + 1, character: 0 } },
  });
  assert.equal(hints.length, 2);
  const renamed = await client.sendRequest(protocol.RenameRequest.type, { textDocument, position: { line, character: 13 }, newName: 'X1' });
  assert.equal(renamed.changes[uri].length, 1);
  await assert.rejects(client.sendRequest(protocol.RenameRequest.type, { textDocument, position: { line, character: 13 }, newName: 'B1' }), /B1/);
  await client.sendRequest(protocol.ShutdownRequest.type);
  await client.sendNotification(protocol.ExitNotification.type);
  assert.equal(await ended, 0);
  console.log(`ok: ${name} (${encoding})`);
}

for (const [name, capabilities] of Object.entries(EDITORS)) await session(name, capabilities);
