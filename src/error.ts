/** What went wrong, as a word that a program can test. */
export type ErrorCode =
  | "bad-pair"
  | "bad-date"
  | "bad-span"
  | "bad-option"
  | "bad-zone"
  | "bad-input"
  | "bad-kernel"
  | "bad-leap-seconds"
  | "bad-state"
  | "kernel-not-found"
  | "not-covered"
  | "not-supplied"
  | "unreadable"
  | "unwritable";

/**
 * The one error of this library.
 *
 * `code` tells the kind; test it rather than `instanceof`, which fails across realms and duplicate packages.
 * The message says what was given, what is allowed and what to do.
 */
export class ApsidaryError extends Error {
  readonly code: ErrorCode;

  constructor(code: ErrorCode, message: string) {
    super(message);
    this.name = "ApsidaryError";
    this.code = code;
  }
}
