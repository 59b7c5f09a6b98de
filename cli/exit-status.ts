/** Exit statuses are an interface: scripts rely on them. */
export const EXIT = {
  done: 0,
  checkFails: 1,
  sheetWrong: 2,
  usage: 3,
  server: 4,
  bug: 70,
  interrupted: 130,
} as const;

export type ExitStatus = (typeof EXIT)[keyof typeof EXIT];

/** A way a command can end other than by its result: with a message for the person, and a status. */
export class CommandFailure extends Error {
  readonly status: ExitStatus;
  readonly hints: readonly string[];

  constructor(status: ExitStatus, message: string, hints: readonly string[] = []) {
    super(message);
    this.status = status;
    this.hints = hints;
  }
}
