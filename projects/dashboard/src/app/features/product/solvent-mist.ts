/** The caution of spraying (common practice, no source). The product informs, it does not certify. */
export const SOLVENT_MIST = {
  danger: 'Solvent mist',
  words:
    'Sprayed wax and coat fill the air with what burns and what harms lungs. Draw the air off, wear a respirator with the filter that the product’s data sheet names, and keep flames, sparks and hot lamps away until it has cleared. The data sheet and local codes decide.',
} as const;
