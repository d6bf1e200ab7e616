/** A large JSON answer that is written already, in parts: the database has put it into text, and nobody takes it apart again. */
export class JsonParts {
  constructor(
    /** What tells this answer from others at the same address: the same tag, the same content. */
    readonly tag: string,
    readonly parts: readonly string[],
  ) {}
}
