;;; scorchline.el --- Fire design of steel members in Emacs  -*- lexical-binding: t -*-

;; Put this file on the load path and (require 'scorchline) in the init file.  It needs eglot (built in since Emacs 29,
;; from ELPA before) and `scorchline' on the PATH, or `scorchline-program' set to the binary.

(require 'eglot)

(defvar scorchline-program "scorchline"
  "The scorchline binary.")

(define-derived-mode scorchline-mode text-mode "Scorchline"
  "Design files of steel members in fire: members and protection products."
  (setq-local comment-start "# ")
  (setq-local indent-tabs-mode nil)
  (eglot-ensure))

(add-to-list 'auto-mode-alist '("\\.\\(steelwork\\|protection\\)\\.ya?ml\\'" . scorchline-mode))
(add-to-list 'eglot-server-programs
             `(scorchline-mode . ,(lambda (&rest _) (list scorchline-program "serve"))))

(provide 'scorchline)
;;; scorchline.el ends here
