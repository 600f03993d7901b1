/** What a derived row meets that is visible now: it stands in the network's generation. */
export const VISIBLE =
  'gen_from <= (select generation from network) and gen_to > (select generation from network)';
