;;; emacs.el --- Emacs with the file that users paste  -*- lexical-binding: t -*-

;; Opens a project, types, sees findings come and go, applies a fix, reads hover.  `tests/editors/run' starts it with the
;; binary and a scratch project in the environment.

(load (expand-file-name "editors/emacs/scorchline.el"))
(setq scorchline-program (or (getenv "SCORCHLINE") (error "The binary is wanted")))
(setq eglot-sync-connect 20
      eglot-confirm-server-initiated-edits nil
      create-lockfiles nil
      make-backup-files nil)

;; A rename that reaches files which are not open asks first; nobody is there to answer.
(fset 'y-or-n-p #'always)

(defun say (&rest words) (princ (concat (apply #'format words) "\n")))

(defun fail (&rest words)
  (say "FAILED: %s" (apply #'format words))
  (dolist (found (flymake-diagnostics))
    (say "  %d %s" (flymake-diagnostic-beg found) (flymake-diagnostic-text found)))
  (kill-emacs 1))

(defun expect (what met)
  "Wait until MET answers something; WHAT says what it is."
  (let ((end (+ (float-time) 20)) found)
    (while (and (not (setq found (funcall met))) (< (float-time) end))
      (accept-process-output nil 0.05)
      (ignore-errors (flymake-start)))
    (unless found (fail "%s" what))
    (say "ok: %s" what)
    found))

(defun found-with (text)
  "The diagnostic whose message holds TEXT."
  (cl-find-if (lambda (one) (string-match-p (regexp-quote text) (flymake-diagnostic-text one)))
              (flymake-diagnostics)))

(defun ask (method)
  "The answer of the server to METHOD at point."
  (jsonrpc-request (eglot--current-server-or-lose) method (eglot--TextDocumentPositionParams)))

(condition-case problem
    (progn
      (find-file (expand-file-name "mill.steelwork.yaml" (getenv "PROJECT")))
      (unless (eglot-current-server) (call-interactively #'eglot))
      (flymake-mode 1)
      (expect "the server is attached" #'eglot-current-server)
      (expect "the scenario has findings" (lambda () (> (length (flymake-diagnostics)) 5)))
      ;; A member whose mark has letters of two, three and four bytes before its section.
      (goto-char (point-max))
      (insert "  - { mark: Träger-梁-😀, role: beam, steel: S355, section: , critical temperature: 580, period: 120, protection: chalk spray }\n")
      (search-backward "section: ")
      (forward-char (length "section: "))
      (let ((begin (point)))
        (dolist (key (string-to-list "IPE 140"))
          (insert key)
          (eglot--signal-textDocument/didChange)
          (accept-process-output nil 0.02))
        (let ((found (expect "the headline stands under the section"
                             (lambda ()
                               (let ((one (found-with "is too slender to protect at 120 min: IPE 140")))
                                 (and one (= (flymake-diagnostic-beg one) begin)
                                      (= (flymake-diagnostic-end one) (+ begin 7))
                                      one))))))
          (say "    %s" (flymake-diagnostic-text found)))
        (goto-char begin)
        ;; The fix is offered and applied.
        (let* ((actions (jsonrpc-request
                         (eglot--current-server-or-lose) :textDocument/codeAction
                         (list :textDocument (eglot--TextDocumentIdentifier)
                               :range (list :start (eglot--pos-to-lsp-position begin)
                                            :end (eglot--pos-to-lsp-position begin))
                               :context (list :diagnostics []))))
               (swap (cl-find-if (lambda (one) (string-prefix-p "swap to IPE" (plist-get one :title)))
                                 (append actions nil))))
          (unless swap (fail "no swap is offered among %S" actions))
          (eglot--apply-workspace-edit (plist-get swap :edit))
          (eglot--signal-textDocument/didChange))
        (expect "the headline is gone" (lambda () (not (found-with "IPE 140 has"))))
        (goto-char begin)
        (unless (looking-at-p "IPE 160, critical") (fail "the line reads %s" (thing-at-point 'line t)))
        (let ((hover (plist-get (plist-get (ask :textDocument/hover) :contents) :value)))
          (unless (string-match-p "IPE 160" hover) (fail "the hover reads %s" hover))
          (say "ok: the hover tells the section"))
        (search-backward "mark: ")
        (forward-char 6)
        (let ((hover (plist-get (plist-get (ask :textDocument/hover) :contents) :value)))
          (dolist (part '("section factor" "critical temperature" "chalk spray" "█"))
            (unless (string-match-p part hover) (fail "no %s in %s" part hover)))
          (say "ok: the hover tells the member")))
      (goto-char (point-min))
      (search-forward "supported by: [C1")
      (backward-char 1)
      (let ((found (ask :textDocument/definition)))
        (unless (= (length found) 1) (fail "the definition is %S" found))
        (say "ok: a support leads to its member"))
      (eglot-rename "K1")
      (goto-char (point-min))
      (unless (search-forward "mark: K1" nil t) (fail "the mark is not renamed"))
      (goto-char (point-min))
      (when (re-search-forward "C1\\b" nil t) (fail "C1 still stands at %d" (point)))
      (say "ok: a rename reaches every place")
      (set-buffer-modified-p nil)
      (let ((server (eglot-current-server)))
        (eglot-shutdown server nil 10)
        (say "ok: the server ends"))
      (kill-emacs 0))
  (error (fail "%S" problem)))
;;; emacs.el ends here
