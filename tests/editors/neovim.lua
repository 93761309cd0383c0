-- Neovim with the file that users paste: opens a project, types, sees findings come and go, applies a fix, reads hover and
-- hints. `tests/editors/run` starts it with the binary and a scratch project in the environment.

vim.g.scorchline = assert(os.getenv('SCORCHLINE'), 'the binary')
local project = assert(os.getenv('PROJECT'), 'the project')
vim.o.swapfile = false
dofile('editors/neovim/scorchline.lua')

local function say(...) io.stdout:write(string.format(...), '\n') end

local function fail(...)
  say('FAILED: ' .. string.format(...))
  for _, found in ipairs(vim.diagnostic.get(0)) do
    say('  %d:%d %s %s', found.lnum, found.col, found.code or '', found.message)
  end
  vim.cmd('cquit')
end

local function wait(what, met)
  if not vim.wait(20000, met, 20) then fail('%s', what) end
  say('ok: %s', what)
end

-- The findings on a line, by name.
local function on(line)
  local found = {}
  for _, one in ipairs(vim.diagnostic.get(0, { lnum = line })) do found[one.code or ''] = one end
  return found
end

local function request(method, params)
  local answers, problem = vim.lsp.buf_request_sync(0, method, params, 20000)
  if not answers then fail('%s: %s', method, problem) end
  for _, answer in pairs(answers) do
    if answer.error then fail('%s: %s', method, answer.error.message) end
    return answer.result
  end
  fail('%s: no server answered', method)
end

local function line_of(text)
  for n, line in ipairs(vim.api.nvim_buf_get_lines(0, 0, -1, false)) do
    if line:find(text, 1, true) then return n - 1, line end
  end
  fail('no line has %s', text)
end

local function session()
vim.cmd('edit ' .. project .. '/mill.steelwork.yaml')
wait('the server is attached', function() return #vim.lsp.buf_get_clients(0) == 1 end)
wait('the scenario has findings', function() return #vim.diagnostic.get(0) > 5 end)

-- A member whose mark has letters of two, three and four bytes before its section.
local last = vim.api.nvim_buf_line_count(0)
local text = '  - { mark: Träger-梁-😀, role: beam, steel: S355, section: , critical temperature: 580, period: 120, protection: chalk spray }'
vim.api.nvim_buf_set_lines(0, last, last, false, { text })
local column = text:find('section: ', 1, true) - 1 + #'section: '

-- The section is typed key by key.
vim.api.nvim_win_set_cursor(0, { last + 1, column })
local typed = 'IPE 140'
for n = 1, #typed do
  local key = typed:sub(n, n)
  vim.api.nvim_buf_set_text(0, last, column + n - 1, last, column + n - 1, { key })
  vim.wait(30)
end
wait('the headline stands under the section', function()
  local found = on(last)['too-slender-to-protect']
  return found and found.col == column and found.end_col == column + #typed
end)
say('    %s', on(last)['too-slender-to-protect'].message)

-- Half-typed values are left in peace.
vim.api.nvim_buf_set_text(0, last, column + #typed, last, column + #typed, { 'x' })
wait('a half-typed section is a hint', function()
  local found = on(last)['unknown-section']
  return found and found.severity == vim.diagnostic.severity.HINT
end)
wait('and after a while an error', function()
  local found = on(last)['unknown-section']
  return found and found.severity == vim.diagnostic.severity.ERROR
end)
vim.api.nvim_buf_set_text(0, last, column + #typed, last, column + #typed + 1, { '' })
wait('the headline is back', function() return on(last)['too-slender-to-protect'] end)

-- The fix is offered and applied.
vim.api.nvim_win_set_cursor(0, { last + 1, column })
local client = select(2, next(vim.lsp.buf_get_clients(0)))
local params = vim.lsp.util.make_range_params(0, client.offset_encoding)
params.context = { diagnostics = {} }
local swap
for _, action in ipairs(request('textDocument/codeAction', params)) do
  say('    offered: %s', action.title)
  if action.title:find('^swap to IPE') then swap = action end
end
if not swap then fail('no swap is offered') end
vim.lsp.util.apply_workspace_edit(swap.edit, client.offset_encoding)
wait('the headline is gone', function() return not on(last)['too-slender-to-protect'] end)
local fixed = vim.api.nvim_buf_get_lines(0, last, last + 1, false)[1]
if fixed ~= text:gsub('section: ,', 'section: IPE 160,', 1) then fail('the line reads %s', fixed) end

-- Hover, hints, completion, definition and rename.
local hover = request('textDocument/hover', vim.lsp.util.make_position_params(0, client.offset_encoding))
if not hover.contents.value:find('IPE 160', 1, true) then fail('the hover reads %s', hover.contents.value) end
say('ok: the hover tells the section')
vim.api.nvim_win_set_cursor(0, { last + 1, text:find('mark: ', 1, true) + 6 })
hover = request('textDocument/hover', vim.lsp.util.make_position_params(0, client.offset_encoding))
for _, part in ipairs({ 'section factor', 'critical temperature', 'chalk spray', '█' }) do
  if not hover.contents.value:find(part, 1, true) then fail('no %s in %s', part, hover.contents.value) end
end
say('%s', hover.contents.value)
local hints = request('textDocument/inlayHint', {
  textDocument = vim.lsp.util.make_text_document_params(0),
  range = { start = { line = last, character = 0 }, ['end'] = { line = last + 1, character = 0 } },
})
if #hints ~= 2 or not hints[1].label:find('V/A', 1, true) or not hints[2].label:find('needs', 1, true) then
  fail('the hints are %s', vim.inspect(hints))
end
say('ok: hints %s and %s', hints[1].label, hints[2].label)
vim.api.nvim_buf_set_text(0, last, column, last, column + #'IPE 160', { 'heb2' })
vim.api.nvim_win_set_cursor(0, { last + 1, column + 4 })
local list = request('textDocument/completion', vim.lsp.util.make_position_params(0, client.offset_encoding))
if not list.items[1].label:find('^HE 2') then fail('offered first is %s', list.items[1].label) end
say('ok: heb2 offers %s', list.items[1].label)

local line, words = line_of('supported by: [C1')
vim.api.nvim_win_set_cursor(0, { line + 1, (words:find('[C1', 1, true)) })
local found = request('textDocument/definition', vim.lsp.util.make_position_params(0, client.offset_encoding))
local _, target = line_of('mark: C1')
if #found ~= 1 or found[1].range.start.character ~= target:find('C1', 1, true) - 1 then
  fail('the definition is %s', vim.inspect(found))
end
say('ok: a support leads to its member')
vim.lsp.buf.rename('K1')
wait('a rename reaches every place', function()
  local all = table.concat(vim.api.nvim_buf_get_lines(0, 0, -1, false), '\n')
  return all:find('mark: K1', 1, true) and not all:find('C1[^0-9]')
end)
if #vim.diagnostic.get(0, { severity = vim.diagnostic.severity.ERROR }) == 0 then fail('nothing is found any more') end

vim.lsp.stop_client(vim.lsp.get_active_clients())
wait('the server ends', function() return #vim.lsp.get_active_clients() == 0 end)
end

local done, problem = xpcall(session, debug.traceback)
if not done then fail('%s', problem) end
vim.cmd('qall!')
