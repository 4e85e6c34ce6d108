export type IntakeCode = 'empty' | 'not-an-image' | 'unsupported-kind' | 'too-many-pixels' | 'damaged' | 'too-slow';

/** Thrown when a file cannot become a picture; the message is a sentence for the person who sent it. */
export class IntakeRefused extends Error {
  override readonly name = 'IntakeRefused';
  constructor(
    readonly code: IntakeCode,
    message: string,
  ) {
    super(message);
  }
}
