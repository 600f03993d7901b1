import type { BodyType } from '#shared/domain/vocabulary';

/** A model of an invented maker. */
export interface CarModel {
  make: string;
  model: string;
  bodyType: BodyType;
  /** How often it is seen, against other models. */
  popularity: number;
  /** Rot hazard against the ordinary car of its age. */
  rot: number;
  /** Years before today between which it was first registered. */
  builtFrom: number;
  builtUntil: number;
}

type Row = [
  model: string,
  bodyType: BodyType,
  popularity: number,
  rot: number,
  builtFrom: number,
  builtUntil: number,
];

/** Every make and model is invented; none names a real maker or car. */
const RANGES: Record<string, Row[]> = {
  Velder: [
    ['Tessock', 'hatchback', 12, 2.0, 24, 2],
    ['Tarnel', 'saloon', 5, 1.1, 32, 0],
    ['Harrowen', 'estate', 6, 1.0, 24, 0],
    ['Vessin', 'suv', 5, 0.85, 14, 0],
  ],
  Osketh: [
    ['Brindock', 'hatchback', 9, 1.0, 33, 0],
    ['Plinther', 'saloon', 4, 0.9, 31, 0],
    ['Corrowen', 'estate', 6, 1.15, 30, 0],
    ['Skarnel', 'suv', 6, 0.8, 16, 0],
  ],
  Tolvane: [
    ['Pibber', 'hatchback', 8, 1.25, 24, 0],
    ['Ruddick', 'hatchback', 5, 0.7, 12, 0],
    ['Marlet', 'van', 5, 1.3, 22, 0],
    ['Heddler', 'van', 3, 1.0, 18, 0],
  ],
  Marrund: [
    ['Loddick', 'pickup', 4, 1.35, 31, 0],
    ['Gristow', 'pickup', 2, 1.0, 12, 0],
    ['Ammelin', 'suv', 5, 1.05, 20, 0],
    ['Sorrith', 'saloon', 3, 1.0, 32, 4],
  ],
  Dorvim: [
    ['Quessel', 'hatchback', 7, 0.9, 20, 0],
    ['Nattlow', 'estate', 5, 0.95, 20, 0],
    ['Umbrin', 'suv', 5, 0.75, 12, 0],
    ['Casker', 'van', 3, 1.2, 20, 0],
  ],
  Kestrane: [
    ['Wayfolder', 'camper', 2.4, 1.3, 32, 0],
    ['Bivvock', 'camper', 1.4, 1.0, 16, 0],
    ['Tillick', 'hatchback', 5, 0.85, 18, 0],
  ],
  Ubbark: [
    ['Osierry', 'estate', 4, 0.85, 18, 0],
    ['Thrappen', 'suv', 3, 0.95, 18, 0],
    ['Dunnelk', 'hatchback', 4, 1.1, 34, 3],
  ],
  Lintrow: [
    ['Silvarne', 'classic', 1.2, 1.0, 52, 28],
    ['Aldermoth', 'classic', 0.9, 1.1, 48, 27],
    ['Pennick', 'classic', 0.5, 0.9, 58, 32],
  ],
};

/** All models that the demo's cars are drawn from. */
export const CAR_MODELS: readonly CarModel[] = Object.entries(RANGES).flatMap(([make, rows]) =>
  rows.map(([model, bodyType, popularity, rot, builtFrom, builtUntil]) => ({
    make,
    model,
    bodyType,
    popularity,
    rot,
    builtFrom,
    builtUntil,
  })),
);
