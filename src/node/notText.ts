/** Bytes that are no text; `why` says it to a person, after the file's name. */
export class NotText extends Error {
  constructor(readonly why: string) {
    super(why);
  }
}
