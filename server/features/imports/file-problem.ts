/** Why a file cannot be read as a whole; its message is a sentence for whoever sent it. */
export class FileProblem extends Error {}
