/** Something about this machine stands in the way, said in words that a person can act on. */
export class Refusal extends Error {}
