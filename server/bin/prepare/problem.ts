/** Something that stops a command and that its user can put right: the message says what and how. */
export class Problem extends Error {
  override name = 'Problem';
}
