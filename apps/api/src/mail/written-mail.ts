/** A mail as it leaves: one subject, the same words as text and as HTML. */
export interface WrittenMail {
  readonly subject: string;
  readonly text: string;
  readonly html: string;
}
