-- Fire design of steel members in Neovim 0.7 and later: put this file on the runtime path (say as
-- ~/.config/nvim/plugin/scorchline.lua) and have `scorchline` on the PATH, or set `vim.g.scorchline` to the binary.

local names = { '*.steelwork.yaml', '*.steelwork.yml', '*.protection.yaml', '*.protection.yml' }

-- The folder that is opened as the workspace: the nearest one upward that holds `.git`, else the file's own.
local function root(file)
  local folder = vim.fn.fnamemodify(file, ':p:h')
  local found = vim.fn.finddir('.git', folder .. ';')
  return found ~= '' and vim.fn.fnamemodify(found, ':p:h:h') or folder
end

local clients = {}

local function attach(event)
  local file = vim.api.nvim_buf_get_name(event.buf)
  local folder = root(file)
  if not clients[folder] or vim.lsp.client_is_stopped(clients[folder]) then
    clients[folder] = vim.lsp.start_client({
      name = 'scorchline',
      cmd = { vim.g.scorchline or 'scorchline', 'serve' },
      root_dir = folder,
      workspace_folders = { { uri = vim.uri_from_fname(folder), name = folder } },
    })
  end
  if not clients[folder] then return end
  vim.lsp.buf_attach_client(event.buf, clients[folder])
  local function map(keys, does)
    vim.keymap.set('n', keys, does, { buffer = event.buf })
  end
  map('K', vim.lsp.buf.hover)
  map('gd', vim.lsp.buf.definition)
  map('gr', vim.lsp.buf.references)
  map('<leader>a', vim.lsp.buf.code_action)
  map('<leader>r', vim.lsp.buf.rename)
  vim.bo[event.buf].omnifunc = 'v:lua.vim.lsp.omnifunc'
end

vim.api.nvim_create_autocmd({ 'BufReadPost', 'BufNewFile' }, { pattern = names, callback = attach })
