/** Something about the command's files or words that its user can mend: one plain sentence, exit code 2. */
export class Unusable extends Error {}
