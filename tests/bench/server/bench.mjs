// Keystrokes, hovers and completions of the language server beside those of a general YAML server on the same file, in
// one run: `node bench.mjs BINARY FOLDER [KEYSTROKES]`, or `tests/bench/server/run`, which makes the file first.
import { spawn } from 'node:child_process';
import fs from 'node:fs';
import path from 'node:path';
import { fileURLToPath, pathToFileURL } from 'node:url';

const [binary, folder, keystrokes = '60'] = process.argv.slice(2);
const here = path.dirname(fileURLToPath(import.meta.url));
const file = path.resolve(folder, 'frame.steelwork.yaml');
const PATIENCE = 120_000;

// A client that speaks to one server over its pipes.
class Client {
  constructor(command, args) {
    this.server = spawn(command, args, { stdio: ['pipe', 'pipe', 'inherit'] });
    this.parts = [];
    this.length = 0;
    this.id = 0;
    this.answers = new Map();
    this.waiting = [];
    this.server.stdout.on('data', data => {
      this.parts.push(data);
      this.length += data.length;
      this.read();
    });
  }

  read() {
    for (;;) {
      if (this.wanted === undefined) {
        const all = Buffer.concat(this.parts);
        this.parts = [all];
        const end = all.indexOf('\r\n\r\n');
        if (end < 0) return;
        this.wanted = Number(/content-length: *(\d+)/i.exec(all.subarray(0, end).toString())[1]);
        this.parts = [all.subarray(end + 4)];
        this.length = all.length - end - 4;
      }
      if (this.length < this.wanted) return;
      const all = Buffer.concat(this.parts);
      const message = JSON.parse(all.subarray(0, this.wanted).toString());
      this.parts = [all.subarray(this.wanted)];
      this.length = all.length - this.wanted;
      this.wanted = undefined;
      this.take(message);
    }
  }

  take(message) {
    if (message.method === 'textDocument/publishDiagnostics') {
      if (message.params.uri !== this.uri || (message.params.version ?? this.version) < this.version) return;
      this.diagnostics = message.params.diagnostics;
      this.waiting.splice(0).forEach(resolve => resolve(performance.now()));
    } else if (message.method && message.id !== undefined) {
      const settings = { yaml: { schemas: this.schemas, validate: true, hover: true, completion: true } };
      const result = message.method === 'workspace/configuration'
        ? message.params.items.map(item => settings[item.section] ?? null) : null;
      this.send({ id: message.id, result });
    } else if (message.id !== undefined) {
      this.answers.get(message.id)?.(message.result);
      this.answers.delete(message.id);
    }
  }

  send(message) {
    const text = Buffer.from(JSON.stringify({ jsonrpc: '2.0', ...message }));
    this.server.stdin.write(`Content-Length: ${text.length}\r\n\r\n`);
    this.server.stdin.write(text);
  }

  request(method, params) {
    const id = ++this.id;
    return within(new Promise(resolve => {
      this.answers.set(id, resolve);
      this.send({ id, method, params });
    }), method);
  }

  notify(method, params) {
    this.send({ method, params });
  }

  // Sends something and waits for the diagnostics that answer it; ms.
  async diagnosed(send) {
    const told = within(new Promise(resolve => this.waiting.push(resolve)), 'diagnostics');
    const start = performance.now();
    send();
    return await told - start;
  }

  peak() {
    const status = fs.readFileSync(`/proc/${this.server.pid}/status`, 'utf8');
    return Number(/VmHWM:\s+(\d+)/.exec(status)[1]) / 1024;
  }
}

function within(promise, what) {
  let timer;
  const late = new Promise((_, reject) => { timer = setTimeout(() => reject(new Error(`no ${what}`)), PATIENCE); });
  return Promise.race([promise, late]).finally(() => clearTimeout(timer));
}

const share = (list, part) => [...list].sort((a, b) => a - b)[Math.min(list.length - 1, Math.floor(part * list.length))];
const pause = ms => new Promise(resolve => setTimeout(resolve, ms));

async function measure(name, command, args, count) {
  const client = new Client(command, args);
  client.uri = pathToFileURL(file).href;
  client.version = 1;
  client.schemas = { [pathToFileURL(path.resolve(here, '../../../schema/steelwork.schema.json')).href]: '*.steelwork.yaml' };
  const root = pathToFileURL(path.resolve(folder)).href;
  await client.request('initialize', {
    processId: process.pid,
    rootUri: root,
    workspaceFolders: [{ uri: root, name: 'frame' }],
    capabilities: {
      workspace: { configuration: true, didChangeConfiguration: { dynamicRegistration: true } },
      textDocument: {
        publishDiagnostics: { relatedInformation: true, versionSupport: true },
        hover: { contentFormat: ['markdown'] },
        completion: { completionItem: { snippetSupport: true } },
      },
    },
  });
  client.notify('initialized', {});
  client.notify('workspace/didChangeConfiguration', { settings: { yaml: { schemas: client.schemas } } });
  await pause(1000);
  const text = fs.readFileSync(file, 'utf8');
  const lines = text.split('\n');
  const opened = await client.diagnosed(() => client.notify('textDocument/didOpen', {
    textDocument: { uri: client.uri, languageId: 'yaml', version: 1, text },
  }));
  await pause(500);
  // A digit of a load in the middle of the file is typed and taken out again, then of a section, in turn.
  const find = (word, from) => {
    let line = from;
    while (!lines[line].includes(word)) line += 1;
    return { line, character: lines[line].length };
  };
  const middle = lines.length >> 1;
  const places = [find('section:', middle), { ...find('utilisation: 0.', middle) }];
  places[1].character = lines[places[1].line].indexOf('utilisation: 0.') + 'utilisation: 0.'.length;
  const times = [];
  for (let n = 0; n < count; n += 1) {
    const at = places[(n >> 1) % 2];
    const put = n % 2 === 0;
    const end = put ? at : { line: at.line, character: at.character + 1 };
    client.version += 1;
    times.push(await client.diagnosed(() => client.notify('textDocument/didChange', {
      textDocument: { uri: client.uri, version: client.version },
      contentChanges: [{ range: { start: at, end }, text: put ? '0' : '' }],
    })));
    await pause(30);
  }
  const ask = async (method, position) => {
    const took = [];
    let size = 0;
    for (let n = 0; n < Math.min(20, count); n += 1) {
      const start = performance.now();
      const answer = await client.request(method, { textDocument: { uri: client.uri }, position });
      took.push(performance.now() - start);
      size = JSON.stringify(answer ?? null).length;
    }
    return { median: share(took, 0.5), size };
  };
  const on = { line: places[0].line, character: lines[places[0].line].indexOf('section') + 10 };
  const hover = await ask('textDocument/hover', on);
  const completion = await ask('textDocument/completion', { line: places[0].line, character: places[0].character });
  const result = {
    name,
    opened,
    median: share(times, 0.5),
    high: share(times, 0.95),
    hover: hover.median,
    completion: completion.median,
    sizes: [hover.size, completion.size],
    peak: client.peak(),
    told: client.diagnostics.length,
  };
  await client.request('shutdown');
  client.notify('exit');
  await pause(200);
  client.server.kill();
  return result;
}

const ours = await measure('scorchline', binary, ['serve'], Number(keystrokes));
const general = path.join(here, 'node_modules/yaml-language-server/bin/yaml-language-server');
const theirs = process.argv.includes('--alone') ? undefined
  : await measure('a general YAML server', process.execPath, ['--max-old-space-size=8192', general, '--stdio'], 8);
const ms = number => `${number.toFixed(1)} ms`.padStart(11);
for (const one of [ours, theirs].filter(Boolean)) {
  console.log(`${one.name} (${one.told} diagnostics; answers of ${one.sizes[0]} and ${one.sizes[1]} characters)`);
  console.log(`  first diagnostics ${ms(one.opened)}`);
  console.log(`  keystroke, median ${ms(one.median)}   95th percentile ${ms(one.high)}`);
  console.log(`  hover, median     ${ms(one.hover)}   completion ${ms(one.completion)}`);
  console.log(`  peak memory       ${one.peak.toFixed(0).padStart(8)} MiB`);
}
if (theirs) {
  console.log(`ratio: keystroke ${(ours.median / theirs.median).toFixed(4)}, memory ${(ours.peak / theirs.peak).toFixed(3)}`);
}
