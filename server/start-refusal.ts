/** Something that whoever starts the program can mend; the message is all they need to see. */
export class StartRefusal extends Error {}
