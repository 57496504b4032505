// What the exit code of the command line says; a contract that scripts rely on. A fault of the program has a code far
// from the others, so that no script takes it for a verdict on a scenario. Source: language reference, "Command line";
// 70 is EX_SOFTWARE of sysexits.h.

export enum ExitCode {
  /** No error among the findings, no claim failed. */
  Good = 0,
  /** An error finding or a failed claim; with `--strict` a warning; with `format --check` a file in another shape. */
  Findings = 1,
  /** The command is not understood, or a file named on it cannot be read (the rest is still printed). */
  Usage = 2,
  /** The program itself failed. */
  ProgramFault = 70,
}
